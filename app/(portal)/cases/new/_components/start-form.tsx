"use client";

import { useRouter } from "next/navigation";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { routes } from "@/lib/routes";
import { startFieldReturn } from "../actions";

type Props = { clients: { value: string; label: string }[] };

/** Starts a field return; people of the laboratory say for which client. */
export function StartForm({ clients }: Props) {
  const router = useRouter();
  const form = useActionForm<{ caseId: string }>();
  return (
    <form
      className="grid gap-4 rounded-4 border border-rule-2 bg-surface p-5"
      onSubmit={(event) => {
        event.preventDefault();
        const organisationId = String(
          new FormData(event.currentTarget).get("organisationId") ?? "",
        );
        form.send(
          () => startFieldReturn(organisationId ? { organisationId } : {}),
          (draft) => router.push(routes.fieldReturn(draft.caseId)),
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="No case was opened" live="assertive">
          {form.failure}
        </Notice>
      )}
      <p>
        A case begins with a field return: what broke, where, how it was used, and what you want to
        decide. It is saved as you type; you can leave and go on later. It gets its number when you
        send it.
      </p>
      {clients.length > 0 && (
        <SelectField
          name="organisationId"
          label="Client"
          required
          placeholder="Choose the client the part comes from"
          options={clients}
          error={form.fields.organisationId}
        />
      )}
      <Notice kind="warn" title="If people may be in danger">
        Do not wait for the laboratory: stop or secure the running parts now, under the rules that
        apply where they are.
      </Notice>
      <p>
        <Button type="submit" look="primary" disabled={form.isBusy}>
          Start the field return
        </Button>
      </p>
    </form>
  );
}
