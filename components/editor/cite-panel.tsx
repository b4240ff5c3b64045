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
  onLeave: () => void;
};

const keyOf = (value: CitableValue) => `${value.recordId}.${value.field}`;

/** Values that can be cited, found by typing; arrows choose, Enter puts in. */
export function CitePanel({ values, search, isReadOnly, onCite, onLeave }: Props) {
  const [typed, setTyped] = useState("");
  const [chosen, setChosen] = useState(0);
  const listId = useId();
  const found = useMemo(() => {
    const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
    return values.filter((value) => {
      const text = `${value.group} ${value.label} ${value.text} ${value.tag}`.toLowerCase();
      return words.every((word) => text.includes(word));
    });
  }, [values, typed]);
  const at = Math.min(chosen, Math.max(found.length - 1, 0));
  const active = found[at];
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
          if (event.key === "ArrowDown") setChosen(Math.min(at + 1, found.length - 1));
          else if (event.key === "ArrowUp") setChosen(Math.max(at - 1, 0));
          else if (event.key === "Enter" && active) onCite(active);
          else if (event.key === "Escape") onLeave();
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
        <ul
          id={listId}
          role="listbox"
          aria-label="Values"
          className="max-h-[50dvh] overflow-y-auto border-y border-rule"
        >
          {found.map((value, i) => (
            <li
              key={keyOf(value)}
              id={`${listId}-${i}`}
              role="option"
              aria-selected={i === at}
              className={classNames(
                "flex cursor-pointer items-baseline justify-between gap-3 border-b border-rule px-1 py-1.5 text-13 last:border-0",
                i === at && "bg-action-tint",
                isReadOnly && "pointer-events-none",
              )}
              // Keeps the cursor in the text.
              onMouseDown={(event) => event.preventDefault()}
              onClick={() => onCite(value)}
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
            </li>
          ))}
        </ul>
      )}
      {!isReadOnly && (
        <p className="text-12 text-ink-3">
          <Kbd>↑</Kbd> <Kbd>↓</Kbd> choose, <Kbd>Enter</Kbd> put in, <Kbd>Esc</Kbd> leave
        </p>
      )}
    </section>
  );
}
