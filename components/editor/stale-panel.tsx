"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Facts } from "@/components/ui/facts";
import { TextField } from "@/components/ui/labelled-fields";
import { Shape } from "@/components/ui/shapes";
import { formatDateTime } from "@/lib/format/dates";
import type { StaleValue } from "./unsettled-values";

type Props = {
  stale: readonly StaleValue[];
  isReadOnly: boolean;
  onShow: (position: number) => void;
  onTake: (values: readonly StaleValue[]) => void;
  onKeep: (value: StaleValue, reason: string) => void;
};

/** The value was cited from the newest version, and what that rests on has changed since. */
const waitsForSource = (value: StaleValue) => value.now.versionId === value.versionId;

/** Cited values whose source has changed: old and new, and the two ways to go on. */
export function StalePanel({ stale, isReadOnly, onShow, onTake, onKeep }: Props) {
  if (stale.length === 0) return null;
  const takeable = stale.filter((value) => !waitsForSource(value));
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
      {!isReadOnly && takeable.length > 1 && (
        <Button small className="mt-2" onClick={() => onTake(takeable)}>
          Take all {takeable.length} new values
        </Button>
      )}
      <ul className="mt-2 grid gap-4">
        {stale.map((value) => (
          <li key={value.position} className="grid gap-2 text-13">
            <StaleFacts value={value} />
            {!isReadOnly && (
              <Choices
                value={value}
                onShow={() => onShow(value.position)}
                onTake={() => onTake([value])}
                onKeep={(reason) => onKeep(value, reason)}
              />
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

function StaleFacts({ value }: { value: StaleValue }) {
  const { label, tag, section, cited, now } = value;
  return (
    <>
      <p>
        {label || tag}
        {section && `, under ${section}`}
      </p>
      <Facts
        facts={[
          { name: "Cited", value: cited },
          {
            name: "Now",
            value: waitsForSource(value)
              ? "not worked out yet"
              : `${now.text}, ${formatDateTime(now.at)}`,
          },
          {
            name: "Because",
            value: waitsForSource(value)
              ? `What ${tag} rests on has changed. Save ${tag} again.`
              : `${now.reason ?? (now.text === cited ? `${tag} was saved again, with the same value` : `${tag} was changed`)} (${now.by})`,
          },
        ]}
      />
    </>
  );
}

type ChoicesProps = {
  value: StaleValue;
  onShow: () => void;
  onTake: () => void;
  onKeep: (reason: string) => void;
};

function Choices({ value, onShow, onTake, onKeep }: ChoicesProps) {
  const [isKeeping, setIsKeeping] = useState(false);
  if (!isKeeping) {
    return (
      <span className="flex flex-wrap gap-2">
        {!waitsForSource(value) && (
          <Button small look="primary" onClick={onTake}>
            Take the new value
          </Button>
        )}
        <Button small onClick={() => setIsKeeping(true)}>
          Keep, say why
        </Button>
        <Button small look="quiet" onClick={onShow}>
          Show it
        </Button>
      </span>
    );
  }
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        const reason = String(new FormData(event.currentTarget).get("keptReason") ?? "").trim();
        if (reason === "") return;
        onKeep(reason);
        setIsKeeping(false);
      }}
    >
      <TextField
        name="keptReason"
        id={`kept-reason-${value.position}`}
        label="Why the old value stays"
        hint="Printed in the report."
        required
        maxLength={500}
        autoFocus
      />
      <span className="flex gap-2">
        <Button small onClick={() => setIsKeeping(false)}>
          Not now
        </Button>
        <Button small look="primary" type="submit">
          Keep it
        </Button>
      </span>
    </form>
  );
}
