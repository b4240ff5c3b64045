import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bindValues, cleanText } from "@/lib/reports/pdf/clean-text";
import { breakLines } from "@/lib/reports/pdf/lines";
import type { Span } from "@/lib/reports/pdf/typeset";

function span(text: string, more: Partial<Span> = {}): Span {
  return {
    text,
    face: "serif",
    oblique: false,
    sizePt: 10,
    risePt: 0,
    colour: "#000000",
    tabular: false,
    underline: false,
    strike: false,
    ...more,
  };
}

/** Every character five points wide. */
const measure = (one: Pick<Span, "text">) => [...one.text].length * 5;
const texts = (spans: Span[], widthPt: number) =>
  breakLines(spans, widthPt, measure).map((line) =>
    line.spans
      .map((one) => one.text)
      .join("")
      .trimEnd(),
  );

describe("lines", () => {
  it("breaks at spaces, keeps no-break spaces, and starts a new line where asked", () => {
    expect(texts([span("one two three")], 40)).toEqual(["one two", "three"]);
    expect(texts([span("one 2\u00A0mm x")], 30)).toEqual(["one", "2\u00A0mm x"]);
    expect(texts([span("one\ntwo\n\nthree")], 100)).toEqual(["one", "two", "", "three"]);
  });

  it("does not part words that change their style half way", () => {
    const spans = [span("aa bb"), span("cc", { face: "serif-italic" }), span("dd ee")];
    expect(texts(spans, 40)).toEqual(["aa", "bbccdd", "ee"]);
  });

  it("breaks compounds after hyphen and slash, but no number", () => {
    expect(texts([span("low-alloy")], 25)).toEqual(["low-", "alloy"]);
    expect(texts([span("ab HB-2210")], 35)).toEqual(["ab", "HB-2210"]);
  });

  it("never runs over the width and loses no character", () => {
    const word = fc.string({ unit: fc.constantFrom(..."abc-/1.é"), minLength: 1, maxLength: 30 });
    const words = fc.array(word, { minLength: 1, maxLength: 40 });
    fc.assert(
      fc.property(words, fc.integer({ min: 10, max: 200 }), (all, widthPt) => {
        const lines = breakLines([span(all.join(" "))], widthPt, measure);
        for (const line of lines) expect(line.widthPt).toBeLessThanOrEqual(widthPt + 0.01);
        const shown = lines.flatMap((line) => line.spans.map((one) => one.text)).join("");
        expect(shown.replaceAll(" ", "")).toBe(all.join(""));
      }),
      { seed: 7, numRuns: 200 },
    );
  });
});

describe("text before it is set", () => {
  it("ties values together", () => {
    expect(bindValues("about 1.95 ± 0.06 mm deep")).toBe(
      "about 1.95\u00A0±\u00A00.06\u00A0mm deep",
    );
    expect(bindValues("632 HV1, 72 % and 11 men")).toBe("632\u00A0HV1, 72\u00A0% and 11 men");
    expect(bindValues("is ≈ 29.8 HRC")).toBe("is ≈\u00A029.8\u00A0HRC");
  });

  it("keeps line ends of every kind and drops what cannot be set", () => {
    expect(cleanText("a\r\nb\rc\u2028d")).toBe("a\nb\nc\nd");
    expect(cleanText("a\u0000\u001Bb\u202Ec\u200Bd\uFFFE")).toBe("abcd");
    expect(cleanText("\uD83D")).toBe("\uFFFD");
    expect(cleanText("e\u0301")).toBe("é");
  });
});
