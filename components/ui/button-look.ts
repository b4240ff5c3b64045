import { classNames } from "@/components/ui/class-names";

export type ButtonLook = "primary" | "secondary" | "quiet" | "danger";

export interface ButtonShape {
  /** primary is for the one act a screen is for. */
  look?: ButtonLook;
  small?: boolean;
  /** A square button that holds a shape only; give it an aria-label. */
  icon?: boolean;
}

const LOOKS: Record<ButtonLook, string> = {
  primary:
    "border-action bg-action text-on-action hover:border-action-2 hover:bg-action-2 hover:text-on-action",
  secondary: "border-control bg-surface text-ink hover:bg-surface-2 hover:text-ink",
  quiet: "border-transparent bg-transparent text-action hover:bg-action-tint hover:text-action-2",
  danger: "border-bad-mark bg-surface text-bad hover:bg-bad-tint hover:text-bad",
};

const STOPPED = "border-rule-2 bg-surface-2 text-ink-3";

/** Class names that make a button or a link look like one of the four kinds of button. */
export function buttonClasses(
  { look = "secondary", small = false, icon = false }: ButtonShape,
  stopped = false,
): string {
  return classNames(
    "inline-flex shrink-0 items-center justify-center gap-[7px] rounded-3 border font-medium whitespace-nowrap no-underline transition-colors duration-quick",
    "disabled:cursor-not-allowed disabled:border-rule-2 disabled:bg-surface-2 disabled:text-ink-3",
    small ? "h-[26px] text-13 pointer-coarse:h-touch" : "h-control-h text-14",
    icon ? (small ? "w-[26px] pointer-coarse:w-touch" : "w-control-h") : small ? "px-2" : "px-3",
    stopped ? STOPPED : LOOKS[look],
  );
}
