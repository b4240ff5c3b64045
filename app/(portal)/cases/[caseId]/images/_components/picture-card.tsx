import Link from "next/link";
import type { ItemChoice } from "@/components/uploads/picture-details";
import { Tag } from "@/components/ui/tag";
import { formatDate } from "@/lib/format/dates";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import { formatBytes, formatNumber } from "@/lib/format/numbers";
import { TECHNIQUE_NAMES } from "@/lib/images/constants";
import type { PictureRow } from "@/lib/images/list-pictures";
import { routes } from "@/lib/routes";
import { DescribeDialog } from "./describe-dialog";
import { WithdrawPicture } from "./withdraw-picture";

type Props = {
  caseId: string;
  picture: PictureRow;
  items: readonly ItemChoice[];
  mayDescribe: boolean;
};

function sizeText({ widthPx, heightPx, bitDepth, sizeBytes }: PictureRow): string {
  const pixels =
    widthPx !== null && heightPx !== null
      ? `${formatNumber(widthPx)} × ${formatNumber(heightPx)}${NO_BREAK_SPACE}px`
      : null;
  const depth = bitDepth === null ? null : `${bitDepth}${NO_BREAK_SPACE}bit`;
  return [pixels, depth, formatBytes(sizeBytes)].filter(Boolean).join(", ");
}

/** One picture of the list: how it looks, what it shows, and whether it has a scale. */
export function PictureCard({ caseId, picture, items, mayDescribe }: Props) {
  const { id, label, content, withdrawnBecause, state } = picture;
  const isWithdrawn = withdrawnBecause !== null;
  const isOpenable = state === "ready";
  const title = content.caption || picture.fileName;
  const thumbnail = isOpenable ? (
    // eslint-disable-next-line @next/next/no-img-element -- its address asks for the sign-in, which the framework's image service does not have
    <img
      src={routes.api.thumbnail(id)}
      alt=""
      loading="lazy"
      className="h-full w-full object-contain"
    />
  ) : (
    <span className="p-3 text-12 text-ink-2">
      {state === "refused" ? "It was refused" : "Being checked"}
    </span>
  );
  return (
    <li
      className={`flex flex-col rounded-4 border border-rule bg-surface ${isWithdrawn ? "opacity-80" : ""}`}
    >
      <div className="flex h-44 items-center justify-center overflow-hidden rounded-t-4 bg-well">
        {thumbnail}
      </div>
      <div className="flex flex-1 flex-col gap-1.5 p-3">
        <h2 className="text-13 font-strong break-words">
          {isOpenable ? (
            <Link href={routes.image(caseId, id)} className="text-action underline">
              {label} {title}
            </Link>
          ) : (
            `${label} ${title}`
          )}
        </h2>
        <p className="text-12 text-ink-2">
          {[
            picture.itemLabel,
            content.face,
            TECHNIQUE_NAMES[content.technique],
            content.magnification === null ? null : `×${formatNumber(content.magnification)}`,
            content.takenOn && formatDate(content.takenOn),
          ]
            .filter(Boolean)
            .join(" · ")}
        </p>
        <p className="tn text-12 text-ink-3">{sizeText(picture)}</p>
        <p className="flex flex-wrap gap-1.5">
          {picture.pixelText === null ? (
            <Tag kind="warn">Not calibrated</Tag>
          ) : (
            <Tag>{picture.pixelText} a pixel</Tag>
          )}
          {picture.isShareable && <Tag kind="note">Shared with the requester</Tag>}
          {isWithdrawn && <Tag kind="bad">Withdrawn</Tag>}
        </p>
        {withdrawnBecause && <p className="text-12 text-ink-2">Withdrawn: {withdrawnBecause}</p>}
        {picture.duplicates.length > 0 && (
          <p className="text-12 text-warn">
            The same file is{" "}
            {picture.duplicates
              .map((same) =>
                same.caseId === caseId ? same.label : `${same.caseNumber} ${same.label}`,
              )
              .join(", ")}
            .
          </p>
        )}
        {picture.fileNotes.map((note) => (
          <p key={note} className="text-12 text-ink-3">
            {note}
          </p>
        ))}
        <div className="mt-auto flex flex-wrap items-center gap-2 pt-1.5">
          {mayDescribe && !isWithdrawn && <DescribeDialog picture={picture} items={items} />}
          {mayDescribe && <WithdrawPicture imageId={id} label={label} isWithdrawn={isWithdrawn} />}
          <a
            className="text-12 text-action underline"
            href={routes.api.original(id)}
            aria-label={`Original of ${label}`}
          >
            Original
          </a>
        </div>
      </div>
    </li>
  );
}
