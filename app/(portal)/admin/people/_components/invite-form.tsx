"use client";

import { useRef, useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { useToasts } from "@/components/ui/toasts";
import { ROLE_NAMES, ROLES } from "@/lib/people/constants";
import { roleFits } from "@/lib/people/schemas";
import { invite } from "../actions";

type Organisation = { id: string; name: string; kind: "laboratory" | "client" };

export function InviteForm({ organisations }: { organisations: Organisation[] }) {
  const form = useActionForm<void>();
  const toasts = useToasts();
  const element = useRef<HTMLFormElement>(null);
  const [organisationId, setOrganisationId] = useState("");
  const kind = organisations.find((organisation) => organisation.id === organisationId)?.kind;
  const roles = ROLES.filter((role) => !kind || roleFits(role, kind));
  return (
    <form
      ref={element}
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const text = (name: string) => String(data.get(name) ?? "");
        const role = roles.find((known) => known === text("role"));
        if (!role) return;
        form.send(
          () => invite({ name: text("name"), email: text("email"), organisationId, role }),
          () => {
            toasts.show({ text: `The invitation is on its way to ${text("email")}.` });
            element.current?.reset();
          },
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="No invitation was sent" live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextField name="name" label="Name" required error={form.fields.name} />
      <TextField name="email" type="email" label="E-mail" required error={form.fields.email} />
      <SelectField
        name="organisationId"
        label="Organisation"
        required
        value={organisationId}
        onChange={(event) => setOrganisationId(event.target.value)}
        placeholder="Choose one"
        options={organisations.map(({ id, name }) => ({ value: id, label: name }))}
        error={form.fields.organisationId}
      />
      <SelectField
        name="role"
        label="Role"
        required
        options={roles.map((role) => ({ value: role, label: ROLE_NAMES[role] }))}
        error={form.fields.role}
      />
      <Button type="submit" look="primary" disabled={form.isBusy}>
        Send the invitation
      </Button>
    </form>
  );
}
