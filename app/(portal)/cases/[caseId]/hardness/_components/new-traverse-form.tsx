"use client";

import { useRouter } from "next/navigation";
import { useActionForm } from "@/components/forms/use-action-form";
import { SubmitButton } from "@/components/forms/submit-button";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import { hardnessSymbol } from "@/lib/hardness/forces";
import { routes } from "@/lib/routes";
import { HARDENING_PROCESS_NAMES } from "@/lib/traverses/constants";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { create } from "../actions";

type Props = {
  caseId: string;
  content: TraverseContent;
  items: readonly { id: string; label: string }[];
};

/** Names a traverse; the rest is proposed and can be changed beside the readings. */
export function NewTraverseForm({ caseId, content, items }: Props) {
  const form = useActionForm<{ traverseId: string }>();
  const router = useRouter();
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        form.send(
          () =>
            create({
              caseId,
              content: {
                ...content,
                name: String(data.get("name") ?? ""),
                itemId: String(data.get("item") ?? "") || null,
              },
            }),
          ({ traverseId }) => router.push(routes.traverse(caseId, traverseId)),
        );
      }}
    >
      {form.failure === null ? null : (
        <Notice kind="bad" title="The traverse was not started." live="assertive">
          {form.failure}
        </Notice>
      )}
      <TextField
        name="name"
        label="Where it is run"
        hint="Such as “at fillet” or “mid-journal”"
        maxLength={60}
        required
        error={form.fields["content.name"]}
      />
      <SelectField
        name="item"
        label="On which piece"
        optional
        placeholder="Not stated"
        options={items.map(({ id, label }) => ({ value: id, label }))}
        error={form.fields["content.itemId"]}
      />
      <p className="text-13 text-ink-2">
        {hardnessSymbol(content)}, {HARDENING_PROCESS_NAMES[content.process].toLowerCase()},{" "}
        {content.depthKind === "none" ? "no depth asked" : `depth as ${content.depthKind}`}.
      </p>
      <p>
        <SubmitButton look="primary" pending={form.isBusy} pendingLabel="Starting">
          Start the traverse
        </SubmitButton>
      </p>
    </form>
  );
}
