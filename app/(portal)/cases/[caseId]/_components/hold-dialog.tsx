"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextAreaField } from "@/components/ui/labelled-fields";
import { HOLD_KINDS, HOLD_NAMES } from "@/lib/cases/constants";
import { hold } from "../actions";

/** Puts the case on hold; only a lead engineer takes it off. */
export function HoldDialog({ caseId }: { caseId: string }) {
  const form = useActionForm<void>();
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      keepOpenOutside
      title="Put on hold"
      trigger={<Button>Put on hold</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form="hold-form" look="primary" disabled={form.isBusy}>
            Put it on hold
          </Button>
        </>
      }
    >
      <form
        id="hold-form"
        className="grid gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const kind = HOLD_KINDS.find((known) => known === data.get("holdKind"));
          if (!kind) return;
          form.send(
            () => hold({ caseId, kind, reason: String(data.get("holdReason") ?? "") }),
            () => setOpen(false),
          );
        }}
      >
        <SelectField
          name="holdKind"
          label="Kind"
          options={HOLD_KINDS.map((kind) => ({ value: kind, label: HOLD_NAMES[kind] }))}
          error={form.fields.kind}
        />
        <TextAreaField
          name="holdReason"
          label="Why"
          rows={3}
          required
          error={form.fields.reason ?? form.failure}
        />
      </form>
    </Dialog>
  );
}
