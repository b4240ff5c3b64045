"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { RadioGroup } from "@/components/ui/radio-group";
import { useToasts } from "@/components/ui/toasts";
import {
  STRENGTH_VERDICT_NAMES,
  STRENGTH_VERDICTS,
  type StrengthVerdict,
} from "@/lib/strength/constants";
import { STRENGTH_REASON_MAX } from "@/lib/strength/schemas";
import { state } from "../actions";

type Props = {
  caseId: string;
  statement: { verdict: StrengthVerdict; reason: string; version: number } | null;
  isReadOnly: boolean;
};

/** One verdict with its reason; a change is a new version. */
export function StrengthForm({ caseId, statement, isReadOnly }: Props) {
  const form = useActionForm<{ version: number }>();
  const toasts = useToasts();
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const verdict = STRENGTH_VERDICTS.find((known) => known === data.get("verdict"));
        if (!verdict) return;
        form.send(
          () =>
            state({
              caseId,
              verdict,
              reason: String(data.get("reason") ?? ""),
              seenVersion: statement?.version ?? null,
            }),
          () => toasts.show({ text: "The strength is stated." }),
        );
      }}
    >
      <fieldset disabled={isReadOnly || form.isBusy} className="grid gap-4">
        {form.failure && (
          <Notice kind="bad" title="The statement was not saved" live="assertive">
            {form.failure}
          </Notice>
        )}
        <RadioGroup
          name="verdict"
          label="Verdict"
          defaultValue={statement?.verdict ?? ""}
          options={STRENGTH_VERDICTS.map((verdict) => ({
            value: verdict,
            label: STRENGTH_VERDICT_NAMES[verdict],
          }))}
          error={form.fields.verdict}
        />
        <TextAreaField
          name="reason"
          label="Why"
          rows={5}
          required
          maxLength={STRENGTH_REASON_MAX}
          defaultValue={statement?.reason ?? ""}
          error={form.fields.reason}
        />
        {!isReadOnly && (
          <p>
            <Button type="submit" look="primary" disabled={form.isBusy}>
              State the strength
            </Button>
          </p>
        )}
      </fieldset>
    </form>
  );
}
