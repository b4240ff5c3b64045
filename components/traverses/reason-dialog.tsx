"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { NumberField, TextAreaField } from "@/components/ui/labelled-fields";
import { RadioGroup } from "@/components/ui/radio-group";
import { tidyCell } from "@/lib/traverses/edit-readings";
import { readCell, type CellName } from "@/lib/traverses/typed-cells";

export type Asked = {
  kind: "keep" | "leave-out" | "zigzag" | "withdraw";
  /** Indents it is about, shallower first. */
  indents: readonly { id: string; number: number }[];
};
export type Answered = { kind: Asked["kind"]; id: string; reason: string };

const WORDS: Record<Asked["kind"], { title: string; act: string; label: string }> = {
  keep: { title: "Keep", act: "Keep", label: "Why it is kept" },
  "leave-out": { title: "Leave out", act: "Leave out", label: "Why it is left out" },
  zigzag: { title: "They were in zigzag", act: "Set the place", label: "How far to the side" },
  withdraw: { title: "Withdraw", act: "Withdraw", label: "Why it is withdrawn" },
};

/** Asks for the one thing that settles an indent: a reason, or how far it stood to the side. */
export function ReasonDialog({
  asked,
  of,
  onCancel,
  onAnswer,
}: {
  asked: Asked;
  /** Label of the traverse: "T2". */
  of: string;
  onCancel: () => void;
  onAnswer: (answer: Answered) => void;
}) {
  const { kind, indents } = asked;
  const deeper = indents.at(-1);
  const [id, setId] = useState(deeper?.id ?? "");
  const [typed, setTyped] = useState("");
  const [error, setError] = useState<string | null>(null);
  const words = WORDS[kind];
  const chosen = indents.find((indent) => indent.id === id) ?? deeper;
  const title =
    kind === "zigzag" ? words.title : `${words.title} ${chosen ? `indent ${chosen.number}` : of}?`;
  function answer() {
    const text = kind === "zigzag" ? tidyCell(typed) : typed.trim();
    if (kind === "zigzag") {
      const name: CellName = "lateral";
      const { value } = readCell(name, text);
      if (value === null || value === 0) {
        setError("This needs one number above or below zero, in mm.");
        return;
      }
    } else if (text === "") {
      setError("Say why.");
      return;
    }
    onAnswer({ kind, id: chosen?.id ?? "", reason: text });
  }
  const control = {
    name: "settle-reason",
    label: words.label,
    error,
    value: typed,
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => (open ? undefined : onCancel())}
      keepOpenOutside
      title={title}
      description={
        kind === "zigzag"
          ? "Give the place of the deeper indent along the surface, counted from the other one. The distance between the two is then worked out from both."
          : kind === "keep"
            ? "The reason stands in the traverse and in the history."
            : undefined
      }
      footer={
        <>
          <Button onClick={onCancel}>Cancel</Button>
          <Button look={kind === "withdraw" ? "danger" : "primary"} onClick={answer}>
            {words.act}
            {kind === "withdraw" ? ` ${of}` : ""}
          </Button>
        </>
      }
    >
      <div className="grid gap-3">
        {kind === "leave-out" && indents.length > 1 ? (
          <RadioGroup
            name="settle-indent"
            label="Which one"
            inline
            value={id}
            onValueChange={setId}
            options={indents.map((indent) => ({
              value: indent.id,
              label: `Indent ${indent.number}`,
            }))}
          />
        ) : null}
        {kind === "zigzag" ? (
          <NumberField {...control} unit="mm" onChange={(event) => setTyped(event.target.value)} />
        ) : (
          <TextAreaField
            {...control}
            rows={3}
            maxLength={500}
            onChange={(event) => setTyped(event.target.value)}
          />
        )}
      </div>
    </Dialog>
  );
}
