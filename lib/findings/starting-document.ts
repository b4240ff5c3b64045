import { type DocumentNode, SECTION_HEADING } from "./document";
import { SECTIONS } from "./sections";

/** An unwritten document: every section with an empty line under it. */
export function startingDocument(): DocumentNode {
  return {
    type: "doc",
    content: SECTIONS.flatMap(({ key, title }) => [
      { type: SECTION_HEADING, attrs: { key, title } },
      { type: "paragraph" },
    ]),
  };
}
