import { formatNumber, uncertaintyDecimals, type MaybeNumber } from "@/lib/format/numbers";
import { GROUP_SPACE, MINUS } from "@/lib/format/marks";

/** How units are said; a unit that is not here is read as it is written. */
const UNIT_WORDS: Record<string, string> = {
  "%": "percent",
  "°": "degrees",
  "°C": "degrees Celsius",
  µm: "micrometres",
  mm: "millimetres",
  "mm²": "square millimetres",
  m: "metres",
  g: "grams",
  kg: "kilograms",
  N: "newtons",
  kN: "kilonewtons",
  MPa: "megapascals",
  GPa: "gigapascals",
  "MPa√m": "megapascal root metres",
  h: "hours",
  min: "minutes",
  s: "seconds",
};

/** A value in words for those who hear the page: "1.95 plus or minus 0.06 millimetres". */
export function spokenQuantity(
  value: MaybeNumber,
  uncertainty: MaybeNumber,
  unit: string,
  { converted = false }: { converted?: boolean } = {},
): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return "no value";
  const shape = uncertainty ? { decimals: uncertaintyDecimals(uncertainty) } : {};
  const say = (number: number) =>
    formatNumber(number, shape).replaceAll(GROUP_SPACE, "").replace(MINUS, "minus ");
  const words = [
    converted ? "about" : "",
    say(value),
    uncertainty ? `plus or minus ${say(uncertainty)}` : "",
    UNIT_WORDS[unit] ?? unit,
  ];
  return words.filter(Boolean).join(" ");
}
