"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { ErrorText } from "@/components/ui/error-text";
import { sendForSignature } from "../actions";

/** Sends the findings for sign-off; while a gate is open it says which and stays in place. */
export function SendButton({
  caseId,
  disabledReason,
}: {
  caseId: string;
  disabledReason: string | null;
}) {
  const form = useActionForm<void>();
  return (
    <div>
      <Button
        look="primary"
        disabled={form.isBusy}
        disabledReason={disabledReason}
        onClick={() =>
          form.send(
            () => sendForSignature({ caseId }),
            () => undefined,
          )
        }
      >
        Send for sign-off
      </Button>
      {form.failure && <ErrorText>{form.failure}</ErrorText>}
    </div>
  );
}
