import { expect, test } from "vitest";
import { spokenQuantity } from "@/lib/format/spoken";

test.each([
  [1.951, 0.058, "mm", "1.95 plus or minus 0.06 millimetres"],
  [-11400, null, "h", "minus 11400 hours"],
  [632, 17, "HV1", "632 plus or minus 17 HV1"],
  [null, 0.1, "mm", "no value"],
])("%s with %s %s is said as %s", (value, uncertainty, unit, words) => {
  expect(spokenQuantity(value, uncertainty, unit)).toBe(words);
});

test("a converted value is said to be about right", () => {
  expect(spokenQuantity(56.9, null, "HRC", { converted: true })).toBe("about 56.9 HRC");
});
