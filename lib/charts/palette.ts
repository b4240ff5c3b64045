import type { ChartToken } from "./primitives";

/** Colours for white paper and for files that leave the product, where no CSS variable resolves. */
export const PRINT_COLOURS: Record<ChartToken, string> = {
  "ch-1": "#1b4f7e",
  "ch-2": "#a4682b",
  "ch-3": "#7c3b6d",
  "ch-4": "#39757a",
  "ch-limit": "#a0251e",
  "ch-grid": "#dde2e6",
  "ch-axis": "#5a656f",
  "ch-band": "#dff0e7",
  ink: "#14191e",
  surface: "#ffffff",
  met: "#1d6848",
  "warn-mark": "#b8770e",
  paper: "#ffffff",
  "paper-ink": "#1f1b15",
  "paper-ink-2": "#574f42",
  "paper-rule": "#d9d0bd",
  "paper-band": "#e8eee0",
};
