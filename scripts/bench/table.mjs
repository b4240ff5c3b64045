import { median, quantile } from "./measure.mjs";

const digits = (value) => (value >= 100 ? value.toFixed(0) : value.toPrecision(3));

const UNITS = {
  ms: (ms) => (ms >= 1000 ? `${digits(ms / 1000)} s` : `${digits(ms)} ms`),
  bytes: (bytes) => `${digits(bytes / 1000)} kB`,
};

const HEADS = ["", "what, and its yardstick", "median", "times", "middle half", "pairs"];

/** Two lines of cells: what was measured with its ratios, then what it was measured against. */
function linesOf({ letter, what, against, unit = "ms", product, yardstick }) {
  const show = UNITS[unit];
  const ratios = product.map((value, i) => value / yardstick[i]);
  const times = digits(median(product) / median(yardstick));
  const half = `${digits(quantile(ratios, 0.25))} to ${digits(quantile(ratios, 0.75))}`;
  return [
    [letter, what, show(median(product)), times, half, String(product.length)],
    ["", `  against ${against}`, show(median(yardstick)), "", "", ""],
  ];
}

/**
 * The figures as one table. "times" is the ratio of the medians; "middle half" is where the middle
 * half of the ratios of the single pairs lie.
 * @param {{ letter: string, what: string, against: string, unit?: "ms" | "bytes",
 *   product: number[], yardstick: number[] }[]} rows
 */
export function figuresTable(rows) {
  const lines = [HEADS, ...rows.flatMap(linesOf)];
  const widths = HEADS.map((_, i) => Math.max(...lines.map((line) => line[i].length)));
  return lines
    .map((line) =>
      line
        .map((cell, i) => (i < 2 ? cell.padEnd(widths[i]) : cell.padStart(widths[i])))
        .join("  ")
        .trimEnd(),
    )
    .join("\n");
}
