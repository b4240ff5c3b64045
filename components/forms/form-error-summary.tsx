"use client";

import { useEffect, useRef } from "react";
import { Shape } from "@/components/ui/shapes";

export interface FormError {
  /** Id of the field, which is its name unless the form says otherwise. */
  id: string;
  message: string;
}

/** Errors of an answer as a list: `{ depthMm: "This needs one number." }`. */
export function formErrors(
  fields: Readonly<Record<string, string | readonly string[]>>,
): FormError[] {
  return Object.entries(fields).map(([id, message]) => ({
    id,
    message: typeof message === "string" ? message : message.join(" "),
  }));
}

/** All that is wrong with a form, each with a link to its field. It takes the focus when it comes. */
export function FormErrorSummary({
  errors,
  title,
}: {
  errors: readonly FormError[];
  title?: string;
}) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (errors.length > 0) box.current?.focus();
  }, [errors]);
  if (errors.length === 0) return null;
  const count = errors.length === 1 ? "1 thing needs" : `${errors.length} things need`;
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="group"
      aria-label="What needs a change"
      className="rounded-3 border border-l-[3px] border-rule-2 border-l-bad-mark bg-bad-tint px-3 py-2 text-13"
    >
      <p className="flex items-center gap-2 font-strong">
        <Shape name="triangle" className="shrink-0 text-bad" />
        {title ?? `Not sent yet: ${count} a change. What you typed is kept.`}
      </p>
      <ul className="mt-1 ml-6 list-disc">
        {errors.map(({ id, message }) => (
          <li key={id}>
            <a
              href={`#${id}`}
              onClick={(event) => {
                const field = document.getElementById(id);
                if (!field) return;
                event.preventDefault();
                field.focus();
              }}
            >
              {message}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}
