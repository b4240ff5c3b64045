import type { Config } from "tailwindcss";

/** Sizes are drawn on a 16 px root and shipped in rem, so that text size follows the reader. */
const rem = (px: number) => `${px / 16}rem`;

const fontSize = (px: number, linePx: number): [string, { lineHeight: string }] => [
  rem(px),
  { lineHeight: rem(linePx) },
];

/** Theme colours are variables in app/tokens.css; every name here is the variable's own name. */
const token = (name: string) => [name, `var(--${name})`] as const;

const colours = Object.fromEntries(
  [
    ...["bench", "surface", "surface-2", "well", "rule", "rule-2", "control"],
    ...["ink", "ink-2", "ink-3"],
    ...["action", "action-2", "action-tint", "on-action", "focus", "scrim"],
    ...["met", "met-tint", "met-mark", "warn", "warn-tint", "warn-mark"],
    ...["bad", "bad-tint", "bad-mark", "note", "note-tint"],
    ...[1, 2, 3, 4, 5, 6, 7].flatMap((step) => [`temper-${step}`, `temper-${step}-edge`]),
    ...["desk", "paper", "paper-2", "paper-ink", "paper-ink-2", "paper-rule", "paper-band"],
    ...["chip", "chip-edge", "stale", "stale-tint", "stale-line"],
    ...["ib-surround", "ib-panel", "ib-panel-2", "ib-rule", "ib-control", "ib-ink", "ib-ink-2"],
    ...["ib-focus", "ib-origin", "ib-front", "ib-final", "ib-length", "ib-casing"],
    ...["ch-1", "ch-2", "ch-3", "ch-4", "ch-grid", "ch-axis", "ch-limit", "ch-band"],
  ].map(token),
);

const config: Config = {
  darkMode: ["selector", '[data-theme="dark"]'],
  theme: {
    colors: {
      ...colours,
      transparent: "transparent",
      current: "currentColor",
      inherit: "inherit",
      white: "#ffffff",
      black: "#000000",
    },
    fontFamily: {
      sans: "var(--sans)",
      serif: "var(--serif)",
      mono: "var(--mono)",
    },
    fontSize: {
      11: fontSize(11, 16),
      12: fontSize(12, 16),
      13: fontSize(13, 20),
      14: fontSize(14, 20),
      15: fontSize(15, 20),
      16: fontSize(16, 22),
      19: fontSize(19, 26),
      24: fontSize(24, 32),
      sheet: fontSize(16.5, 26),
      "sheet-head": fontSize(21, 28),
    },
    fontWeight: { normal: "400", medium: "500", strong: "550", head: "620" },
    borderRadius: { none: "0", 2: "2px", 3: "3px", 4: "4px", full: "9999px" },
    boxShadow: {
      none: "none",
      "lift-1": "var(--lift-1)",
      "lift-2": "var(--lift-2)",
      "edge-bad": "inset 3px 0 0 var(--bad-mark)",
      "edge-action": "inset 3px 0 0 var(--action)",
    },
    transitionDuration: { quick: "var(--m-quick)", move: "var(--m-move)" },
    transitionTimingFunction: { DEFAULT: "var(--ease)" },
    screens: {
      sm: rem(700),
      md: rem(960),
      lg: rem(1181),
      xl: rem(1280),
      "2xl": rem(1440),
      "3xl": rem(1920),
    },
    extend: {
      spacing: {
        row: "var(--row)",
        "row-roomy": "var(--row-roomy)",
        "control-h": "var(--control-h)",
        touch: "var(--control-h-touch)",
        topbar: "var(--topbar-h)",
        casebar: "var(--casebar-h)",
        spine: "var(--spine-w)",
        "spine-narrow": "var(--spine-w-narrow)",
        rail: "var(--rail-w)",
        sheet: rem(720),
        text: rem(760),
      },
    },
  },
};

export default config;
