import "server-only";
import { BLUE, INK, INK_2 } from "./page-geometry";
import type { TextStyle } from "./typeset";

export type BlockStyle = TextStyle & { leadingPt: number };

const serif = { family: "serif", weight: "regular", colour: INK } as const;
const sans = { family: "sans", weight: "regular", colour: INK } as const;

/** Sizes and leading of everything set in type, in points. */
export const STYLES = {
  text: { ...serif, sizePt: 10.9, leadingPt: 15.8 },
  answer: { ...serif, sizePt: 12.4, leadingPt: 18.75 },
  title: { ...serif, weight: "semibold", sizePt: 21.75, leadingPt: 26.25 },
  section: { ...serif, weight: "semibold", sizePt: 15, leadingPt: 20.25 },
  sectionNumber: { ...serif, colour: INK_2, sizePt: 15, leadingPt: 20.25 },
  heading1: { ...sans, weight: "semibold", sizePt: 11.25, leadingPt: 15.75 },
  heading2: { ...sans, weight: "semibold", sizePt: 9.75, leadingPt: 13.5 },
  heading3: { ...sans, weight: "medium", sizePt: 9.75, leadingPt: 13.5, colour: INK_2 },
  answerHead: { ...sans, weight: "semibold", sizePt: 9.75, leadingPt: 13.5, colour: BLUE },
  kicker: { ...sans, sizePt: 9.4, leadingPt: 13.5, colour: INK_2 },
  fact: { ...sans, sizePt: 9.4, leadingPt: 13.5 },
  factLabel: { ...sans, sizePt: 9.4, leadingPt: 13.5, colour: INK_2 },
  table: { ...sans, sizePt: 9.4, leadingPt: 13.5, tabular: true },
  tableHead: { ...sans, weight: "medium", sizePt: 9.4, leadingPt: 13.5 },
  tableCaption: { ...sans, weight: "semibold", sizePt: 9.4, leadingPt: 13.5 },
  caption: { ...sans, sizePt: 8.6, leadingPt: 12, colour: INK_2 },
  small: { ...sans, sizePt: 8.6, leadingPt: 12, colour: INK_2 },
  footnote: { ...sans, sizePt: 8, leadingPt: 11, colour: INK_2 },
  furniture: { ...sans, sizePt: 8.25, leadingPt: 12, colour: INK_2 },
  furnitureMono: { ...sans, family: "mono", sizePt: 8.25, leadingPt: 12, colour: INK_2 },
  laboratory: { ...sans, weight: "semibold", sizePt: 9.75, leadingPt: 12.75 },
  caseNumber: { ...sans, family: "mono", sizePt: 9.75, leadingPt: 12.75 },
  signatory: { ...sans, weight: "semibold", sizePt: 10.1, leadingPt: 14.25 },
  code: { ...sans, family: "mono", sizePt: 9, leadingPt: 13 },
} as const satisfies Record<string, BlockStyle>;
