"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextAreaField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { RadioGroup } from "@/components/ui/radio-group";
import {
  MECHANISM_CODES,
  MECHANISM_VERDICT_NAMES,
  MECHANISM_VERDICTS,
  type MechanismCode,
} from "@/lib/mechanisms/constants";
import type { MechanismRow } from "@/lib/mechanisms/list-mechanisms";
import { weigh } from "../actions";

const CODES = Object.keys(MECHANISM_CODES) as MechanismCode[];

/** Lists a mechanism, or gives one that is listed its verdict and reason. */
export function WeighDialog({
  caseId,
  mechanism,
}: {
  caseId: string;
  mechanism: MechanismRow | null;
}) {
  const form = useActionForm<{ recordId: string }>();
  const [isOpen, setOpen] = useState(false);
  const id = `weigh-${mechanism?.recordId ?? "new"}`;
  function send(data: FormData) {
    const code = CODES.find((known) => known === data.get("code"));
    const verdict = MECHANISM_VERDICTS.find((known) => known === data.get("verdict"));
    if (!code || !verdict) return;
    const text = (name: string) => String(data.get(name) ?? "");
    form.send(
      () =>
        weigh({
          caseId,
          recordId: mechanism?.recordId ?? null,
          seenVersion: mechanism?.version ?? null,
          content: { code, detail: text("detail"), verdict, reason: text("reason") },
        }),
      () => setOpen(false),
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title={
        mechanism
          ? `Weigh ${MECHANISM_CODES[mechanism.content.code].toLowerCase()}`
          : "List a mechanism"
      }
      trigger={
        <Button small={mechanism !== null} look={mechanism ? "secondary" : "primary"}>
          {mechanism ? "Weigh it" : "List a mechanism"}
        </Button>
      }
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form={id} look="primary" disabled={form.isBusy}>
            {mechanism ? "Save the verdict" : "List it"}
          </Button>
        </>
      }
    >
      <form
        id={id}
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <Notice kind="bad" title="Nothing was saved" live="assertive">
            {form.failure}
          </Notice>
        )}
        <SelectField
          name="code"
          label="Mechanism"
          defaultValue={mechanism?.content.code}
          options={CODES.map((code) => ({ value: code, label: MECHANISM_CODES[code] }))}
          error={form.fields["content.code"]}
        />
        <TextField
          name="detail"
          label="In this case"
          optional
          maxLength={120}
          hint="For example: in bending, at the fillet"
          defaultValue={mechanism?.content.detail}
          error={form.fields["content.detail"]}
        />
        <RadioGroup
          name="verdict"
          label="Where it stands"
          defaultValue={mechanism?.content.verdict ?? "open"}
          options={MECHANISM_VERDICTS.map((verdict) => ({
            value: verdict,
            label: MECHANISM_VERDICT_NAMES[verdict],
          }))}
        />
        <TextAreaField
          name="reason"
          label="Because"
          rows={4}
          maxLength={2000}
          hint="Name what speaks against it first. Needed with every verdict."
          defaultValue={mechanism?.content.reason}
          error={form.fields["content.reason"]}
        />
      </form>
    </Dialog>
  );
}
