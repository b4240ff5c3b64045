/** Sections of the findings in their fixed order. What stands under "answer" opens the report. */
export const SECTIONS = [
  { key: "answer", title: "Answer" },
  { key: "scope", title: "What was asked" },
  { key: "background", title: "Background as supplied" },
  { key: "sent", title: "What was sent" },
  { key: "custody", title: "Custody and permissions" },
  { key: "methods", title: "Methods and equipment" },
  { key: "fractography", title: "Fractography" },
  { key: "hardness", title: "Hardness" },
  { key: "microstructure", title: "Microstructure" },
  { key: "strength", title: "Strength" },
  { key: "weighing", title: "Weighing" },
  { key: "conclusions", title: "Conclusions" },
  { key: "limitations", title: "Limitations" },
  { key: "actions", title: "What to do" },
  { key: "disposition", title: "Where the items are" },
] as const;
export type SectionKey = (typeof SECTIONS)[number]["key"];

/** What each section is for, shown where nothing is written yet. */
export const SECTION_HINTS: Record<SectionKey, string> = {
  answer: "What failed, how and why, how sure that is, and what is not known. One page.",
  scope: "The questions, what was left out, and who limited it.",
  background: "Service, loads and history as the owner stated them, not verified.",
  sent: "Pieces received, their condition, and what is missing.",
  custody: "Gaps in the chain, seals found broken, and who allowed what was cut. Else: unbroken.",
  methods:
    "How it was examined, with which equipment, by which edition, and what departed from it.",
  fractography: "What was seen on the fracture, facts only.",
  hardness: "Readings, depths and whether they meet the drawing, with the rule used.",
  microstructure: "What the sections show.",
  strength: "Whether hardness, structure, tests and drawing agree.",
  weighing: "Mechanisms considered, and what speaks against the one that stands.",
  conclusions: "Numbered, each with how sure it is.",
  limitations: "Rubbed areas, sample size, conversions, what nobody knew.",
  actions: "Each tied to a conclusion, with an owner and how it is checked.",
  disposition: "Where each piece is, until when.",
};
