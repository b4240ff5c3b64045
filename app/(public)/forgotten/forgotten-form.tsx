"use client";

import { useState } from "react";
import Link from "next/link";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { routes } from "@/lib/routes";
import { askForNewPassword } from "../actions";

export function ForgottenForm() {
  const form = useActionForm<void>();
  const [isSent, setSent] = useState(false);
  if (isSent) {
    return (
      <Notice
        kind="met"
        title="Look into your mail"
        live="polite"
        actions={<Link href={routes.signIn()}>Back to signing in</Link>}
      >
        If the account exists, a link for a new password is on its way. It works once, for two
        hours.
      </Notice>
    );
  }
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const email = String(new FormData(event.currentTarget).get("email"));
        form.send(
          () => askForNewPassword({ email }),
          () => setSent(true),
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="No mail was sent" live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextField
        name="email"
        type="email"
        label="E-mail"
        autoComplete="username"
        required
        error={form.fields.email}
      />
      <Button type="submit" look="primary" disabled={form.isBusy}>
        Send me a link
      </Button>
      <p className="text-13">
        <Link href={routes.signIn()}>Back to signing in</Link>
      </p>
    </form>
  );
}
