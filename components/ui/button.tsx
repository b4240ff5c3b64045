import { useId, type ComponentProps } from "react";
import { buttonClasses, type ButtonShape } from "@/components/ui/button-look";
import { classNames } from "@/components/ui/class-names";

export interface ButtonProps extends ComponentProps<"button">, ButtonShape {
  /** Why the act is not open now. The button stays in place and in the tab order, and says so. */
  disabledReason?: string | null;
  /** Hide the reason from view where the page already shows it; it is still read out. */
  reasonHidden?: boolean;
}

/** A button. Its words say what happens ("Hand over E1.1"); type is "button" unless given. */
export function Button({
  look,
  small,
  icon,
  disabledReason,
  reasonHidden = false,
  className,
  type = "button",
  ...rest
}: ButtonProps) {
  const reasonId = useId();
  if (!disabledReason) {
    return (
      <button
        type={type}
        className={classNames(buttonClasses({ look, small, icon }), className)}
        {...rest}
      />
    );
  }
  // Not the disabled attribute: it would take the button, and with it the reason, from the keyboard.
  const { onClick: _onClick, formAction: _formAction, disabled: _disabled, ...shown } = rest;
  return (
    <span className="inline-flex items-center gap-3">
      <button
        {...shown}
        type="button"
        aria-disabled="true"
        aria-describedby={reasonId}
        className={classNames(buttonClasses({ look, small, icon }, true), className)}
      />
      <span id={reasonId} className={reasonHidden ? "sr-only" : "text-12 text-ink-2"}>
        {disabledReason}
      </span>
    </span>
  );
}
