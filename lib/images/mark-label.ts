import type { MarkContent } from "./mark-schemas";
import { headlineOf, markTitle } from "./mark-names";

type Labelled = Pick<
  MarkContent,
  "tool" | "name" | "featureCode" | "geometry" | "measurements" | "note"
>;

/** Text beside a mark on the picture: "A1 final fracture 27.7 %", "B1", "D1 42.0 mm", "O1 origin". */
export function markLabel(label: string, mark: Labelled): string {
  const headline = headlineOf(mark.measurements);
  const value = headline && headline.refused === null ? headline.text.split("\u00a0±")[0] : null;
  const unit = headline?.unit === "" || !headline?.text.includes("±") ? "" : unitOf(headline.unit);
  const shown = value === null || value === undefined ? "" : ` ${value}${unit}`;
  switch (mark.tool) {
    case "front":
      return label;
    case "ratchet":
    case "note":
      return label;
    case "origin":
      return `${label} ${lowerFirst(markTitle(mark))}`;
    case "area":
      return `${label} ${lowerFirst(markTitle(mark))}${shown}`;
    default:
      return `${label}${shown}`;
  }
}

const unitOf = (unit: string) => (unit === "°" ? unit : `\u00a0${unit}`);

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);
