import { useId, type ComponentProps, type ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";

export interface CheckboxProps extends Omit<ComponentProps<"input">, "type"> {
  label: ReactNode;
  /** In a table the row names it: the label is read out and not shown. */
  labelHidden?: boolean;
  hint?: ReactNode;
}

export function Checkbox({
  label,
  labelHidden = false,
  hint,
  id,
  className,
  ...rest
}: CheckboxProps) {
  const ownId = useId();
  const boxId = id ?? ownId;
  return (
    <div className={classNames("flex min-h-6 items-start gap-2 text-13", className)}>
      <span className="relative mt-1 grid size-4 shrink-0 place-items-center pointer-coarse:mt-0.5 pointer-coarse:size-5">
        <input
          type="checkbox"
          id={boxId}
          aria-describedby={hint ? `${boxId}-hint` : undefined}
          className="peer size-full appearance-none rounded-2 border border-control bg-surface checked:border-action checked:bg-action disabled:border-rule-2 disabled:bg-surface-2"
          {...rest}
        />
        <Shape
          name="tick"
          size={12}
          strokeWidth={2.2}
          className="pointer-events-none absolute hidden text-on-action peer-checked:block peer-disabled:text-ink-3"
        />
      </span>
      <span className={labelHidden ? "sr-only" : "pt-0.5"}>
        <label htmlFor={boxId}>{label}</label>
        {hint ? (
          <span id={`${boxId}-hint`} className="block text-12 text-ink-3">
            {hint}
          </span>
        ) : null}
      </span>
    </div>
  );
}
