"use client";

import { useFormStatus } from "react-dom";
import { Button, type ButtonProps } from "@/components/ui/button";

export interface SubmitButtonProps extends Omit<ButtonProps, "type"> {
  /** While it runs: "Handing over". */
  pendingLabel?: string;
  /** Where the form is not sent by its action: whether it is being sent now. */
  pending?: boolean;
}

/** Sends the form it stands in, once: while sending it stays in place and keeps the focus. */
export function SubmitButton({
  look = "primary",
  pendingLabel,
  pending,
  children,
  ...rest
}: SubmitButtonProps) {
  const status = useFormStatus();
  const sending = pending ?? status.pending;
  return (
    <Button
      {...rest}
      look={look}
      type={sending ? "button" : "submit"}
      aria-disabled={sending || undefined}
      onClick={sending ? undefined : rest.onClick}
    >
      {sending ? (pendingLabel ?? children) : children}
    </Button>
  );
}
