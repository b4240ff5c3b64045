"use client";

import { PasswordField } from "@/components/auth/password-field";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { PASSWORD_MIN_LENGTH } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import { setUpRiverline } from "../actions";

export function SetUpForm() {
  const form = useActionForm<{ email: string }>();
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const text = (name: string) => String(data.get(name) ?? "");
        form.send(
          () =>
            setUpRiverline({
              laboratoryName: text("laboratoryName"),
              addressLine: text("addressLine"),
              name: text("name"),
              email: text("email"),
              password: text("password"),
            }),
          () => window.location.assign(routes.signIn()),
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="Nothing was set up" live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextField
        name="laboratoryName"
        label="Laboratory"
        required
        error={form.fields.laboratoryName}
      />
      <TextField
        name="addressLine"
        label="Address line of reports"
        optional
        error={form.fields.addressLine}
      />
      <TextField
        name="name"
        label="Your name"
        autoComplete="name"
        required
        error={form.fields.name}
      />
      <TextField
        name="email"
        type="email"
        label="Your e-mail"
        autoComplete="username"
        required
        error={form.fields.email}
      />
      <PasswordField
        name="password"
        label="Password"
        autoComplete="new-password"
        hint={`At least ${PASSWORD_MIN_LENGTH} characters`}
        error={form.fields.password}
      />
      <Button type="submit" look="primary" disabled={form.isBusy}>
        Set up
      </Button>
    </form>
  );
}
