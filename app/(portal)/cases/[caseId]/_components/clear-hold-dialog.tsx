"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextAreaField, TextField } from "@/components/ui/labelled-fields";
import { takeOffHold } from "../actions";

/** Takes one hold off, with the reason and, for a legal hold, who allowed it. */
export function ClearHoldDialog({
  caseId,
  hold,
}: {
  caseId: string;
  hold: { id: string; name: string };
}) {
  const form = useActionForm<void>();
  const [isOpen, setOpen] = useState(false);
  const id = `clear-${hold.id}`;
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      keepOpenOutside
      title={`Take off: ${hold.name.toLowerCase()}?`}
      trigger={<Button>Take off hold</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Leave it on hold</Button>
          <Button type="submit" form={id} look="primary" disabled={form.isBusy}>
            Take it off
          </Button>
        </>
      }
    >
      <form
        id={id}
        className="grid gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const authority = String(data.get("authority") ?? "");
          form.send(
            () =>
              takeOffHold({
                caseId,
                holdId: hold.id,
                reason: String(data.get("clearReason") ?? ""),
                ...(authority && { authority }),
              }),
            () => setOpen(false),
          );
        }}
      >
        <TextAreaField
          name="clearReason"
          label="Why it can go on"
          rows={3}
          required
          error={form.fields.reason ?? form.failure}
        />
        <TextField
          name="authority"
          label="Who allowed it"
          hint="Needed for a legal hold: name and paper."
          optional
          error={form.fields.authority}
        />
      </form>
    </Dialog>
  );
}
