import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { describedBy, hasError, type FieldTexts } from "@/components/ui/field";
import { ErrorText } from "@/components/ui/error-text";

export interface RadioOption {
  value: string;
  label: ReactNode;
  hint?: ReactNode;
  disabled?: boolean;
}

export interface RadioGroupProps extends FieldTexts {
  name: string;
  options: readonly RadioOption[];
  defaultValue?: string;
  value?: string;
  onValueChange?: (value: string) => void;
  /** Side by side where the choices are one word each. */
  inline?: boolean;
  required?: boolean;
  id?: string;
  className?: string;
}

/** Choices of which exactly one holds, in a fieldset of their own. */
export function RadioGroup({
  name,
  options,
  defaultValue,
  value,
  onValueChange,
  inline = false,
  required,
  id = name,
  label,
  hint,
  error,
  optional,
  className,
}: RadioGroupProps) {
  return (
    <fieldset
      id={id}
      tabIndex={-1}
      aria-describedby={describedBy(id, { hint, error })}
      className={className}
    >
      <legend className="mb-1 text-13 font-strong">
        {label}
        {optional ? <span className="font-normal text-ink-3"> optional</span> : null}
      </legend>
      <div className={classNames("flex", inline ? "flex-wrap gap-x-4 gap-y-1" : "flex-col gap-1")}>
        {options.map((option) => (
          <label key={option.value} className="flex min-h-6 items-start gap-2 text-13">
            <input
              type="radio"
              name={name}
              value={option.value}
              required={required}
              disabled={option.disabled}
              defaultChecked={value === undefined ? defaultValue === option.value : undefined}
              checked={value === undefined ? undefined : value === option.value}
              onChange={onValueChange ? () => onValueChange(option.value) : undefined}
              className="mt-1 size-4 shrink-0 appearance-none rounded-full border border-control bg-surface checked:border-[5px] checked:border-action disabled:border-rule-2 disabled:bg-surface-2 pointer-coarse:mt-0.5 pointer-coarse:size-5"
            />
            <span className="pt-0.5">
              {option.label}
              {option.hint ? <span className="block text-12 text-ink-3">{option.hint}</span> : null}
            </span>
          </label>
        ))}
      </div>
      {hasError(error) ? (
        <ErrorText id={`${id}-error`}>
          {typeof error === "string" ? error : error?.join(" ")}
        </ErrorText>
      ) : null}
      {hint ? (
        <span id={`${id}-hint`} className="mt-1 block text-12 text-ink-3">
          {hint}
        </span>
      ) : null}
    </fieldset>
  );
}
