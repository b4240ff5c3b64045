"use client";

import type { KeptDraft, SavingState } from "@/components/forms/use-draft-saving";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { formatTime } from "@/lib/format/dates";
import { formatCount } from "@/lib/format/numbers";
import type { Draft } from "./draft";

type Props = {
  refusal: string | null;
  state: SavingState<Draft>;
  /** Changes since the last saved state. */
  changes: number;
  signInHref: string;
  onTryAgain: () => void;
};

/** Why nothing can be written, or why it is not saved, and the way on. */
export function EditorNotices({ refusal, state, changes, signInHref, onTryAgain }: Props) {
  return (
    <>
      {refusal && (
        <Notice kind="readonly" title="Read only">
          {refusal}
        </Notice>
      )}
      {state.kind === "offline" && (
        <Notice kind="offline" title="No connection" live="polite">
          You can go on; {formatCount(Math.max(changes, 1), "change")} {changes > 1 ? "are" : "is"}{" "}
          kept on this device and sent when the connection is back.
        </Notice>
      )}
      {state.kind === "signed-out" && (
        <Notice
          kind="bad"
          title="You are signed out"
          live="assertive"
          actions={
            <LinkButton small href={signInHref} target="_blank">
              Sign in in a new window
            </LinkButton>
          }
        >
          Your text is kept on this page and on this device. Sign in, come back, and press Ctrl S.
        </Notice>
      )}
      {state.kind === "refused" && (
        <Notice
          kind="bad"
          title="Findings were not saved"
          live="assertive"
          actions={
            <Button small onClick={onTryAgain}>
              Try again
            </Button>
          }
        >
          {state.message}
        </Notice>
      )}
    </>
  );
}

type KeptProps = {
  kept: KeptDraft<Draft>;
  isSameRevision: boolean;
  onForget: () => void;
  onPutBack: () => void;
};

/** Text that this device keeps and the server never got. */
export function KeptNotice({ kept, isSameRevision, onForget, onPutBack }: KeptProps) {
  return (
    <Notice
      kind="warn"
      title={`Text kept on this device from ${formatTime(kept.at)} was never saved`}
      actions={
        <>
          <Button small onClick={onForget}>
            Forget it
          </Button>
          <Button small look="primary" onClick={onPutBack}>
            Put it back
          </Button>
        </>
      }
    >
      {isSameRevision
        ? "It goes on from the text below."
        : "The text below has been changed since."}
    </Notice>
  );
}
