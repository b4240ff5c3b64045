import { describe, expect, it } from "vitest";
import { kgfFromNewtons, newtonsFromGf, newtonsFromKgf } from "@/lib/units/force";
import { mmFromUm, umFromMm } from "@/lib/units/length";
import { radiansFromDegrees } from "@/lib/units/angle";

describe("units", () => {
  it("takes the kilogram-force as exactly 9.80665 N", () => {
    expect(newtonsFromKgf(10)).toBeCloseTo(98.0665, 12);
    expect(newtonsFromGf(500)).toBeCloseTo(4.903325, 12);
    expect(kgfFromNewtons(29419.95)).toBeCloseTo(3000, 9);
  });

  it("takes a thousand micrometres to the millimetre", () => {
    expect(mmFromUm(54.4)).toBeCloseTo(0.0544, 12);
    expect(umFromMm(0.0544)).toBeCloseTo(54.4, 12);
  });

  it("takes half a turn as pi", () => {
    expect(radiansFromDegrees(180)).toBeCloseTo(Math.PI, 12);
  });
});
