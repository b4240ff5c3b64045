/** Phrases that reviewers strike, with what to write instead. House rules, common practice. */
const FLAGGED: readonly { pattern: RegExp; instead: string }[] = [
  {
    pattern: /reasonable degree of (?:scientific|engineering) certainty/i,
    instead: "Say how sure it is: established, probable, possible.",
  },
  {
    pattern: /crystalli[sz]ed metal/i,
    instead: "Metal is crystalline from the start. Say what was seen.",
  },
  { pattern: /\bdefective\b/i, instead: "Name the requirement that is not met." },
  { pattern: /\b(?:clearly|obviously)\b/i, instead: "Leave the word out, or show why." },
  { pattern: /\bproves?\b/i, instead: "Say “shows” or “is evidence for”." },
  {
    pattern: /\b(?:negligen(?:t|ce)|liable|liability|at fault)\b/i,
    instead: "Law is not for this report to decide.",
  },
  { pattern: /\b(?:always|never)\b/i, instead: "Say what was examined and what was found." },
  {
    pattern: /river lines? (?:converge|point|lead)s? (?:back )?(?:on|to) the origin/i,
    instead: "River lines run together away from the origin.",
  },
];

export type FlaggedPhrase = { phrase: string; instead: string };

/** Flagged phrases in a text, each once. */
export function flaggedPhrases(text: string): FlaggedPhrase[] {
  return FLAGGED.flatMap(({ pattern, instead }) => {
    const found = pattern.exec(text);
    return found ? [{ phrase: found[0], instead }] : [];
  });
}
