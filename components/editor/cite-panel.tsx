"use client";

import { type RefObject, useId, useMemo, useState } from "react";
import { Search } from "lucide-react";
import { classNames } from "@/components/ui/class-names";
import { Kbd } from "@/components/ui/kbd";
import { TextInput } from "@/components/ui/text-input";
import { OriginShape } from "@/components/ui/value";
import type { ValueSource } from "@/lib/records/constants";

export type CitableValue = {
  group: string;
  recordId: string;
  versionId: string;
  field: string;
  label: string;
  text: string;
  tag: string;
  source: ValueSource;
};

type Props = {
  values: readonly CitableValue[];
  search: RefObject<HTMLInputElement | null>;
  isReadOnly: boolean;
  onCite: (value: CitableValue) => void;
  /** Back to the text; with `text`, written there first. */
  onLeave: (text?: string) => void;
};

const keyOf = (value: CitableValue) => `${value.recordId}.${value.field}`;

function fitting(values: readonly CitableValue[], typed: string): CitableValue[] {
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  return values.filter((value) => {
    const text = `${value.group} ${value.label} ${value.text} ${value.tag}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
}

/** Values that can be cited, found by typing; arrows choose, Enter puts in. */
export function CitePanel({ values, search, isReadOnly, onCite, onLeave }: Props) {
  const [typed, setTyped] = useState("");
  const [chosen, setChosen] = useState(0);
  const listId = useId();
  const found = useMemo(() => {
    const fits = fitting(values, typed);
    const groups = [...new Set(fits.map((value) => value.group))];
    return groups.flatMap((group) => fits.filter((value) => value.group === group));
  }, [values, typed]);
  const at = Math.min(chosen, Math.max(found.length - 1, 0));
  const active = found[at];
  function choose(next: number) {
    const place = Math.max(0, Math.min(next, found.length - 1));
    setChosen(place);
    document.getElementById(`${listId}-${place}`)?.scrollIntoView({ block: "nearest" });
  }
  return (
    <section aria-label="Values you can cite" className="grid gap-2 p-4">
      <h2 className="text-13 font-head">Values you can cite</h2>
      <TextInput
        ref={search}
        role="combobox"
        aria-expanded="true"
        aria-controls={listId}
        aria-activedescendant={active ? `${listId}-${at}` : undefined}
        aria-label="Find a value"
        placeholder="hardness, T2, origin"
        value={typed}
        lead={<Search size={14} aria-hidden="true" />}
        disabled={isReadOnly}
        onChange={(event) => {
          setTyped(event.target.value);
          setChosen(0);
        }}
        onKeyDown={(event) => {
          if (event.key === "ArrowDown") choose(at + 1);
          else if (event.key === "ArrowUp") choose(at - 1);
          else if (event.key === "Enter" && active) {
            onCite(active);
            setTyped("");
            setChosen(0);
          } else if (event.key === "Escape") onLeave();
          else if (event.key === "@" && typed === "") onLeave("@");
          else return;
          event.preventDefault();
        }}
      />
      {found.length === 0 ? (
        <p className="text-13 text-ink-2">
          {values.length === 0
            ? "Nothing is measured or stated yet."
            : "No value fits these words."}
        </p>
      ) : (
        <div
          id={listId}
          role="listbox"
          aria-label="Values"
          tabIndex={-1}
          className="max-h-[50dvh] overflow-y-auto border-y border-rule"
        >
          {[...new Set(found.map((value) => value.group))].map((group) => (
            <div key={group} role="group" aria-label={group}>
              <p
                aria-hidden="true"
                className="border-b border-rule px-1 pt-2 pb-1 text-12 text-ink-3"
              >
                {group}
              </p>
              {found.map((value, i) =>
                value.group === group ? (
                  <CitableOption
                    key={keyOf(value)}
                    id={`${listId}-${i}`}
                    value={value}
                    isActive={i === at}
                    isReadOnly={isReadOnly}
                    onCite={() => onCite(value)}
                  />
                ) : null,
              )}
            </div>
          ))}
        </div>
      )}
      {!isReadOnly && (
        <p className="text-12 text-ink-3">
          <Kbd>↑</Kbd> <Kbd>↓</Kbd> choose, <Kbd>Enter</Kbd> put in, <Kbd>Esc</Kbd> leave,{" "}
          <Kbd>@</Kbd> again writes @
        </p>
      )}
    </section>
  );
}

type OptionProps = {
  id: string;
  value: CitableValue;
  isActive: boolean;
  isReadOnly: boolean;
  onCite: () => void;
};

function CitableOption({ id, value, isActive, isReadOnly, onCite }: OptionProps) {
  return (
    <div
      id={id}
      role="option"
      aria-selected={isActive}
      className={classNames(
        "flex cursor-pointer items-baseline justify-between gap-3 border-b border-rule px-1 py-1.5 text-13 last:border-0",
        isActive && "bg-action-tint",
        isReadOnly && "pointer-events-none",
      )}
      // Keeps the cursor in the text.
      onMouseDown={(event) => event.preventDefault()}
      onClick={onCite}
    >
      <span className="min-w-0">
        {value.label}
        <span className="block text-12 text-ink-3">
          {value.tag}, {value.source}
        </span>
      </span>
      <span className="tn text-right font-strong">
        <OriginShape origin={value.source} /> {value.text}
      </span>
    </div>
  );
}
