import type { Metadata } from "next";
import { PageHeader } from "@/components/frame/page-header";
import { EmptyState } from "@/components/ui/empty-state";
import { formatCount } from "@/lib/format/numbers";
import { orNotFound, pageActor } from "@/lib/http/page";
import { listPictures } from "@/lib/images/list-pictures";
import { AddPictures } from "./_components/add-pictures";
import { PictureCard } from "./_components/picture-card";

export const metadata: Metadata = { title: "Images" };

type Props = { params: Promise<{ caseId: string }> };

export default async function ImagesPage({ params }: Props) {
  const actor = await pageActor("case.viewWork");
  const { caseId } = await params;
  const { pictures, items, mayNotAdd, mayDescribe } = await orNotFound(listPictures(actor, caseId));
  const standing = pictures.filter((picture) => picture.withdrawnBecause === null);
  const uncalibrated = standing.filter((picture) => picture.pixelText === null).length;
  return (
    <>
      <PageHeader
        title="Images"
        note={
          standing.length > 0
            ? `${formatCount(standing.length, "picture")}, ${formatCount(uncalibrated, "without a scale", "without a scale")}`
            : undefined
        }
      />
      <div className="grid gap-4 px-4 pb-4">
        <AddPictures caseId={caseId} items={items} disabledReason={mayNotAdd} />
        {pictures.length === 0 ? (
          <EmptyState title="No pictures yet">
            A picture opens at full size on the bench, where its scale is set and features are
            measured. Choose or drop the first one above.
          </EmptyState>
        ) : (
          <ul
            aria-label="Pictures"
            className="grid grid-cols-[repeat(auto-fill,minmax(15rem,1fr))] gap-3"
          >
            {pictures.map((picture) => (
              <PictureCard
                key={picture.id}
                caseId={caseId}
                picture={picture}
                items={items}
                mayDescribe={mayDescribe}
              />
            ))}
          </ul>
        )}
      </div>
    </>
  );
}
