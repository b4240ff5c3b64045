"use client";

import { NoCopyNotice } from "@/components/forms/no-copy-notice";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import type { SaveState } from "./use-autosave";

type Props = {
  label: string;
  readOnlyBecause: string | null;
  state: SaveState;
  /** Whether this device keeps what is not saved yet. */
  keepsCopy: boolean;
  onRetry: () => void;
  /** Null when nothing was put back from this device. */
  onRestoredSeen: (() => void) | null;
};

/** What a person must know of the traverse before going on. */
export function StationNotices(props: Props) {
  const { label, readOnlyBecause, state, keepsCopy, onRetry, onRestoredSeen } = props;
  return (
    <>
      {readOnlyBecause === null ? null : (
        <Notice kind="readonly" title="Read only." className="mx-4 mb-3">
          {readOnlyBecause}
        </Notice>
      )}
      {onRestoredSeen ? (
        <Notice
          kind="note"
          className="mx-4 mb-3"
          live="polite"
          actions={
            <Button small onClick={onRestoredSeen}>
              Close
            </Button>
          }
        >
          What you typed here was kept on this device and is put back. It is being saved.
        </Notice>
      ) : null}
      {state.kind === "failed" ? (
        <Notice
          kind="bad"
          title={`${label} was not saved.`}
          className="mx-4 mb-3"
          live="assertive"
          actions={
            <Button small onClick={onRetry}>
              Try again
            </Button>
          }
        >
          {state.message} {Object.values(state.fields).join(" ")} What you typed is kept here.
        </Notice>
      ) : null}
      {keepsCopy ? null : <NoCopyNotice className="mx-4 mb-3" />}
      {state.kind === "offline" ? (
        <Notice kind="offline" title="No connection." className="mx-4 mb-3" live="polite">
          You can go on; your changes are kept{" "}
          {keepsCopy ? "on this device" : "on this page only, so leave it open,"} and saved when it
          is back.
        </Notice>
      ) : null}
    </>
  );
}
