import { describe, expect, it } from "vitest";
import { flaggedPhrases } from "@/components/editor/flagged-phrases";

// House rules on wording, common practice of failure reports; no published list is followed.
describe("flagged phrases", () => {
  it.each([
    [
      "to a reasonable degree of engineering certainty",
      "reasonable degree of engineering certainty",
    ],
    ["the crystallised metal gave way", "crystallised metal"],
    ["a defective weld", "defective"],
    ["Clearly, it broke", "Clearly"],
    ["this proves fatigue", "proves"],
    ["the owner was negligent", "negligent"],
    ["bolts never fail there", "never"],
    ["the river lines converge on the origin", "river lines converge on the origin"],
  ])("are found in %j", (text, phrase) => {
    expect(flaggedPhrases(text).map((found) => found.phrase)).toEqual([phrase]);
  });

  it("are each named once and say what to write instead", () => {
    const found = flaggedPhrases("It proves this, and proves that; obviously.");
    expect(found.map(({ phrase }) => phrase)).toEqual(["obviously", "proves"]);
    expect(found.every(({ instead }) => instead.length > 10)).toBe(true);
  });

  it("are not seen in plain words that hold them", () => {
    expect(
      flaggedPhrases("The improved proving ring; neverending is one word. A proof load."),
    ).toEqual([]);
  });
});
