/** One or two capitals for a person: first letters of the first and the last name. */
export function initials(name: string): string {
  const words = name.trim().split(/\s+/).filter(Boolean);
  const letters = [words[0], words.length > 1 ? words.at(-1) : undefined];
  return letters.map((word) => [...(word ?? "")][0]?.toUpperCase() ?? "").join("");
}
