"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { ErrorText } from "@/components/ui/error-text";
import { useToasts } from "@/components/ui/toasts";
import type { TableId } from "@/lib/hardness/published-tables";
import { turn } from "../actions";

/** Switches a table for the whole laboratory; it can be switched back at once. */
export function SwitchButton({ tableId, isOn }: { tableId: TableId; isOn: boolean }) {
  const form = useActionForm<{ isOn: boolean }>();
  const toasts = useToasts();
  return (
    <>
      {form.failure === null ? null : <ErrorText id="switch-error">{form.failure}</ErrorText>}
      <Button
        small
        disabled={form.isBusy}
        onClick={() =>
          form.send(
            () => turn({ tableId, isOn: !isOn }),
            (now) => toasts.show({ text: now.isOn ? "The table is in use." : "The table is off." }),
          )
        }
      >
        {isOn ? "Switch off" : "Switch on"}
      </Button>
    </>
  );
}
