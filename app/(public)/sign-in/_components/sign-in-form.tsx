"use client";

import { useState } from "react";
import Link from "next/link";
import { signIn } from "next-auth/react";
import { PasswordField } from "@/components/auth/password-field";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { routes } from "@/lib/routes";

const WORDS: Record<string, { title: string; says: string }> = {
  CredentialsSignin: {
    title: "E-mail and password do not fit together",
    says: "Check both and try again. The e-mail you typed is kept.",
  },
  THROTTLED: {
    title: "Too many tries for this account or from this place",
    says: "Wait 15 minutes, or use “Forgotten it?” to set a new password.",
  },
};
const UNREACHABLE = {
  title: "Riverline did not answer",
  says: "You are not signed in. Check the connection and try again.",
};

export function SignInForm({ next }: { next: string }) {
  const [failure, setFailure] = useState<{ title: string; says: string } | null>(null);
  const [isBusy, setBusy] = useState(false);

  async function send(form: FormData) {
    setBusy(true);
    setFailure(null);
    try {
      const answer = await signIn("credentials", {
        email: String(form.get("email")),
        password: String(form.get("password")),
        redirect: false,
      });
      if (answer?.ok && !answer.error) {
        window.location.assign(next);
        return;
      }
      setFailure(WORDS[answer?.error ?? ""] ?? UNREACHABLE);
    } catch {
      setFailure(UNREACHABLE);
    }
    setBusy(false);
  }

  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        void send(new FormData(event.currentTarget));
      }}
    >
      {failure && (
        <Notice kind="bad" title={failure.title} live="assertive">
          {failure.says}
        </Notice>
      )}
      <TextField
        name="email"
        type="email"
        label="E-mail"
        autoComplete="username"
        required
        autoFocus
      />
      <PasswordField
        name="password"
        label="Password"
        autoComplete="current-password"
        aside={<Link href={routes.forgotten()}>Forgotten it?</Link>}
      />
      <Button type="submit" look="primary" className="h-10" disabled={isBusy}>
        {isBusy ? "Signing in" : "Sign in"}
      </Button>
    </form>
  );
}
