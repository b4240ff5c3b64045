import type { ReactNode } from "react";
import { Shape } from "@/components/ui/shapes";

const BOX =
  "w-full rounded-3 border border-ib-control bg-ib-surround px-2.5 text-14 text-ib-ink aria-invalid:border-ib-final";

type Common = { id: string; label: string; hint?: ReactNode; error?: string };

function Around({ id, label, hint, error, children }: Common & { children: ReactNode }) {
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-13 font-strong">
        {label}
      </label>
      {children}
      {hint ? (
        <p id={`${id}-hint`} className="text-12 text-ib-ink-2">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={`${id}-error`} className="flex gap-1.5 text-12 text-ib-final">
          <Shape name="triangle" size={14} className="shrink-0" />
          {error}
        </p>
      ) : null}
    </div>
  );
}

const describedBy = ({ id, hint, error }: Common) =>
  [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(" ") || undefined;

export function BenchInput({
  value,
  onChange,
  unit,
  numeric = false,
  ...common
}: Common & {
  value: string;
  onChange: (value: string) => void;
  unit?: string;
  numeric?: boolean;
}) {
  return (
    <Around {...common}>
      <span className="relative block">
        <input
          id={common.id}
          value={value}
          onChange={(event) => onChange(event.target.value)}
          inputMode={numeric ? "decimal" : undefined}
          autoComplete="off"
          aria-describedby={describedBy(common)}
          aria-invalid={common.error ? true : undefined}
          className={`${BOX} h-10 tn raw pointer-coarse:h-touch ${unit ? "pr-12" : ""}`}
        />
        {unit ? (
          <span className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-13 text-ib-ink-2">
            {unit}
          </span>
        ) : null}
      </span>
    </Around>
  );
}

export function BenchSelect({
  value,
  onChange,
  options,
  ...common
}: Common & {
  value: string;
  onChange: (value: string) => void;
  options: readonly { value: string; label: string }[];
}) {
  return (
    <Around {...common}>
      <select
        id={common.id}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        aria-describedby={describedBy(common)}
        className={`${BOX} h-10 pointer-coarse:h-touch`}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </Around>
  );
}

export function BenchTextArea({
  value,
  onChange,
  ...common
}: Common & { value: string; onChange: (value: string) => void }) {
  return (
    <Around {...common}>
      <textarea
        id={common.id}
        value={value}
        rows={3}
        onChange={(event) => onChange(event.target.value)}
        aria-describedby={describedBy(common)}
        aria-invalid={common.error ? true : undefined}
        className={`${BOX} py-2`}
      />
    </Around>
  );
}

export function BenchCheck({
  id,
  label,
  checked,
  onChange,
}: {
  id: string;
  label: string;
  checked: boolean;
  onChange: (checked: boolean) => void;
}) {
  return (
    <label htmlFor={id} className="flex min-h-8 items-center gap-2 text-13 pointer-coarse:min-h-11">
      <input
        id={id}
        type="checkbox"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
        className="size-[18px] accent-ib-ink"
      />
      {label}
    </label>
  );
}
