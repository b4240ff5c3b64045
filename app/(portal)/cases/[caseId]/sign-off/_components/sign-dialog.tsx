"use client";

import { useState } from "react";
import { Lock } from "lucide-react";
import { PasswordField } from "@/components/auth/password-field";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Dialog } from "@/components/ui/dialog";
import { ErrorText } from "@/components/ui/error-text";
import { Facts } from "@/components/ui/facts";
import { Notice } from "@/components/ui/notice";
import type { SignOffPage } from "@/lib/reports/read-sign-off";
import { GateList } from "../../_components/gate-list";
import { sign } from "../actions";

/** The signature: ledger on the left, what is signed and the password on the right. */
export function SignDialog({
  page,
  disabledReason,
}: {
  page: SignOffPage;
  disabledReason: string | null;
}) {
  const form = useActionForm<{ issueNumber: number }>();
  const [isOpen, setOpen] = useState(false);
  const { issue, gates } = page;
  if (!issue) return null;
  const met = gates.filter((gate) => gate.isMet).length;
  function send(data: FormData) {
    if (!issue) return;
    form.send(
      () =>
        sign({
          caseId: page.caseId,
          documentSha256: issue.documentSha256,
          hasRead: data.get("hasRead") === "on",
          hasNotMeasured: data.get("hasNotMeasured") === "on",
          password: String(data.get("password") ?? ""),
        }),
      () => setOpen(false),
    );
  }
  if (disabledReason) {
    return (
      <Button look="primary" disabledReason={disabledReason}>
        Sign and lock
      </Button>
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="wide"
      keepOpenOutside
      title="Sign and lock the findings"
      note={`${page.caseNumber}, issue ${issue.number}`}
      trigger={<Button look="primary">Sign the findings</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not yet</Button>
          <Button type="submit" form="sign-report" look="primary" disabled={form.isBusy}>
            <Lock size={15} aria-hidden="true" /> {form.isBusy ? "Signing" : "Sign and lock"}
          </Button>
        </>
      }
    >
      <div className="grid gap-x-6 gap-y-4 md:grid-cols-[22rem_minmax(0,1fr)]">
        <section aria-label="Gates">
          <p className="flex justify-between text-13 font-head">
            Gates <span className="font-normal text-ink-3">{`${met} of ${gates.length} met`}</span>
          </p>
          <div className="mt-2 border border-rule">
            <GateList gates={gates} hasLinks={false} />
          </div>
        </section>
        <form
          id="sign-report"
          className="grid content-start gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            send(new FormData(event.currentTarget));
          }}
        >
          {form.failure && (
            <Notice kind="bad" title="Nothing was signed" live="assertive">
              {form.failure}
            </Notice>
          )}
          <p className="text-13 font-head">Root cause you are signing</p>
          <p className="raw border-l-3 border-action pl-4 font-serif text-sheet">
            {issue.rootCause}
          </p>
          <Checkbox name="hasRead" label="I have read all sections and the figures." />
          {form.fields.hasRead && <ErrorText>{form.fields.hasRead}</ErrorText>}
          <Checkbox name="hasNotMeasured" label="I did not make the measurements this rests on." />
          {form.fields.hasNotMeasured && <ErrorText>{form.fields.hasNotMeasured}</ErrorText>}
          <Facts
            facts={[
              {
                name: "Signing as",
                value: `${page.signer.name}, ${page.signer.roleName.toLowerCase()}`,
              },
              {
                name: "Text",
                value: issue.documentSha256.slice(0, 16).replace(/(.{4})(?=.)/g, "$1 "),
                mono: true,
              },
              { name: "Goes to", value: `${page.goesTo.join(", ")}, by e-mail` },
            ]}
          />
          <PasswordField
            name="password"
            label="Your password"
            autoComplete="current-password"
            hint="Asked again because signing cannot be undone. A later change is a new issue."
            error={form.fields.password}
            // Enter in the password field must not sign; the button does.
            onKeyDown={(event) => {
              if (event.key === "Enter") event.preventDefault();
            }}
          />
          <p className="text-12 text-ink-3">
            Your signature is a technical opinion on the pieces examined. It is no release for
            service.
          </p>
        </form>
      </div>
    </Dialog>
  );
}
