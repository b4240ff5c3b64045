/** What is saved of the findings as they are typed. */
export type Draft = { document: unknown; rootCause: string };
