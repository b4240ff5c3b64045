import { describe, expect, it } from "vitest";
import { answerConvertRequest } from "@/lib/hardness/convert-request";
import { DEFAULT_ENABLED_TABLE_IDS } from "@/lib/hardness/published-tables";

const answer = (request: Parameters<typeof answerConvertRequest>[0]) =>
  answerConvertRequest(request, DEFAULT_ENABLED_TABLE_IDS);

describe("a conversion request", () => {
  it("answers every value with one conversion for each scale asked, in order", () => {
    const result = answer({
      materialGroup: "steel-nonaustenitic",
      from: "HV",
      values: [620, 300],
      to: ["HRC", "Rm_MPa"],
    });
    if (!result.ok) throw new Error("refused");
    expect(result.results.map(({ from, value }) => [from, value])).toEqual([
      ["HV", 620],
      ["HV", 300],
    ]);
    const [first] = result.results;
    expect(first?.conversions.map(({ to, status }) => [to, status])).toEqual([
      ["HRC", "ok"],
      ["Rm_MPa", "ok"],
    ]);
  });

  it("refuses a value that was converted already, and only that one", () => {
    const result = answer({
      materialGroup: "steel-nonaustenitic",
      from: "HRC",
      values: [
        { value: 23, status: "converted" },
        { value: 23, status: "measured" },
      ],
      to: ["HV"],
    });
    if (!result.ok) throw new Error("refused");
    expect(result.results.map(({ conversions }) => conversions[0]?.status)).toEqual([
      "refused",
      "ok",
    ]);
    expect(result.results[0]?.conversions[0]).not.toHaveProperty("value");
  });

  it("names everything that stands nowhere in the tables", () => {
    const result = answer({
      materialGroup: "cheese",
      from: "HX",
      values: [1],
      to: ["HV", "HZ"],
      table: "no-such-table",
    });
    expect(result).toEqual({
      ok: false,
      unknownNames: [
        { kind: "material group", name: "cheese" },
        { kind: "scale", name: "HX" },
        { kind: "scale", name: "HZ" },
        { kind: "table", name: "no-such-table" },
      ],
    });
  });

  it("does not take an inherited property for a name", () => {
    const result = answer({
      materialGroup: "toString",
      from: "HV",
      values: [],
      to: ["constructor"],
    });
    expect(result.ok).toBe(false);
  });
});
