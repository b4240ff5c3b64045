"use client";

import { useState } from "react";
import Link from "next/link";
import { PasswordField } from "@/components/auth/password-field";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { PASSWORD_MIN_LENGTH } from "@/lib/people/constants";
import { routes } from "@/lib/routes";
import { choosePassword } from "../../actions";

export function SetPasswordForm({ token, email }: { token: string; email: string }) {
  const form = useActionForm<{ email: string }>();
  const [isDone, setDone] = useState(false);
  if (isDone) {
    return (
      <Notice
        kind="met"
        title="The password is set"
        live="polite"
        actions={<Link href={routes.signIn()}>Sign in</Link>}
      >
        Other sign-ins of yours have ended.
      </Notice>
    );
  }
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const password = String(new FormData(event.currentTarget).get("password"));
        form.send(
          () => choosePassword({ token, password }),
          () => setDone(true),
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="The password was not set" live="assertive">
          {form.failure}
        </Notice>
      )}
      <input type="hidden" autoComplete="username" value={email} readOnly />
      <PasswordField
        name="password"
        label="New password"
        autoComplete="new-password"
        hint={`At least ${PASSWORD_MIN_LENGTH} characters`}
        error={form.fields.password}
      />
      <Button type="submit" look="primary" disabled={form.isBusy}>
        Set the password
      </Button>
    </form>
  );
}
