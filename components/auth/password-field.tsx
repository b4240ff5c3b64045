"use client";

import { type ReactNode, useState } from "react";
import { Eye, EyeOff } from "lucide-react";
import { describedBy, Field, fieldEdge, hasError } from "@/components/ui/field";
import { classNames } from "@/components/ui/class-names";

type Props = {
  name: string;
  label: string;
  autoComplete: "current-password" | "new-password";
  aside?: ReactNode;
  hint?: string;
  error?: string | null;
  onKeyDown?: React.KeyboardEventHandler<HTMLInputElement>;
};

/** A password that can be shown, and that says when caps lock is on. Paste and managers work. */
export function PasswordField({ name, label, autoComplete, aside, hint, error, onKeyDown }: Props) {
  const [isShown, setShown] = useState(false);
  const [hasCapsLock, setCapsLock] = useState(false);
  const Icon = isShown ? EyeOff : Eye;
  return (
    <Field
      id={name}
      label={label}
      aside={aside}
      error={error}
      hint={hasCapsLock ? "Caps lock is on." : hint}
    >
      <div className={classNames(fieldEdge(hasError(error)), "flex h-10 items-center")}>
        <input
          id={name}
          name={name}
          type={isShown ? "text" : "password"}
          autoComplete={autoComplete}
          required
          maxLength={200}
          className="h-full w-full min-w-0 bg-transparent px-[9px] outline-none"
          aria-invalid={hasError(error) || undefined}
          aria-describedby={describedBy(name, { hint: hasCapsLock ? "caps" : hint, error })}
          onKeyUp={(event) => setCapsLock(event.getModifierState("CapsLock"))}
          onKeyDown={onKeyDown}
        />
        <button
          type="button"
          className="flex h-full items-center gap-1 px-2 text-13 text-action"
          aria-pressed={isShown}
          onClick={() => setShown(!isShown)}
        >
          <Icon size={15} aria-hidden="true" /> {isShown ? "Hide" : "Show"}
        </button>
      </div>
    </Field>
  );
}
