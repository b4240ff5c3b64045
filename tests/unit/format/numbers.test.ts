import { describe, expect, test } from "vitest";
import fc from "fast-check";
import {
  formatBytes,
  formatCount,
  formatNumber,
  formatQuantity,
  formatRange,
  formatWithUncertainty,
} from "@/lib/format/numbers";
import { formatHardness } from "@/lib/format/hardness";

/** Shows no-break spaces as plain ones, so that expectations can be read. */
const plain = (text: string) => text.replace(/[\u00a0\u202f]/g, " ");

describe("numbers", () => {
  test.each([
    [1034, "1034"],
    [9999, "9999"],
    [11400, "11 400"],
    [1234567, "1 234 567"],
    [-11400.5, "−11 400.5"],
    [-3, "−3"],
    [0, "0"],
    [1e-7, "0.0000001"],
    [12.4, "12.4"],
  ])("%d is shown as %s", (value, text) => {
    expect(plain(formatNumber(value))).toBe(text);
  });

  test.each([null, undefined, Number.NaN, Number.POSITIVE_INFINITY])(
    "a missing number (%s) is a dash and never zero",
    (value) => {
      expect(formatNumber(value)).toBe("–");
      expect(formatQuantity(value, "mm")).toBe("–");
      expect(formatWithUncertainty(value, 0.1, "mm")).toBe("–");
      expect(formatBytes(value)).toBe("–");
      expect(formatHardness({ value, scale: "HV1" })).toBe("–");
    },
  );

  test("a number that rounds to zero loses its minus", () => {
    expect(formatNumber(-0.004, { decimals: 2 })).toBe("0.00");
  });

  test("groups can be taken out again without a change of value", () => {
    fc.assert(
      fc.property(fc.integer(), (value) => {
        const read = formatNumber(value)
          .replace("−", "-")
          .replace(/\u202f/g, "");
        expect(Number(read)).toBe(value);
      }),
    );
  });
});

describe("values with uncertainty", () => {
  test.each([
    [1.951, 0.058, "mm", "1.95 ± 0.06 mm"],
    [632.4, 17.3, "HV1", "632 ± 17 HV1"],
    [27.71, 0.52, "%", "27.7 ± 0.5 %"],
    [42, 0.3, "mm", "42.0 ± 0.3 mm"],
    [965, 45, "MPa", "965 ± 45 MPa"],
    [300, 8, "HV1", "300 ± 8 HV1"],
    [1.4, 0.1, "mm", "1.4 ± 0.1 mm"],
    [0.0440123, 0.0003, "mm", "0.0440 ± 0.0003 mm"],
    [12.345, 0.124, "mm", "12.34 ± 0.12 mm"],
    [12.4, 0.96, "mm", "12.4 ± 1.0 mm"],
    [11400, 250, "h", "11 400 ± 250 h"],
    [48123, 1234, "cycles", "48 100 ± 1200 cycles"],
  ])("%d with %d %s is %s", (value, uncertainty, unit, text) => {
    expect(plain(formatWithUncertainty(value, uncertainty, unit))).toBe(text);
  });

  test("a value never breaks over a line", () => {
    expect(formatWithUncertainty(11400, 250, "N mm")).not.toContain(" ");
    expect(formatRange(900, 1100, "MPa")).not.toContain(" ");
  });

  test("without an uncertainty the value stands alone", () => {
    expect(plain(formatWithUncertainty(3.1, null, "mm", { decimals: 2 }))).toBe("3.10 mm");
    expect(plain(formatWithUncertainty(3.1, 0, "mm"))).toBe("3.1 mm");
  });

  test("a degree sign has no space before it; a percent sign has one", () => {
    expect(formatQuantity(49, "°")).toBe("49°");
    expect(formatQuantity(80, "%")).toBe("80\u00a0%");
  });
});

describe("ranges, counts and sizes", () => {
  test("ranges are written with to, open ends in words", () => {
    expect(plain(formatRange(900, 1100, "MPa"))).toBe("900 to 1100 MPa");
    expect(plain(formatRange(900, null, "MPa"))).toBe("at least 900 MPa");
    expect(plain(formatRange(undefined, 1100, "MPa"))).toBe("at most 1100 MPa");
    expect(formatRange(null, null, "MPa")).toBe("–");
  });

  test("counts take the plural for everything but one", () => {
    expect(["0 items", "1 item", "2 items"]).toEqual(
      [0, 1, 2].map((count) => plain(formatCount(count, "item"))),
    );
    expect(plain(formatCount(2, "entry", "entries"))).toBe("2 entries");
  });

  test.each([
    [412, "412 bytes"],
    [999, "999 bytes"],
    [1000, "1.0 kB"],
    [999_499, "999 kB"],
    [999_600, "1.0 MB"],
    [61_000_000, "61 MB"],
    [1_400_000_000, "1.4 GB"],
  ])("%d bytes are shown as %s", (bytes, text) => {
    expect(plain(formatBytes(bytes))).toBe(text);
  });
});

describe("hardness", () => {
  test.each([
    [{ value: 632, uncertainty: 17, scale: "HV1" }, "632 ± 17 HV1"],
    [{ value: 56.93, scale: "HRC", converted: true }, "≈ 56.9 HRC"],
    [{ value: 287.4, scale: "HBW 2.5/187.5" }, "287 HBW 2.5/187.5"],
    [{ value: 85.44, scale: "HV10" }, "85.4 HV10"],
  ])("%o is %s", (shown, text) => {
    expect(plain(formatHardness(shown))).toBe(text);
  });
});
