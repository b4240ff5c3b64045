"use client";

import { useState } from "react";
import { useRouter } from "next/navigation";
import { fromLocalInput, toLocalInput } from "@/components/forms/local-time";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { ITEM_KIND_NAMES, ITEM_KINDS } from "@/lib/evidence/constants";
import { routes } from "@/lib/routes";
import { register } from "../actions";
import { ItemFields, readItemFields } from "./item-fields";

type Props = { caseId: string; items: { id: string; label: string; content: { name: string } }[] };

/** Registers what came in or what was cut from an item. */
export function RegisterDialog({ caseId, items }: Props) {
  const router = useRouter();
  const form = useActionForm<{ itemId: string; label: string }>();
  const [isOpen, setOpen] = useState(false);
  const [kind, setKind] = useState<(typeof ITEM_KINDS)[number]>("part");
  const [massProblem, setMassProblem] = useState<string | null>(null);
  const isCut = kind === "cut" || kind === "mount" || kind === "tensile_piece";

  function send(data: FormData) {
    const text = (name: string) => String(data.get(name) ?? "");
    const read = readItemFields(data);
    setMassProblem(read.massProblem);
    if (!read.content) return;
    const { content } = read;
    form.send(
      () =>
        register({
          caseId,
          kind,
          parentId: isCut ? text("parentId") || null : null,
          content,
          fromPlace: text("fromPlace"),
          toPlace: text("toPlace"),
          reason: text("reason"),
          at: fromLocalInput(text("at")),
        }),
      (item) => {
        setOpen(false);
        router.push(routes.evidence(caseId, item.itemId));
      },
    );
  }
  const error = (name: string) => form.fields[name];
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title="Register an item"
      trigger={<Button small>Add item</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form="register-item" look="primary" disabled={form.isBusy}>
            Register the item
          </Button>
        </>
      }
    >
      <form
        id="register-item"
        className="grid gap-3 sm:grid-cols-2"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <div className="sm:col-span-2">
            <Notice kind="bad" title="The item was not registered" live="assertive">
              {form.failure}
            </Notice>
          </div>
        )}
        <SelectField
          name="kind"
          label="Kind"
          value={kind}
          onChange={(event) =>
            setKind(ITEM_KINDS.find((known) => known === event.target.value) ?? "part")
          }
          options={ITEM_KINDS.map((known) => ({ value: known, label: ITEM_KIND_NAMES[known] }))}
        />
        {isCut && (
          <SelectField
            name="parentId"
            label="Taken from"
            placeholder="Choose an item"
            options={items.map((item) => ({
              value: item.id,
              label: `${item.label} ${item.content.name}`,
            }))}
            error={error("parentId")}
          />
        )}
        <ItemFields
          content={null}
          errors={form.fields}
          massProblem={massProblem}
          nameClassName={isCut ? "sm:col-span-2" : undefined}
        />
        <TextField
          name="fromPlace"
          label={isCut ? "Cut at" : "Came from"}
          required
          error={error("fromPlace")}
        />
        <TextField name="toPlace" label="Now at" required error={error("toPlace")} />
        <TextField
          name="reason"
          label={isCut ? "Why and how" : "How it came"}
          required
          error={error("reason")}
        />
        <TextField
          name="at"
          type="datetime-local"
          label="When"
          required
          defaultValue={toLocalInput(new Date())}
          error={error("at")}
        />
        <p className="text-12 text-ink-3 sm:col-span-2">
          Do not fit fracture faces together, do not brush them. Cut away from the origin, keep it
          cool, and photograph before and after.
        </p>
      </form>
    </Dialog>
  );
}
