import { describe, expect, it } from "vitest";
import { lastAtOrBelow } from "@/lib/numerics/bisect";
import { groupBy } from "@/lib/numerics/group-by";
import { numberText, quantityText } from "@/lib/numerics/number-text";
import { meanInterval95, sampleStandardDeviation, setStatistics } from "@/lib/numerics/statistics";
import { studentTwoSided } from "@/lib/numerics/student-t";

describe("statistics of a set", () => {
  it("gives the value alone for one reading", () => {
    const single = setStatistics([412]);
    expect(single).toMatchObject({ n: 1, mean: 412, standardDeviation: null, range: 0 });
    expect(sampleStandardDeviation([412])).toBeNull();
  });

  it("refuses an interval below three readings and calls it wide below five", () => {
    expect(meanInterval95([400, 410]).verdict).toBe("refuse");
    expect(meanInterval95([400, 410, 405]).verdict).toBe("warn");
    expect(meanInterval95([412, 418, 409, 415, 411])).toMatchObject({ verdict: "ok" });
  });

  it("refuses an empty set and a value that is not a number", () => {
    expect(setStatistics([])).toMatchObject({ verdict: "refuse", code: "no_values" });
    expect(setStatistics([1, NaN])).toMatchObject({ verdict: "refuse", code: "not_finite" });
  });

  // GUM, Table G.2.
  it.each([
    [0.95, 1, 12.71],
    [0.95, 10, 2.23],
    [0.6827, 4, 1.14],
    [0.99, 5, 4.03],
  ])("reads Student's t at %s and %i degrees of freedom as %s", (probability, nu, t) => {
    expect(studentTwoSided(probability, nu)).toBeCloseTo(t, 2);
  });
});

describe("small helpers of number work", () => {
  it("finds the last item at or below a value", () => {
    expect(lastAtOrBelow([1, 2, 2, 5], 2)).toBe(2);
    expect(lastAtOrBelow([1, 2], 0.5)).toBe(-1);
    expect(lastAtOrBelow([1, 2], 9)).toBe(1);
    expect(lastAtOrBelow([], 1)).toBe(-1);
  });

  it("groups in the order of first appearance", () => {
    const groups = groupBy(["b1", "a1", "b2"], (item) => item.slice(0, 1));
    expect([...groups]).toEqual([
      ["b", ["b1", "b2"]],
      ["a", ["a1"]],
    ]);
  });

  it("writes a missing number as a dash and a negative one with a real minus", () => {
    expect(numberText(NaN, 2)).toBe("–");
    expect(numberText(-1.25, 1)).toBe("−1.2");
    expect(quantityText(0.16, 3, "mm")).toBe("0.160\u00a0mm");
  });
});
