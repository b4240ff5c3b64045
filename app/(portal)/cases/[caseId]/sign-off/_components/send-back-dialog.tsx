"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { sendFindingsBack } from "../actions";

/** Sends the findings back to the investigator with a note. */
export function SendBackDialog({ caseId }: { caseId: string }) {
  const form = useActionForm<void>();
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      keepOpenOutside
      title="Send back with a note"
      description="The case goes back to weighing. The note goes to the investigator and stands in the history."
      trigger={<Button>Send back with a note</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not yet</Button>
          <Button type="submit" form="send-back" look="danger" disabled={form.isBusy}>
            Send it back
          </Button>
        </>
      }
    >
      <form
        id="send-back"
        onSubmit={(event) => {
          event.preventDefault();
          const note = String(new FormData(event.currentTarget).get("backNote") ?? "");
          form.send(
            () => sendFindingsBack({ caseId, note }),
            () => setOpen(false),
          );
        }}
      >
        <TextAreaField
          name="backNote"
          label="What has to change"
          rows={4}
          required
          maxLength={4000}
          error={form.fields.note ?? form.failure}
        />
      </form>
    </Dialog>
  );
}
