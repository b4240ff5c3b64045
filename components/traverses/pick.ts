/** The known name that was chosen in a list; `otherwise` for anything else. */
export const pick = <T extends string>(known: readonly T[], value: string, otherwise: T): T =>
  known.find((name) => name === value) ?? otherwise;
