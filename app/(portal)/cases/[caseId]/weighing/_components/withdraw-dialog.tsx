"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/labelled-fields";
import { MECHANISM_CODES } from "@/lib/mechanisms/constants";
import type { MechanismRow } from "@/lib/mechanisms/list-mechanisms";
import { withdraw } from "../actions";

/** Takes a mechanism off the list, with a reason. */
export function WithdrawDialog({ caseId, mechanism }: { caseId: string; mechanism: MechanismRow }) {
  const form = useActionForm<{ label: string }>();
  const [isOpen, setOpen] = useState(false);
  const name = MECHANISM_CODES[mechanism.content.code].toLowerCase();
  const id = `withdraw-${mechanism.recordId}`;
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      title={`Withdraw ${name}?`}
      description="It leaves the list and stays in the history. Values cited from it block sign-off until they are taken out."
      trigger={
        <Button small look="quiet">
          Withdraw
        </Button>
      }
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Keep it</Button>
          <Button type="submit" form={id} look="danger" disabled={form.isBusy}>
            Withdraw it
          </Button>
        </>
      }
    >
      <form
        id={id}
        onSubmit={(event) => {
          event.preventDefault();
          const reason = String(new FormData(event.currentTarget).get(`${id}-reason`) ?? "");
          form.send(
            () => withdraw({ caseId, recordId: mechanism.recordId, reason }),
            () => setOpen(false),
          );
        }}
      >
        <TextField
          name={`${id}-reason`}
          label="Why"
          required
          error={form.fields.reason ?? form.failure}
        />
      </form>
    </Dialog>
  );
}
