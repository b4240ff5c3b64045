import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { ErrorText } from "@/components/ui/error-text";

export interface FieldTexts {
  label: ReactNode;
  /** Help below the field. */
  hint?: ReactNode;
  /** One sentence, or several; shown under the field and tied to it. */
  error?: string | readonly string[] | null;
  optional?: boolean;
}

/** Ids of help and error for aria-describedby, in reading order; undefined when there is neither. */
export function describedBy(
  id: string,
  { hint, error }: Pick<FieldTexts, "hint" | "error">,
): string | undefined {
  const ids = [hasError(error) && `${id}-error`, Boolean(hint) && `${id}-hint`].filter(Boolean);
  return ids.length > 0 ? ids.join(" ") : undefined;
}

export function hasError(error: FieldTexts["error"]): boolean {
  return typeof error === "string" ? error !== "" : (error?.length ?? 0) > 0;
}

export interface FieldProps extends FieldTexts {
  /** Id of the control inside; the label points to it. */
  id: string;
  /** At the right of the label: "Forgotten it?" */
  aside?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** Label above, control, error and help below. Give the control describedBy(id, ...) yourself, or
 *  use TextField, TextAreaField or SelectField, which do. */
export function Field({
  id,
  label,
  hint,
  error,
  optional,
  aside,
  className,
  children,
}: FieldProps) {
  return (
    <div className={className}>
      <div className="mb-1 flex items-baseline justify-between gap-3 text-13">
        <label htmlFor={id} className="font-strong">
          {label}
          {optional ? <span className="font-normal text-ink-3"> optional</span> : null}
        </label>
        {aside}
      </div>
      {children}
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
    </div>
  );
}

/** The edge shared by every kind of field. */
export function fieldEdge(failed: boolean): string {
  return classNames(
    "w-full rounded-3 border bg-surface text-ink has-[:focus-visible]:outline-2 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-focus",
    failed ? "border-bad-mark shadow-edge-bad" : "border-control",
  );
}
