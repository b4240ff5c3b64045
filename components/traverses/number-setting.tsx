"use client";

import { useState } from "react";
import { NumberField } from "@/components/ui/labelled-fields";
import { parseNumberCell } from "@/lib/hardness/parse-cell";

/** A number of the settings: what is typed stays, and only one number is taken over. */
export function NumberSetting({
  name,
  label,
  unit,
  hint,
  value,
  onValue,
  error,
}: {
  name: string;
  label: string;
  unit?: string;
  hint?: string;
  value: number | null;
  onValue: (value: number | null) => void;
  error?: string;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  function leave() {
    if (typed === null) return;
    const text = typed.trim();
    const parsed = text === "" ? { value: null } : parseNumberCell(text);
    if ("problem" in parsed) {
      setProblem(`This needs one number. You typed “${text}”.`);
      return;
    }
    setProblem(null);
    setTyped(null);
    onValue(parsed.value);
  }
  return (
    <NumberField
      name={name}
      label={label}
      unit={unit}
      hint={hint}
      error={problem ?? error}
      value={typed ?? (value === null ? "" : String(value))}
      onChange={(event) => setTyped(event.target.value)}
      onBlur={leave}
    />
  );
}
