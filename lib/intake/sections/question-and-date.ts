import { type SectionDefinition, YES_NO } from "../field-types";

export const QUESTION_AND_DATE = {
  key: "question",
  title: "Question and date",
  note: "The scope of the case",
  groups: [
    {
      title: null,
      fields: [
        {
          key: "decision",
          kind: "longText",
          need: "must",
          label: "What will you decide with the answer?",
          columns: 12,
        },
        { key: "neededBy", kind: "date", need: "must", label: "Needed by", columns: 3 },
        {
          key: "neededByReason",
          kind: "text",
          need: "must",
          label: "Why then",
          columns: 9,
        },
      ],
    },
    {
      title: "Limits on the work",
      fields: [
        {
          key: "mayCut",
          kind: "choice",
          need: "must",
          label: "May the parts be cut?",
          choices: [
            { value: "yes", label: "Yes" },
            { value: "ask", label: "Ask first" },
            { value: "no", label: "No" },
          ],
          columns: 6,
        },
        {
          key: "mayKeep",
          kind: "choice",
          need: "must",
          label: "May the laboratory keep them?",
          choices: [
            { value: "yes", label: "Yes" },
            { value: "return", label: "Send them back" },
          ],
          columns: 6,
        },
        {
          key: "litigation",
          kind: "choice",
          need: "must",
          label: "Is there, or may there be, a dispute in law?",
          choices: YES_NO,
          columns: 6,
        },
        {
          key: "warranty",
          kind: "choice",
          need: "must",
          label: "Is it a warranty claim?",
          choices: YES_NO,
          columns: 6,
        },
        {
          key: "exportControl",
          kind: "choice",
          need: "must",
          label: "Is it under export control?",
          choices: YES_NO,
          columns: 6,
        },
        {
          key: "confidentiality",
          kind: "text",
          need: "must",
          label: "Who may not learn of it",
          help: "Names or firms, or “no limit”.",
          columns: 6,
        },
      ],
    },
  ],
} as const satisfies SectionDefinition;
