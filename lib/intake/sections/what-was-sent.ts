import type { SectionDefinition } from "../field-types";

export const WHAT_WAS_SENT = {
  key: "sent",
  title: "What was sent",
  note: "Every piece in the box, and what is not in it",
  groups: [
    {
      title: null,
      fields: [
        { key: "pieces", kind: "pieces", need: "must", label: "Pieces in the box", columns: 12 },
        {
          key: "missingPieces",
          kind: "longText",
          need: "must",
          label: "Pieces that are missing",
          help: "What broke off and was not found, or “none”. The report names them.",
          columns: 6,
        },
        {
          key: "sisterParts",
          kind: "longText",
          need: "should",
          label: "Sound parts of the same kind",
          help: "From the same heat or batch, and whether they can be had.",
          columns: 6,
        },
        {
          key: "fluidsAndDebris",
          kind: "longText",
          need: "should",
          label: "Fluids and debris kept",
          columns: 12,
        },
      ],
    },
  ],
} as const satisfies SectionDefinition;
