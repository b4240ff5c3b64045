"use client";

import { useState } from "react";
import { fromLocalInput, toLocalInput } from "@/components/forms/local-time";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { useToasts } from "@/components/ui/toasts";
import { CUSTODY_ACT_NAMES } from "@/lib/evidence/constants";
import type { ItemRow } from "@/lib/evidence/list-items";
import { HAND_OVER_ACTS } from "@/lib/evidence/schemas";
import { writeEntry } from "../actions";

type Props = { caseId: string; item: ItemRow; holders: { id: string; name: string }[] };
type Act = (typeof HAND_OVER_ACTS)[number];

/** Writes the next entry of the chain; it starts where the last one ended. */
export function HandOverDialog({ caseId, item, holders }: Props) {
  const form = useActionForm<{ entryId: string; label: string }>();
  const toasts = useToasts();
  const [isOpen, setOpen] = useState(false);
  const [act, setAct] = useState<Act>("taken_to_bench");
  const last = item.entries.at(-1);
  function send(data: FormData) {
    const text = (name: string) => String(data.get(name) ?? "").trim();
    form.send(
      () =>
        writeEntry({
          caseId,
          itemId: item.id,
          act,
          toPlace: text("toPlace"),
          holderId: text("holderId") || null,
          reason: text("reason"),
          conditionNote: text("conditionNote") || null,
          sealBroken: text("sealBroken") || null,
          sealFitted: text("sealFitted") || null,
          at: fromLocalInput(text("at")),
          correctsId: act === "correction" ? text("correctsId") || null : null,
          seenPosition: last?.position ?? 0,
        }),
      () => {
        setOpen(false);
        toasts.show({ text: `${item.label}: ${CUSTODY_ACT_NAMES[act].toLowerCase()}.` });
      },
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title={`Hand over ${item.label}`}
      note={last ? `now at ${last.toPlace}` : undefined}
      trigger={<Button look="primary">Hand over {item.label}</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form="hand-over" look="primary" disabled={form.isBusy}>
            Write the entry
          </Button>
        </>
      }
    >
      <form
        id="hand-over"
        className="grid gap-3 sm:grid-cols-2"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <div className="sm:col-span-2">
            <Notice kind="bad" title="Nothing was written" live="assertive">
              {form.failure}
            </Notice>
          </div>
        )}
        <SelectField
          name="act"
          label="What happens"
          value={act}
          onChange={(event) =>
            setAct(HAND_OVER_ACTS.find((known) => known === event.target.value) ?? "taken_to_bench")
          }
          options={HAND_OVER_ACTS.map((known) => ({
            value: known,
            label: CUSTODY_ACT_NAMES[known],
          }))}
        />
        {act === "correction" ? (
          <SelectField
            name="correctsId"
            label="Corrects"
            options={item.entries.map((entry) => ({
              value: entry.id,
              label: `Entry ${entry.position}, ${CUSTODY_ACT_NAMES[entry.act].toLowerCase()}`,
            }))}
            error={form.fields.correctsId}
          />
        ) : (
          <SelectField
            name="holderId"
            label="Held by"
            options={[
              { value: "", label: "Nobody here" },
              ...holders.map(({ id, name }) => ({ value: id, label: name })),
            ]}
            error={form.fields.holderId}
          />
        )}
        <TextField
          name="toPlace"
          label={act === "correction" ? "What is right" : "To"}
          required
          error={form.fields.toPlace}
        />
        <TextField
          name="at"
          type="datetime-local"
          label="When"
          required
          defaultValue={toLocalInput(new Date())}
          error={form.fields.at}
        />
        <TextField
          name="reason"
          label="Why"
          required
          fieldClassName="sm:col-span-2"
          error={form.fields.reason}
        />
        <TextField name="sealBroken" label="Seal broken" optional error={form.fields.sealBroken} />
        <TextField name="sealFitted" label="Seal fitted" optional error={form.fields.sealFitted} />
        <TextField
          name="conditionNote"
          label="Condition"
          optional
          fieldClassName="sm:col-span-2"
          error={form.fields.conditionNote}
        />
      </form>
    </Dialog>
  );
}
