import { routes } from "@/lib/routes";
import { PickDialog } from "./pick-dialog";
import type { PictureSource, TraverseSource } from "./use-sources";

export type Picking = "picture" | "chart" | null;
type Props = {
  picking: Picking;
  pictures: readonly PictureSource[];
  traverses: readonly TraverseSource[];
  onClose: () => void;
  onPicture: (picture: PictureSource) => void;
  onChart: (traverse: TraverseSource) => void;
};

/** Choosing what to put in: a picture of the case, or the chart of a traverse. */
export function InsertDialogs(props: Props) {
  const { picking, pictures, traverses, onClose } = props;
  return (
    <>
      <PickDialog
        title="Put in a picture"
        none="No picture of this case is ready yet."
        choices={pictures.map(({ id, label, caption }) => ({
          id,
          label,
          words: caption,
          picture: routes.api.thumbnail(id),
        }))}
        isOpen={picking === "picture"}
        onClose={onClose}
        onPick={(id) => {
          const picture = pictures.find((known) => known.id === id);
          if (picture) props.onPicture(picture);
        }}
      />
      <PickDialog
        title="Put in a chart"
        none="No traverse is recorded yet."
        choices={traverses.map(({ id, label, name }) => ({ id, label, words: name }))}
        isOpen={picking === "chart"}
        onClose={onClose}
        onPick={(id) => {
          const traverse = traverses.find((known) => known.id === id);
          if (traverse) props.onChart(traverse);
        }}
      />
    </>
  );
}
