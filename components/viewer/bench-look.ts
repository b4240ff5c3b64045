import { classNames } from "@/components/ui/class-names";

/** Panels of the bench: neutral grey whatever the theme, so that the picture's tones are not tinted. */
export const BENCH_PANEL = "rounded-4 border border-ib-rule bg-ib-panel text-ib-ink";

export const BENCH_LINK =
  "min-h-6 text-13 text-ib-front underline underline-offset-3 hover:text-ib-ink pointer-coarse:min-h-touch";

/** A button of the bench, 44 px high. */
export function benchButton({ primary = false, small = false } = {}): string {
  return classNames(
    "inline-flex shrink-0 items-center justify-center gap-[7px] rounded-3 border font-medium whitespace-nowrap no-underline",
    "disabled:cursor-not-allowed disabled:border-ib-rule disabled:bg-ib-panel disabled:text-ib-control",
    small
      ? "h-8 px-2.5 text-13 pointer-coarse:h-touch pointer-coarse:min-w-touch"
      : "h-touch px-3.5 text-14",
    primary
      ? "border-ib-ink bg-ib-ink text-black hover:bg-white hover:text-black"
      : "border-ib-control bg-ib-panel text-ib-ink hover:bg-ib-panel-2 hover:text-ib-ink",
  );
}
