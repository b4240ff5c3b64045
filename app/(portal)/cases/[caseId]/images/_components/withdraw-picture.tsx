"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { useToasts } from "@/components/ui/toasts";
import { putBack, withdraw } from "../actions";

type Props = { imageId: string; label: string; isWithdrawn: boolean };

/** Withdraws a picture with a reason, or puts it back. */
export function WithdrawPicture({ imageId, label, isWithdrawn }: Props) {
  const form = useActionForm<{ label: string }>();
  const toasts = useToasts();
  const [isOpen, setOpen] = useState(false);
  if (isWithdrawn) {
    return (
      <Button
        small
        look="quiet"
        aria-label={`Put back ${label}`}
        disabled={form.isBusy}
        onClick={() =>
          form.send(
            () => putBack({ imageId }),
            () => toasts.show({ text: `${label} is back.` }),
          )
        }
      >
        Put back
      </Button>
    );
  }
  const formId = `withdraw-${imageId}`;
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="question"
      title={`Withdraw ${label}?`}
      description="It stays in the case with your reason. Cited values that rest on it turn stale."
      trigger={
        <Button small look="quiet" aria-label={`Withdraw ${label}`}>
          Withdraw
        </Button>
      }
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Keep it</Button>
          <Button type="submit" form={formId} look="danger" disabled={form.isBusy}>
            Withdraw {label}
          </Button>
        </>
      }
    >
      <form
        id={formId}
        className="grid gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          const reason = String(new FormData(event.currentTarget).get("reason") ?? "");
          form.send(
            () => withdraw({ imageId, reason }),
            () => setOpen(false),
          );
        }}
      >
        {form.failure && (
          <Notice kind="bad" title={`${label} was not withdrawn.`} live="assertive">
            {form.failure}
          </Notice>
        )}
        <TextField
          id={`${formId}-reason`}
          name="reason"
          label="Why"
          required
          maxLength={500}
          error={form.fields.reason}
        />
      </form>
    </Dialog>
  );
}
