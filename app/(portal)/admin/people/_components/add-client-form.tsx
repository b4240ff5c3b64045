"use client";

import { useRef } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { addClient } from "../actions";

export function AddClientForm() {
  const form = useActionForm<void>();
  const element = useRef<HTMLFormElement>(null);
  return (
    <form
      ref={element}
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const name = String(new FormData(event.currentTarget).get("clientName"));
        form.send(
          () => addClient({ name }),
          () => element.current?.reset(),
        );
      }}
    >
      {form.failure && !form.fields.name && (
        <Notice kind="bad" title="The client was not added" live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextField name="clientName" label="Client's name" required error={form.fields.name} />
      <Button type="submit" disabled={form.isBusy}>
        Add the client
      </Button>
    </form>
  );
}
