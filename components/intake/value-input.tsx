"use client";

import { Checkbox } from "@/components/ui/checkbox";
import { Select } from "@/components/ui/select";
import { TextArea } from "@/components/ui/text-area";
import { TextInput } from "@/components/ui/text-input";
import { type Answer, type AnyValue, valueAs } from "@/lib/intake/answers";
import {
  DEPTH_DEFINITION_NAMES,
  DEPTH_DEFINITIONS,
  REQUIRED_HARDNESS_SCALES,
} from "@/lib/intake/constants";
import type { Field } from "@/lib/intake/fields";
import { HARDENING_PROCESS_NAMES, HARDENING_PROCESSES } from "@/lib/traverses/constants";
import { PiecesInput } from "./pieces-input";

type Props = {
  field: Field;
  answer: Answer | undefined;
  failed: boolean;
  describedBy: string | undefined;
  onChange: (value: AnyValue) => void;
};

const ZONES = [
  "Europe/London",
  "Europe/Berlin",
  "Europe/Lisbon",
  "Europe/Athens",
  "UTC",
  "America/New_York",
  "America/Chicago",
  "America/Los_Angeles",
  "Asia/Singapore",
  "Asia/Tokyo",
  "Australia/Sydney",
];
const option = (value: string) => ({ value, label: value });

/** The control of one field; it keeps whatever is typed. */
export function ValueInput({ field, answer, failed, describedBy, onChange }: Props) {
  const id = field.key;
  const common = { id, failed, "aria-describedby": describedBy };
  const part = (name: string) => `${field.label}, ${name}`;
  switch (field.kind) {
    case "text":
      return (
        <>
          <TextInput
            {...common}
            className={field.mono ? "font-mono text-13" : undefined}
            list={field.suggestions ? `${id}-suggestions` : undefined}
            value={valueAs("text", answer)}
            onChange={(event) => onChange(event.target.value)}
          />
          {field.suggestions && (
            <datalist id={`${id}-suggestions`}>
              {field.suggestions.map((text) => (
                <option key={text} value={text} />
              ))}
            </datalist>
          )}
        </>
      );
    case "longText":
      return (
        <TextArea
          {...common}
          rows={3}
          value={valueAs("longText", answer)}
          onChange={(event) => onChange(event.target.value)}
        />
      );
    case "number":
    case "count":
      return (
        <TextInput
          {...common}
          inputMode="decimal"
          autoComplete="off"
          unit={field.kind === "number" ? field.unit : undefined}
          value={valueAs("number", answer)}
          onChange={(event) => onChange(event.target.value)}
        />
      );
    case "date":
      return (
        <TextInput
          {...common}
          type="date"
          value={valueAs("date", answer)}
          onChange={(event) => onChange(event.target.value)}
        />
      );
    case "choice":
      return (
        <Select
          {...common}
          value={valueAs("choice", answer)}
          placeholder="Choose one"
          options={[...field.choices]}
          onChange={(event) => onChange(event.target.value)}
        />
      );
    case "choices": {
      const chosen = valueAs("choices", answer);
      return (
        <div
          id={id}
          role="group"
          aria-label={field.label}
          aria-describedby={describedBy}
          tabIndex={-1}
          className="flex flex-wrap gap-x-4 gap-y-1.5"
        >
          {field.choices.map(({ value, label }) => (
            <Checkbox
              key={value}
              label={label}
              checked={chosen.includes(value)}
              onChange={(event) =>
                onChange(
                  event.target.checked
                    ? [...chosen, value]
                    : chosen.filter((other) => other !== value),
                )
              }
            />
          ))}
        </div>
      );
    }
    case "range": {
      const value = valueAs("range", answer);
      return (
        <div className="flex items-center gap-2">
          <TextInput
            {...common}
            aria-label={part("least")}
            inputMode="decimal"
            value={value.min}
            onChange={(event) => onChange({ ...value, min: event.target.value })}
          />
          to
          <TextInput
            failed={failed}
            aria-label={part("most")}
            inputMode="decimal"
            unit={field.unit}
            value={value.max}
            onChange={(event) => onChange({ ...value, max: event.target.value })}
          />
        </div>
      );
    }
    case "moment": {
      const value = valueAs("moment", answer);
      const zone = value.zone || "Europe/London";
      return (
        <div className="flex flex-wrap gap-2">
          <div className="min-w-36 flex-1">
            <TextInput
              {...common}
              type="date"
              aria-label={part("day")}
              value={value.date}
              onChange={(event) => onChange({ ...value, zone, date: event.target.value })}
            />
          </div>
          <div className="w-28">
            <TextInput
              failed={failed}
              type="time"
              aria-label={part("time")}
              value={value.time}
              onChange={(event) => onChange({ ...value, zone, time: event.target.value })}
            />
          </div>
          <div className="w-44">
            <Select
              aria-label={part("time zone")}
              value={zone}
              options={ZONES.map(option)}
              onChange={(event) => onChange({ ...value, zone: event.target.value })}
            />
          </div>
        </div>
      );
    }
    case "hardness": {
      const value = valueAs("hardness", answer);
      return (
        <div className="grid grid-cols-2 gap-2 lg:grid-cols-[8rem_8rem_9rem_minmax(0,1fr)]">
          <TextInput
            {...common}
            aria-label={part("least")}
            placeholder="least"
            inputMode="decimal"
            value={value.min}
            onChange={(event) => onChange({ ...value, min: event.target.value })}
          />
          <TextInput
            failed={failed}
            aria-label={part("most")}
            placeholder="most"
            inputMode="decimal"
            value={value.max}
            onChange={(event) => onChange({ ...value, max: event.target.value })}
          />
          <Select
            aria-label={part("scale")}
            value={value.scale}
            placeholder="Scale"
            options={REQUIRED_HARDNESS_SCALES.map(option)}
            onChange={(event) => onChange({ ...value, scale: event.target.value })}
          />
          <TextInput
            failed={failed}
            aria-label={part("where it holds")}
            placeholder="where it holds"
            value={value.location}
            onChange={(event) => onChange({ ...value, location: event.target.value })}
          />
        </div>
      );
    }
    case "caseDepth": {
      const value = valueAs("caseDepth", answer);
      return (
        <div className="grid grid-cols-2 gap-2 lg:grid-cols-[12rem_minmax(0,1fr)_8rem_8rem]">
          <Select
            {...common}
            aria-label={part("process")}
            value={value.process}
            placeholder="Process"
            options={HARDENING_PROCESSES.map((name) => ({
              value: name,
              label: HARDENING_PROCESS_NAMES[name],
            }))}
            onChange={(event) => onChange({ ...value, process: event.target.value })}
          />
          <Select
            aria-label={part("what it means")}
            value={value.definition}
            placeholder="What the depth means"
            options={DEPTH_DEFINITIONS.map((name) => ({
              value: name,
              label: DEPTH_DEFINITION_NAMES[name],
            }))}
            onChange={(event) => onChange({ ...value, definition: event.target.value })}
          />
          <TextInput
            failed={failed}
            aria-label={part("least")}
            placeholder="least"
            inputMode="decimal"
            unit="mm"
            value={value.min}
            onChange={(event) => onChange({ ...value, min: event.target.value })}
          />
          <TextInput
            failed={failed}
            aria-label={part("most")}
            placeholder="most"
            inputMode="decimal"
            unit="mm"
            value={value.max}
            onChange={(event) => onChange({ ...value, max: event.target.value })}
          />
        </div>
      );
    }
    case "pieces":
      return (
        <PiecesInput
          id={id}
          pieces={valueAs("pieces", answer)}
          describedBy={describedBy}
          onChange={onChange}
        />
      );
    case "caseNumbers":
      return (
        <TextInput
          {...common}
          className="font-mono text-13"
          placeholder="RL-2025-0211, RL-2024-0067"
          value={valueAs("caseNumbers", answer).join(", ")}
          onChange={(event) =>
            onChange(event.target.value === "" ? [] : event.target.value.split(/[,;]\s*/))
          }
        />
      );
  }
}
