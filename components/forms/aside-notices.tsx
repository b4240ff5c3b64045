import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { formatDateTime } from "@/lib/format/dates";
import type { KeptDraft } from "./use-draft-saving";

type Props<D> = {
  /** What they are: "Text", "Answers". */
  what: string;
  aside: readonly KeptDraft<D>[];
  /** Revision that the server has. */
  revision: number;
  onForget: (kept: KeptDraft<D>) => void;
  onPutBack: (kept: KeptDraft<D>) => void;
};

/** Drafts that this device keeps beside the one being written. */
export function AsideNotices<D>({ what, aside, revision, onForget, onPutBack }: Props<D>) {
  return aside.map((kept) => (
    <Notice
      key={kept.at}
      kind="warn"
      live="polite"
      title={`${what} of ${formatDateTime(kept.at)}, kept on this device, never saved.`}
      actions={
        <>
          <Button small onClick={() => onForget(kept)}>
            Forget it
          </Button>
          <Button small look="primary" onClick={() => onPutBack(kept)}>
            Put it back
          </Button>
        </>
      }
    >
      {kept.revision === revision
        ? "It goes on from what stands below."
        : "What stands below was saved since. Put it back to compare the two and choose."}
    </Notice>
  ));
}
