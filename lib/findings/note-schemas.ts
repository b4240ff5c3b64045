import { z } from "zod";
import { NOTE_KINDS, NOTE_SEVERITIES, NOTE_WORDS_MAX, PASSAGE_MAX } from "./constants";
import { SECTIONS, type SectionKey } from "./sections";

const id = z.string().min(1).max(40);
const words = z.string().trim().max(NOTE_WORDS_MAX, `Use at most ${NOTE_WORDS_MAX} characters.`);
const SECTION_KEYS = SECTIONS.map(({ key }) => key) as [SectionKey, ...SectionKey[]];

export const LeaveNoteInput = z.object({
  caseId: id,
  section: z.enum(SECTION_KEYS, "Choose the section."),
  /** Words of the text that the note is about; empty for the section as a whole. */
  passage: z
    .string()
    .trim()
    .max(PASSAGE_MAX, `At most ${PASSAGE_MAX} characters. Name the first words of the passage.`),
  /** Picture or traverse of the figure that the note is about. */
  figureId: id.nullable(),
  kind: z.enum(NOTE_KINDS),
  severity: z.enum(NOTE_SEVERITIES),
  words: words.min(1, "Say what should change."),
});

export const AnswerNoteInput = z
  .object({ caseId: id, noteId: id, act: z.enum(["answered", "done"]), words })
  .refine((input) => input.act === "done" || input.words !== "", {
    path: ["words"],
    error: "Write the answer.",
  });

export const ReturnNoteInput = z
  .object({ caseId: id, noteId: id, act: z.enum(["reopened", "withdrawn"]), words })
  .refine((input) => input.act === "withdrawn" || input.words !== "", {
    path: ["words"],
    error: "Say what is still open.",
  });
