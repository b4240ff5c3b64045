"use client";

import { useCallback, useTransition, useState } from "react";
import { TraverseStation, type StationProps } from "@/components/traverses/traverse-station";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { useToasts } from "@/components/ui/toasts";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { restore, save, withdraw } from "../actions";

type Props = Omit<StationProps, "save" | "onWithdraw"> & {
  caseId: string;
  /** Reason it was withdrawn for; null while it stands. */
  withdrawnBecause: string | null;
  mayChange: boolean;
};

/** The station with the acts of this page behind it. */
export function TraverseAtWork({ caseId, withdrawnBecause, mayChange, ...station }: Props) {
  const { traverseId, label } = station.traverse;
  const [failure, setFailure] = useState<string | null>(null);
  const [isBusy, start] = useTransition();
  const toasts = useToasts();
  const onSave = useCallback(
    (seenVersion: number, content: TraverseContent) =>
      save({ caseId, traverseId, seenVersion, content }),
    [caseId, traverseId],
  );
  function putBack() {
    start(async () => {
      const answer = await restore({ caseId, traverseId });
      setFailure(answer.ok ? null : answer.error.message);
    });
  }
  return (
    <>
      {withdrawnBecause === null ? null : (
        <Notice
          kind="warn"
          title={`${label} was withdrawn.`}
          className="mx-4 mt-3"
          actions={
            mayChange ? (
              <Button small disabled={isBusy} onClick={putBack}>
                Put {label} back
              </Button>
            ) : null
          }
        >
          {withdrawnBecause}
        </Notice>
      )}
      {failure === null ? null : (
        <Notice kind="bad" className="mx-4 mt-3" live="assertive">
          {failure}
        </Notice>
      )}
      <TraverseStation
        {...station}
        save={onSave}
        onWithdraw={
          mayChange && withdrawnBecause === null
            ? (reason) =>
                start(async () => {
                  const answer = await withdraw({ caseId, traverseId, reason });
                  if (!answer.ok) setFailure(answer.error.message);
                  else
                    toasts.show({
                      text: `${label} is withdrawn.`,
                      action: { label: "Undo", onAct: putBack },
                    });
                })
            : null
        }
      />
    </>
  );
}
