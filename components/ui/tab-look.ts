import { classNames } from "@/components/ui/class-names";

/** A tab that stands on the line below it and opens into the page when chosen. */
export function tabClasses(current: boolean): string {
  return classNames(
    "-mb-px flex h-9 shrink-0 items-center gap-[7px] rounded-t-3 border border-b-0 px-3 whitespace-nowrap no-underline pointer-coarse:h-touch",
    current
      ? "border-rule-2 bg-surface font-strong text-ink hover:text-ink"
      : "border-transparent text-ink-2 hover:text-ink",
  );
}

export const TAB_ROW = "flex gap-0.5 overflow-x-auto border-b border-rule-2 px-4";
