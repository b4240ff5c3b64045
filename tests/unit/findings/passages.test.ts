import { describe, expect, test } from "vitest";
import { FIGURE, type DocumentNode } from "@/lib/findings/document";
import { documentTree } from "@/lib/findings/document-structure";
import { findFigure, findPassage, passageAt, sectionTexts } from "@/lib/findings/passages";
import { cite, findingsWith, words } from "../../helpers/findings-text";

const depth = cite({
  recordId: "rec_1",
  versionId: "ver_1",
  field: "caseDepth",
  text: "1.95 ± 0.06 mm",
  tag: "T2",
});
const bold: DocumentNode = { type: "text", text: "fillet", marks: [{ type: "bold" }] };
const figure: DocumentNode = { type: FIGURE, attrs: { imageId: "img_1", caption: "Origin" } };
const document = findingsWith(
  words("The hardened layer ends at ", depth, ", before the ", bold, " starts."),
  figure,
  words("A fillet left  unhardened\u00a0carries the stress."),
);
const tree = documentTree(document);
const sections = sectionTexts(tree);

describe("places in the text of the findings", () => {
  test("a section reads as on the page: cited values in words, styles and line ends as spaces", () => {
    expect(sections.get("answer")?.text.trim()).toBe(
      "The hardened layer ends at 1.95 ± 0.06 mm, before the fillet starts. A fillet left unhardened carries the stress.",
    );
    expect([...sections.keys()].slice(0, 3)).toEqual(["answer", "scope", "background"]);
  });

  test.each(["hardened layer ends", "at 1.95 ± 0.06 mm, before", "the fillet starts. A fillet"])(
    "%j is found and gives itself back",
    (passage) => {
      const found = findPassage(sections, "answer", passage);
      if (!found) throw new Error("not found");
      expect(passageAt(tree, found)).toEqual({ section: "answer", passage });
    },
  );

  test("words of another section, and words that are gone, are not found", () => {
    expect(findPassage(sections, "hardness", "hardened layer")).toBeNull();
    expect(findPassage(sections, "answer", "softened layer")).toBeNull();
    expect(findPassage(sections, "answer", "")).toBeNull();
    expect(findPassage(sections, "nowhere", "layer")).toBeNull();
  });

  test("a choice across sections is cut at the end of the first", () => {
    const from = findPassage(sections, "answer", "carries the stress.")?.from ?? 0;
    expect(passageAt(tree, { from, to: tree.content.size })).toEqual({
      section: "answer",
      passage: "carries the stress.",
    });
  });

  test("a cursor without a choice gives its section alone", () => {
    const head = sections.get("hardness")?.head ?? 0;
    expect(passageAt(tree, { from: head + 2, to: head + 2 })).toEqual({
      section: "hardness",
      passage: "",
    });
  });

  test("a figure is found by what it shows", () => {
    expect(findFigure(tree, "img_1")).toMatchObject({ to: expect.any(Number) });
    expect(findFigure(tree, "img_2")).toBeNull();
  });
});
