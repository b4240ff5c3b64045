"use client";

import { useState } from "react";
import { useRouter } from "next/navigation";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextAreaField } from "@/components/ui/labelled-fields";
import { routes } from "@/lib/routes";
import { startNewIssue } from "../actions";

/** Opens the next issue of a released report; the old one stays as it is. */
export function NewIssueDialog({ caseId, nextNumber }: { caseId: string; nextNumber: number }) {
  const router = useRouter();
  const form = useActionForm<{ issueNumber: number }>();
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      keepOpenOutside
      title={`Start issue ${nextNumber}?`}
      description="It begins with the text of the last issue. That one stays readable until the new one is released; those who have it are told then."
      trigger={<Button>Start issue {nextNumber}</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form="new-issue" look="primary" disabled={form.isBusy}>
            Start issue {nextNumber}
          </Button>
        </>
      }
    >
      <form
        id="new-issue"
        onSubmit={(event) => {
          event.preventDefault();
          const reason = String(new FormData(event.currentTarget).get("issueReason") ?? "");
          form.send(
            () => startNewIssue({ caseId, reason }),
            () => {
              setOpen(false);
              router.push(routes.findings(caseId));
            },
          );
        }}
      >
        <TextAreaField
          name="issueReason"
          label="Why"
          hint="Printed in the list of issues."
          rows={3}
          required
          maxLength={1000}
          error={form.fields.reason ?? form.failure}
        />
      </form>
    </Dialog>
  );
}
