/** Joins class names and leaves out what is switched off. */
export function classNames(...parts: readonly (string | false | null | undefined)[]): string {
  return parts.filter(Boolean).join(" ");
}
