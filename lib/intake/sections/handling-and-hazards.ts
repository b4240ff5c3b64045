import { HAZARDS } from "@/lib/evidence/constants";
import { SUSPECT_NAMES, SUSPECTS } from "../constants";
import { type SectionDefinition, YES_NO } from "../field-types";

const sentenceCase = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

export const HANDLING_AND_HAZARDS = {
  key: "handling",
  title: "Handling and hazards",
  note: "What was done to it since decides what can still be read from it",
  groups: [
    {
      title: null,
      fields: [
        {
          key: "suspects",
          kind: "choices",
          need: "should",
          label: "What do you suspect?",
          help: "It changes how to pack the parts. It does not bind anyone.",
          choices: SUSPECTS.map((value) => ({ value, label: SUSPECT_NAMES[value] })),
          columns: 12,
        },
        {
          key: "handledBy",
          kind: "text",
          need: "must",
          label: "Who has handled it since",
          columns: 6,
        },
        {
          key: "storedHow",
          kind: "text",
          need: "must",
          label: "Where and how it was kept",
          columns: 6,
        },
        {
          key: "facesFitted",
          kind: "choice",
          need: "must",
          label: "Were the broken faces fitted together?",
          choices: YES_NO,
          columns: 6,
        },
        {
          key: "oiled",
          kind: "choice",
          need: "must",
          label: "Was it oiled or greased since?",
          choices: YES_NO,
          columns: 6,
        },
        {
          key: "cleaned",
          kind: "text",
          need: "must",
          label: "How it was cleaned",
          help: "Agent and tool, or “not cleaned”.",
          columns: 6,
        },
        {
          key: "weldedOrCut",
          kind: "text",
          need: "must",
          label: "Welded, drilled, dressed or cut since",
          help: "What and where, or “no”.",
          columns: 6,
        },
        {
          key: "hazards",
          kind: "choices",
          need: "must",
          label: "Hazards for those who unpack it",
          choices: [
            ...HAZARDS.map((value) => ({ value, label: sentenceCase(value) })),
            { value: "none", label: "None known" },
          ],
          columns: 12,
        },
        {
          key: "residues",
          kind: "text",
          need: "must",
          label: "Residues on it",
          help: "Blood, hydrocarbons, asbestos, lead, cadmium, chromate, beryllium, or “none known”.",
          columns: 12,
        },
      ],
    },
  ],
} as const satisfies SectionDefinition;
