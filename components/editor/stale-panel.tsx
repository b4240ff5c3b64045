"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Facts } from "@/components/ui/facts";
import { TextField } from "@/components/ui/labelled-fields";
import { Shape } from "@/components/ui/shapes";
import { formatDateTime } from "@/lib/format/dates";
import type { CitedNow } from "./findings-context";

export type StaleValue = { position: number; tag: string; cited: string; now: CitedNow };

type Props = {
  stale: readonly StaleValue[];
  isReadOnly: boolean;
  onShow: (position: number) => void;
  onTake: (value: StaleValue) => void;
  onKeep: (value: StaleValue, reason: string) => void;
};

/** Cited values whose source has changed: old and new, and the two ways to go on. */
export function StalePanel({ stale, isReadOnly, onShow, onTake, onKeep }: Props) {
  const [keeping, setKeeping] = useState<number | null>(null);
  if (stale.length === 0) return null;
  return (
    <section
      aria-label="Stale values"
      className="border-b border-rule-2 bg-stale-tint p-4"
      role="status"
    >
      <h2 className="flex items-center gap-2 text-13 font-head">
        <Shape name="triangle" size={14} />{" "}
        {stale.length === 1 ? "1 cited value is stale" : `${stale.length} cited values are stale`}
      </h2>
      <ul className="mt-2 grid gap-4">
        {stale.map((value) => (
          <li key={value.position} className="grid gap-2 text-13">
            <Facts
              facts={[
                { name: "From", value: value.tag },
                { name: "Cited", value: value.cited },
                { name: "Now", value: `${value.now.text}, ${formatDateTime(value.now.at)}` },
                {
                  name: "Because",
                  value: `${value.now.reason ?? "Its source changed"} (${value.now.by})`,
                },
              ]}
            />
            {!isReadOnly &&
              (keeping === value.position ? (
                <form
                  className="grid gap-2"
                  onSubmit={(event) => {
                    event.preventDefault();
                    const reason = String(
                      new FormData(event.currentTarget).get("keptReason") ?? "",
                    ).trim();
                    if (reason === "") return;
                    onKeep(value, reason);
                    setKeeping(null);
                  }}
                >
                  <TextField
                    name="keptReason"
                    label="Why the old value stays"
                    hint="Printed in the report."
                    required
                    maxLength={500}
                    autoFocus
                  />
                  <span className="flex gap-2">
                    <Button small onClick={() => setKeeping(null)}>
                      Not now
                    </Button>
                    <Button small look="primary" type="submit">
                      Keep it
                    </Button>
                  </span>
                </form>
              ) : (
                <span className="flex flex-wrap gap-2">
                  <Button small look="primary" onClick={() => onTake(value)}>
                    Take the new value
                  </Button>
                  <Button small onClick={() => setKeeping(value.position)}>
                    Keep, say why
                  </Button>
                  <Button small look="quiet" onClick={() => onShow(value.position)}>
                    Show it
                  </Button>
                </span>
              ))}
          </li>
        ))}
      </ul>
    </section>
  );
}
