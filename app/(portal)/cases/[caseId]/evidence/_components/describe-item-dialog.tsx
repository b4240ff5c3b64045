"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { useToasts } from "@/components/ui/toasts";
import type { ItemRow } from "@/lib/evidence/list-items";
import { describe } from "../actions";
import { ItemFields, readItemFields } from "./item-fields";

/** Changes what is said of an item; the words before stay in its history. */
export function DescribeItemDialog({ caseId, item }: { caseId: string; item: ItemRow }) {
  const form = useActionForm<{ version: number }>();
  const toasts = useToasts();
  const [isOpen, setOpen] = useState(false);
  const [massProblem, setMassProblem] = useState<string | null>(null);
  function send(data: FormData) {
    const read = readItemFields(data);
    setMassProblem(read.massProblem);
    if (!read.content) return;
    const { content } = read;
    const reason = String(data.get("reason") ?? "");
    form.send(
      () => describe({ caseId, itemId: item.id, seenVersion: item.version, content, reason }),
      () => {
        setOpen(false);
        toasts.show({ text: `${item.label} is described anew.` });
      },
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title={`Describe ${item.label}`}
      trigger={<Button>Describe</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form="describe-item" look="primary" disabled={form.isBusy}>
            Change the description
          </Button>
        </>
      }
    >
      <form
        id="describe-item"
        className="grid gap-3 sm:grid-cols-2"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <div className="sm:col-span-2">
            <Notice kind="bad" title="Nothing was changed" live="assertive">
              {form.failure}
            </Notice>
          </div>
        )}
        <ItemFields
          content={item.content}
          errors={form.fields}
          massProblem={massProblem}
          nameClassName="sm:col-span-2"
        />
        <TextField
          name="reason"
          label="Why it changes"
          required
          fieldClassName="sm:col-span-2"
          error={form.fields.reason}
        />
      </form>
    </Dialog>
  );
}
