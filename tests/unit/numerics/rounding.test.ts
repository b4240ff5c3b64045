import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { orderOfMagnitude, roundHalfEven, roundSignificant } from "@/lib/numerics/rounding";

describe("rounding on decimal text", () => {
  it.each([
    [0.435, 2, "0.44"],
    [0.205, 2, "0.20"],
    ["0.325", 2, "0.32"],
    ["0.335", 2, "0.34"],
    [412.5, 0, "412"],
    [413.5, 0, "414"],
    [-0.5, 0, "0"],
    [-1.5, 0, "-2"],
    [1e-7, 3, "0.000"],
    [1.5e21, -21, "2000000000000000000000"],
    [1234, -2, "1200"],
    ["7", 2, "7.00"],
  ])("rounds %s to %i decimals as %s", (value, decimals, expected) => {
    expect(roundHalfEven(value, decimals)).toBe(expected);
  });

  it("gives nothing for what is not a finite number", () => {
    for (const value of [NaN, Infinity, "", ".", "12a", "1,5"])
      expect(roundHalfEven(value, 2)).toBeNull();
  });

  it("picks the significant figure by the rounded value", () => {
    expect(roundSignificant(9.996, 3)).toBe("10.0");
    expect(roundSignificant(0.0012345, 3)).toBe("0.00123");
    expect(roundSignificant(653.46, 3)).toBe("653");
    expect(roundSignificant(12345, 2)).toBe("12000");
    expect(roundSignificant(0, 3)).toBe("0.00");
    expect(orderOfMagnitude(0.035)).toBe(-2);
  });

  it("never moves a number by more than half a unit of the last place", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        (value, decimals) => {
          const rounded = Number(roundHalfEven(value, decimals));
          expect(Math.abs(rounded - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + 1e-9);
        },
      ),
    );
  });
});
