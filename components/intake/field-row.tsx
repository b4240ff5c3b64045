"use client";

import { memo } from "react";
import { describedBy, Field as FieldFrame } from "@/components/ui/field";
import { TextInput } from "@/components/ui/text-input";
import {
  ANSWER_KIND_NAMES,
  type Answer,
  type AnswerKind,
  type AnyValue,
} from "@/lib/intake/answers";
import type { Field, FieldKey } from "@/lib/intake/fields";
import { ValueInput } from "./value-input";

type Props = {
  field: Field;
  answer: Answer | undefined;
  problem: string | null;
  onAnswer: (key: FieldKey, answer: Answer) => void;
  onLeave: (key: FieldKey) => void;
};

const KINDS = Object.keys(ANSWER_KIND_NAMES) as AnswerKind[];
/** Columns of twelve on a wide screen, written out so that the style sheet has them. */
const SPAN: Record<number, string> = {
  3: "lg:col-span-3",
  4: "lg:col-span-4",
  6: "lg:col-span-6",
  9: "lg:col-span-9",
  12: "lg:col-span-12",
};

const EMPTY_VALUE: Record<Field["kind"], AnyValue> = {
  text: "",
  longText: "",
  number: "",
  count: "",
  choice: "",
  date: "",
  choices: [],
  pieces: [],
  caseNumbers: [],
  range: { min: "", max: "" },
  moment: { date: "", time: "", zone: "" },
  hardness: { scale: "", min: "", max: "", location: "" },
  caseDepth: { process: "", definition: "", min: "", max: "" },
};

/** One question: a value, or why there is none. */
export const FieldRow = memo(function FieldRow({
  field,
  answer,
  problem,
  onAnswer,
  onLeave,
}: Props) {
  const kind = answer?.kind ?? "value";
  const described = describedBy(field.key, { hint: field.help, error: problem });
  return (
    <div className={SPAN[field.columns] ?? "lg:col-span-12"} onBlur={() => onLeave(field.key)}>
      <FieldFrame
        id={field.key}
        label={field.label}
        optional={field.need === "optional"}
        hint={kind === "value" ? field.help : undefined}
        error={problem}
        aside={
          field.need === "optional" ? null : (
            <select
              aria-label={`${field.label}: how it is answered`}
              className="w-18 shrink-0 bg-transparent text-12 text-ink-3"
              value={kind}
              onChange={(event) => {
                const next = KINDS.find((known) => known === event.target.value) ?? "value";
                onAnswer(
                  field.key,
                  next === "value"
                    ? { kind: "value", value: EMPTY_VALUE[field.kind] }
                    : next === "unknown"
                      ? { kind: "unknown", why: "" }
                      : { kind: next },
                );
              }}
            >
              {KINDS.map((known) => (
                <option key={known} value={known}>
                  {ANSWER_KIND_NAMES[known]}
                </option>
              ))}
            </select>
          )
        }
      >
        {kind === "value" ? (
          <ValueInput
            field={field}
            answer={answer}
            failed={problem !== null}
            describedBy={described}
            onChange={(value) => onAnswer(field.key, { kind: "value", value })}
          />
        ) : kind === "unknown" ? (
          <TextInput
            id={field.key}
            failed={problem !== null}
            aria-describedby={described}
            placeholder="Why it is not known"
            value={answer?.kind === "unknown" ? answer.why : ""}
            onChange={(event) => onAnswer(field.key, { kind: "unknown", why: event.target.value })}
          />
        ) : (
          <p
            id={field.key}
            tabIndex={-1}
            className="flex h-control-h items-center rounded-3 border border-dashed border-rule-2 bg-surface-2 px-2.5 text-13 text-ink-2"
          >
            {ANSWER_KIND_NAMES[kind]}
          </p>
        )}
      </FieldFrame>
    </div>
  );
});
