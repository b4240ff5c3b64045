import type { ComponentProps } from "react";
import { classNames } from "@/components/ui/class-names";
import { fieldEdge } from "@/components/ui/field";
import { Shape } from "@/components/ui/shapes";

export interface SelectOption {
  value: string;
  label: string;
  disabled?: boolean;
}

export interface SelectProps extends ComponentProps<"select"> {
  options?: readonly SelectOption[];
  /** First, empty choice: "Choose a table". */
  placeholder?: string;
  failed?: boolean;
  boxClassName?: string;
}

/** The browser's own list, with our edge: it works with every keyboard, phone and reader. */
export function Select({
  options,
  placeholder,
  failed = false,
  boxClassName,
  className,
  children,
  ...rest
}: SelectProps) {
  return (
    <div className={classNames(fieldEdge(failed), "relative flex h-control-h", boxClassName)}>
      <select
        aria-invalid={failed || undefined}
        className={classNames(
          "h-full w-full appearance-none bg-transparent pr-8 pl-[9px] text-14 outline-none disabled:text-ink-3",
          className,
        )}
        {...rest}
      >
        {placeholder === undefined ? null : <option value="">{placeholder}</option>}
        {options?.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
        {children}
      </select>
      <Shape
        name="chevron"
        size={14}
        className="pointer-events-none absolute top-1/2 right-2 -translate-y-1/2 text-ink-3"
      />
    </div>
  );
}
