import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, test } from "vitest";

/** Contrast as WCAG 2.2 defines it: relative luminance of sRGB, (L1 + 0.05) / (L2 + 0.05).
 *  Text needs 4.5 (1.4.3); edges of controls and marks need 3 (1.4.11). */
function luminance(hex: string): number {
  const full = hex.length === 4 ? hex.replace(/[\da-f]/gi, "$&$&") : hex;
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(full.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

const css = readFileSync(path.join(import.meta.dirname, "../../../app/tokens.css"), "utf8");
const [lightCss = "", darkCss = ""] = css.split("@variant dark-tokens");

function tokens(block: string): Map<string, string> {
  const found = block.matchAll(/--([\w-]+): (#[\da-f]{3,6});/gi);
  return new Map([...found].map(([, name = "", value = ""]) => [name, value]));
}

const light = tokens(lightCss);
const dark = new Map([...light, ...tokens(darkCss.split("@media print")[0] ?? "")]);

const TEXT: string[][] = [
  ...["surface", "bench", "surface-2", "action-tint"].flatMap((ground) =>
    ["ink", "ink-2", "ink-3"].map((ink) => [ink, ground]),
  ),
  ["ink-2", "well"],
  ...["surface", "bench", "action-tint"].map((ground) => ["action", ground]),
  ...["action", "action-2"].map((ground) => ["on-action", ground]),
  ...["met", "warn", "bad"].flatMap((kind) => [
    [kind, "surface"],
    [kind, `${kind}-tint`],
  ]),
  ["paper-ink", "paper"],
  ["paper-ink-2", "paper"],
  ["paper-ink-2", "paper-2"],
  ["paper-ink", "chip"],
  ["stale", "stale-tint"],
  ["stale", "paper"],
  ["ch-limit", "surface"],
  ["ch-axis", "surface"],
  ["ib-ink", "ib-panel"],
  ["ib-ink-2", "ib-panel"],
];

const MARKS: string[][] = [
  ...["control", "focus"].flatMap((edge) => [
    [edge, "surface"],
    [edge, "bench"],
  ]),
  ...["met-mark", "warn-mark", "bad-mark", "ch-1", "ch-2", "ch-3", "ch-4"].map((mark) => [
    mark,
    "surface",
  ]),
  ...[1, 2, 3, 4, 5, 6, 7].flatMap((step) => [
    [`temper-${step}-edge`, "surface"],
    [`temper-${step}-edge`, "bench"],
  ]),
  ["chip-edge", "paper"],
  ["stale-line", "paper"],
  ["ib-control", "ib-panel"],
  ["ib-focus", "ib-panel"],
  ...["origin", "front", "final", "length"].map((kind) => [`ib-${kind}`, "ib-casing"]),
];

describe.each([
  ["light", light],
  ["dark", dark],
])("%s theme", (_name, theme) => {
  const colour = (name: string) => {
    const value = theme.get(name);
    if (value === undefined) throw new Error(`No token --${name} in app/tokens.css`);
    return value;
  };

  test.each(TEXT)("%s can be read on %s", (ink = "", ground = "") => {
    expect(contrast(colour(ink), colour(ground))).toBeGreaterThanOrEqual(4.5);
  });

  test.each(MARKS)("%s can be seen on %s", (mark = "", ground = "") => {
    expect(contrast(colour(mark), colour(ground))).toBeGreaterThanOrEqual(3);
  });
});

test("the measure itself: black on white is 21 to 1, #767676 on white just passes", () => {
  expect(contrast("#000", "#fff")).toBeCloseTo(21, 5);
  expect(contrast("#767676", "#ffffff")).toBeCloseTo(4.54, 2);
});

test("both themes name the same colours", () => {
  const themed = [...tokens(darkCss.split("@media print")[0] ?? "").keys()];
  const bench = [...light.keys()].filter((name) => !name.startsWith("ib-"));
  expect([...themed].sort()).toEqual([...bench].sort());
});
