"use client";

import { PasswordField } from "@/components/auth/password-field";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { PASSWORD_MIN_LENGTH } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import { changePassword } from "../actions";

export function OwnPasswordForm() {
  const form = useActionForm<void>();
  return (
    <form
      className="grid max-w-98 gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        form.send(
          () =>
            changePassword({
              current: String(data.get("current")),
              password: String(data.get("password")),
            }),
          () => window.location.assign(routes.signIn()),
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="The password was not changed" live="assertive">
          {form.failure}
        </Notice>
      )}
      <PasswordField
        name="current"
        label="Present password"
        autoComplete="current-password"
        error={form.fields.current}
      />
      <PasswordField
        name="password"
        label="New password"
        autoComplete="new-password"
        hint={`At least ${PASSWORD_MIN_LENGTH} characters. You sign in again afterwards.`}
        error={form.fields.password}
      />
      <Button type="submit" look="primary" disabled={form.isBusy}>
        Change the password
      </Button>
    </form>
  );
}
