import { type Answers, valueAs } from "./answers";

/** Suspects whose traces oil would spoil or hide. */
const NO_OIL = ["corrosion", "hydrogen", "deposits", "unknown"];

/**
 * What to heed before packing. Oil is only spoken of where corrosion, hydrogen and deposits are
 * not in question. Source: ASM Handbook vol. 11 and 12, handling and preservation of fractures
 * (from memory).
 */
export function packingAdvice(answers: Answers): string[] {
  const suspects = valueAs("choices", answers.suspects);
  const mayOil = suspects.length > 0 && !suspects.some((suspect) => NO_OIL.includes(suspect));
  const hazards = valueAs("choices", answers.hazards);
  return [
    "Do not fit the broken faces back together.",
    "Do not clean, touch or wire-brush the fracture.",
    mayOil
      ? "Keep it dry. If it would rust on the way, oil lightly and write down the oil."
      : "No oil or grease: it hides or washes out what corrosion, hydrogen and deposits leave. Keep it dry, with drying agent.",
    "Do not drill, weld or dress a crack.",
    "Wrap each half on its own. Put loose debris and fluids in closed vessels of their own.",
    ...(suspects.includes("deposits") || suspects.includes("corrosion")
      ? ["Keep rust and deposits on the part. They are read before they are removed."]
      : []),
    "Broken edges cut. Wear gloves; write “sharp” on the box.",
    ...(hazards.includes("contaminated") ||
    hazards.includes("biohazard") ||
    hazards.includes("radioactive")
      ? ["Ask the laboratory before you send anything contaminated. Name the residue on the box."]
      : []),
    ...(hazards.includes("stored energy") || hazards.includes("sealed")
      ? ["Springs and sealed vessels can let go when moved or cut. Say so on the box."]
      : []),
  ];
}
