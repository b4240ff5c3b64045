import type { SectionDefinition } from "../field-types";

export const WHO_SENT_IT = {
  key: "who",
  title: "Who sent it",
  note: "So that the laboratory asks the right person",
  groups: [
    {
      title: null,
      fields: [
        {
          key: "contact",
          kind: "text",
          need: "must",
          label: "Who answers questions",
          help: "Name, telephone or e-mail.",
          columns: 6,
        },
        {
          key: "clientReference",
          kind: "text",
          need: "optional",
          label: "Your reference",
          help: "Order or complaint number.",
          mono: true,
          columns: 6,
        },
        { key: "partOwner", kind: "text", need: "must", label: "Who owns the part", columns: 6 },
        {
          key: "consentGiver",
          kind: "text",
          need: "must",
          label: "Who may agree to cutting",
          help: "Nothing is cut without this person.",
          columns: 6,
        },
      ],
    },
  ],
} as const satisfies SectionDefinition;
