import { z } from "zod";
import {
  fastenerSurfaceVerdict,
  hardnessMethodApplies,
  leastThreadHeightUm,
  threadHeightVerdict,
  threePointVerdict,
} from "@/lib/hardness/fastener-decarburization";
import { mmFromUm } from "@/lib/units/length";
import { quantity, wordOf, type Quantity } from "./quantity";

const number = z.number();

/** A check row may name the two classes that share a column of the standard. */
const propertyClass = z
  .enum(["8.8/9.8", "8.8", "9.8", "10.9", "12.9"])
  .transform((name) => (name === "8.8/9.8" ? ("8.8" as const) : name));

/** Decarburization of threaded fasteners. */
export const FASTENER_QUANTITIES: Readonly<Record<string, Quantity>> = {
  bolt_E_min: quantity({ pitch_mm: number, class: propertyClass }, (inputs) => {
    const leastUm = leastThreadHeightUm(inputs.pitch_mm, inputs.class);
    return typeof leastUm === "number" ? mmFromUm(leastUm) : leastUm.verdict;
  }),
  bolt_E_verdict: quantity({ pitch_mm: number, class: propertyClass, E_mm: number }, (inputs) => {
    const word = threadHeightVerdict({
      pitchMm: inputs.pitch_mm,
      propertyClass: inputs.class,
      heightMm: inputs.E_mm,
    });
    return typeof word === "string" ? word : word.verdict;
  }),
  bolt_decarb_hardness: quantity(
    { "HV0.3_points_1_2_3": z.tuple([number, number, number]) },
    (inputs) => {
      const word = threePointVerdict(...inputs["HV0.3_points_1_2_3"]);
      return typeof word === "string" ? word : word.verdict;
    },
  ),
  bolt_hardness_method_applies: quantity({ pitch_mm: number, class: z.string() }, (inputs) =>
    wordOf(hardnessMethodApplies(inputs.pitch_mm, inputs.class)),
  ),
  bolt_surface_hardness: quantity(
    { "core_HV0.3": number, "surface_HV0.3": number, class: propertyClass },
    (inputs) => {
      const word = fastenerSurfaceVerdict({
        coreHv: inputs["core_HV0.3"],
        surfaceHv: inputs["surface_HV0.3"],
        propertyClass: inputs.class,
      });
      return typeof word === "string" ? word : word.verdict;
    },
  ),
};
