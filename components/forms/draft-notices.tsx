import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { formatCount } from "@/lib/format/numbers";
import { NoCopyNotice } from "./no-copy-notice";
import type { SavingState } from "./use-draft-saving";

type Props = {
  /** "Findings were not saved." */
  notSaved: string;
  state: SavingState<object>;
  /** Whether this browser keeps a copy of what is typed. */
  keepsCopy: boolean;
  /** Changes since the last saved state. */
  changes: number;
  signInHref: string;
  onTryAgain: () => void;
};

/** Why a draft is not saved, what is kept, and the way on. */
export function DraftNotices({
  notSaved,
  state,
  keepsCopy,
  changes,
  signInHref,
  onTryAgain,
}: Props) {
  const where = keepsCopy ? "on this device" : "on this page only, so leave it open,";
  return (
    <>
      {!keepsCopy && <NoCopyNotice />}
      {state.kind === "offline" && (
        <Notice kind="offline" title="No connection." live="polite">
          You can go on; {formatCount(Math.max(changes, 1), "change")} {changes > 1 ? "are" : "is"}{" "}
          kept {where} and sent when the connection is back.
        </Notice>
      )}
      {state.kind === "signed-out" && (
        <Notice
          kind="bad"
          title="You are signed out."
          live="assertive"
          actions={
            <>
              <LinkButton small href={signInHref} target="_blank">
                Sign in in a new window
              </LinkButton>
              <Button small onClick={onTryAgain}>
                Save again
              </Button>
            </>
          }
        >
          What you typed is kept {where.replace(/,$/, "")}. Sign in and come back; it is saved then.
        </Notice>
      )}
      {state.kind === "refused" && (
        <Notice
          kind="bad"
          title={notSaved}
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
