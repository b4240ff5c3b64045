import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { formatTime } from "@/lib/format/dates";
import { markPath } from "@/lib/images/mark-layout";
import { headlineOf, markTitle } from "@/lib/images/mark-names";
import { type Geometry, type MarkContent, markContent, pointsOf } from "@/lib/images/mark-schemas";
import { routes } from "@/lib/routes";
import type { Clash } from "./use-point-edits";

type Size = { widthPx: number; heightPx: number };
type Props = {
  clash: Clash;
  imageId: string;
  size: Size;
  onKeepMine: () => void;
  onTakeTheirs: () => void;
  /** Leaves the choice for later; the points stay in hand. */
  onLater: () => void;
};

/** Two people moved one mark: both versions side by side, and the choice. */
export function MarkConflict({ clash, imageId, size, onKeepMine, onTakeTheirs, onLater }: Props) {
  const { conflict, editing } = clash;
  const { label } = editing.mark;
  const versions = [
    { whose: "Yours", content: conflict.yours, shape: editing.geometry },
    { whose: conflict.changedBy, content: conflict.theirs, shape: null },
  ].map(({ whose, content, shape }) => {
    const read = markContent.safeParse(content);
    const said = read.success ? read.data : null;
    return { whose, said, shape: shape ?? said?.geometry ?? null };
  });
  return (
    <Dialog
      open
      keepOpenOutside
      onOpenChange={(isOpen) => !isOpen && onLater()}
      width="form"
      title={`${label} was changed by ${conflict.changedBy}`}
      description={`At ${formatTime(conflict.changedAt)}, after you opened it. Yours is kept until you choose. Whichever you take, the other stays in the history of ${label}.`}
      footer={
        <>
          <Button onClick={onTakeTheirs}>Take theirs</Button>
          <Button look="primary" onClick={onKeepMine}>
            Keep mine
          </Button>
        </>
      }
    >
      <dl className="mt-2 grid grid-cols-2 gap-4 text-13">
        {versions.map(({ whose, said, shape }) => (
          <div key={whose}>
            <dt className="font-strong">{whose}</dt>
            <dd className="mt-1 grid gap-1">
              {shape && <Sketch imageId={imageId} size={size} geometry={shape} />}
              <span className="raw">{said ? wordsOf(said) : "Your points"}</span>
            </dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}

function wordsOf(content: MarkContent): string {
  const value = headlineOf(content.measurements);
  const shown = value && (value.refused ?? value.text);
  return [markTitle(content), shown, content.note].filter(Boolean).join(", ");
}

/** A mark on its picture, small. */
function Sketch({ imageId, size, geometry }: { imageId: string; size: Size; geometry: Geometry }) {
  const dot = Math.max(size.widthPx, size.heightPx) / 60;
  return (
    <svg
      viewBox={`0 0 ${size.widthPx} ${size.heightPx}`}
      className="w-full bg-ib-surround"
      aria-hidden="true"
    >
      <image
        href={routes.api.thumbnail(imageId)}
        width={size.widthPx}
        height={size.heightPx}
        opacity="0.7"
      />
      <path
        d={markPath(geometry)}
        fill="none"
        stroke="var(--ib-ink)"
        strokeWidth="2.5"
        vectorEffect="non-scaling-stroke"
      />
      {pointsOf(geometry).map(([x, y], i) => (
        <circle key={i} cx={x} cy={y} r={dot} fill="var(--ib-origin)" stroke="#000" />
      ))}
    </svg>
  );
}
