import { getSchema } from "@tiptap/core";
import type { Node as PartNode } from "@tiptap/pm/model";
import { type DocumentNode, SECTION_HEADING } from "./document";
import { FINDINGS_EXTENSIONS } from "./extensions";
import { SECTIONS } from "./sections";

const schema = getSchema(FINDINGS_EXTENSIONS);
const PLACE = new Map<string, number>(SECTIONS.map(({ key }, i) => [key, i]));

/** A checked document as the editor holds it. */
export function documentTree(document: DocumentNode): PartNode {
  return schema.nodeFromJSON(document);
}

/**
 * What is wrong with how the parts of a document stand in one another, by the editor's own rules;
 * null when nothing is. The parts are known ones already.
 */
export function structureProblem(document: DocumentNode): string | null {
  try {
    schema.nodeFromJSON(document).check();
  } catch (error) {
    // The library tells what is wrong by throwing a RangeError; anything else is a fault of ours.
    if (!(error instanceof RangeError)) throw error;
    return "A part of the text stands where it cannot stand.";
  }
  return sectionProblem(document);
}

/** Sections keep their order and stand once, at the top level. */
function sectionProblem(document: DocumentNode): string | null {
  let last = -1;
  for (const node of document.content ?? []) {
    if (node.type !== SECTION_HEADING) continue;
    const place = PLACE.get(String(node.attrs?.key));
    if (place === undefined) return "The text has a section that findings do not have.";
    if (place <= last) return "The sections of the findings stand in another order.";
    last = place;
  }
  return null;
}
