import type { Answer, Answers, AnyValue } from "@/lib/intake/answers";
import { FIELDS, type FieldKey } from "@/lib/intake/fields";

const value = (given: AnyValue): Answer => ({ kind: "value", value: given });
const unknown = (why: string): Answer => ({ kind: "unknown", why });

/** Answers that most field returns of the demonstration share. */
const USUAL: Partial<Record<FieldKey, AnyValue>> = {
  serviceSince: "new",
  howFound: "in_use",
  ranOn: "stopped",
  harm: "None",
  earlierFailures: "None known",
  missingPieces: "None",
  facesFitted: "no",
  oiled: "no",
  cleaned: "not cleaned",
  weldedOrCut: "no",
  residues: "none known",
  hazards: ["sharp edges"],
  mayCut: "yes",
  mayKeep: "yes",
  litigation: "no",
  warranty: "no",
  exportControl: "no",
  confidentiality: "no limit",
};

/** A whole field return: what is given, the usual answers, and for the rest that nobody recorded it. */
export function fieldReturn(given: Partial<Record<FieldKey, AnyValue>>): Answers {
  const asked = FIELDS.filter((field) => field.need !== "optional" || field.key in given);
  return Object.fromEntries(
    asked.map((field) => {
      const said = given[field.key] ?? USUAL[field.key];
      return [field.key, said === undefined ? unknown("Not recorded by the owner") : value(said)];
    }),
  );
}
