"use client";

import { useRef, useState, useTransition, type ReactElement, type ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";

export interface ConfirmDialogProps {
  trigger: ReactElement;
  /** "Withdraw M2?" */
  title: string;
  /** Which values rest on it and what becomes of them. */
  description?: ReactNode;
  /** A reason to type, or anything else the act needs. */
  children?: ReactNode;
  /** "Keep M2" */
  keepLabel: string;
  /** "Withdraw M2" */
  actLabel: string;
  danger?: boolean;
  /** Resolves to nothing when done, or to the words of what went wrong; the dialog then stays. */
  onConfirm: () => Promise<string | void>;
}

/** Asks one thing before what cannot be undone. The safe choice comes first and holds the focus. */
export function ConfirmDialog({
  trigger,
  title,
  description,
  children,
  keepLabel,
  actLabel,
  danger = true,
  onConfirm,
}: ConfirmDialogProps) {
  const [open, setOpen] = useState(false);
  const [failure, setFailure] = useState<string | null>(null);
  const [acting, startActing] = useTransition();
  const keep = useRef<HTMLButtonElement>(null);

  function act() {
    if (acting) return;
    startActing(async () => {
      const words = await onConfirm();
      setFailure(words ?? null);
      if (words === undefined) setOpen(false);
    });
  }

  function changeOpen(next: boolean) {
    if (!next) setFailure(null);
    setOpen(next);
  }

  return (
    <Dialog
      trigger={trigger}
      open={open}
      onOpenChange={changeOpen}
      initialFocus={keep}
      title={title}
      description={description}
      footer={
        <>
          <Button ref={keep} onClick={() => changeOpen(false)}>
            {keepLabel}
          </Button>
          <Button
            look={danger ? "danger" : "primary"}
            aria-disabled={acting || undefined}
            onClick={act}
          >
            {actLabel}
          </Button>
        </>
      }
    >
      {children ? <div className="mt-3">{children}</div> : null}
      {failure ? (
        <Notice kind="bad" live="assertive" className="mt-3">
          {failure}
        </Notice>
      ) : null}
    </Dialog>
  );
}
