import { z } from "zod";
import { USUAL_PICK_UNCERTAINTY_PX } from "@/lib/imaging/uncertainty";
import { pointSchema } from "./mark-schemas";

const MOST_MM = 10_000;
const MOST_PICK_PX = 100;

const shared = {
  /** Tilt of the face against the picture; null when nobody said. Lengths are not corrected for it. */
  tiltDeg: z
    .number({ error: "Tilt needs one number in degrees." })
    .min(0, "Tilt is from 0 to 80°.")
    .max(80, "Tilt is from 0 to 80°.")
    .nullable()
    .default(null),
};

const twoPoints = z.object({
  source: z.literal("two_points"),
  /** What the known distance is on, "Scale bar", "Steel rule in the picture". */
  standard: z.string().trim().min(1, "Say what the known distance is on.").max(80),
  points: z.tuple([pointSchema, pointSchema], { error: "Pick two points." }),
  knownDistanceMm: z
    .number({ error: "The known distance needs one number in mm." })
    .positive("The known distance has to be above zero.")
    .max(MOST_MM, `The known distance is at most ${MOST_MM} mm.`),
  /** Expanded, k = 2. */
  knownDistanceUncertaintyMm: z
    .number({ error: "The uncertainty needs one number in mm." })
    .min(0, "An uncertainty is not below zero."),
  /** Expanded, k = 2, of each end. */
  pickUncertaintyPx: z
    .number({ error: "The pick uncertainty needs one number in pixels." })
    .positive("Nobody picks without uncertainty. Give pixels above zero.")
    .max(MOST_PICK_PX, `The pick uncertainty is at most ${MOST_PICK_PX} px.`)
    .default(USUAL_PICK_UNCERTAINTY_PX),
  ...shared,
});

const fileResolution = z.object({
  source: z.literal("file_resolution"),
  /** Expanded, k = 2, in per cent, as the person states it. */
  relativeUncertaintyPercent: z
    .number({ error: "State how far the file's resolution can be off, in %." })
    .positive("Nothing is known without uncertainty. State it in %, above zero.")
    .max(50, "Above 50 % this is no scale."),
  ...shared,
});

const settings = z.discriminatedUnion("source", [twoPoints, fileResolution]);

const target = {
  imageId: z.string().min(1).max(40),
  /** Version number of the scale on screen; null where there was none. */
  seenVersion: z.number().int().positive().nullable(),
};
export const CalibrateImageInput = z.discriminatedUnion(
  "source",
  [twoPoints.extend(target), fileResolution.extend(target)],
  { error: "Say where the scale is from." },
);
export type CalibrateImage = z.input<typeof CalibrateImageInput>;

/** Content of one version of a scale: what was given and what follows from it. */
export const calibrationContent = z.object({
  settings,
  umPerPx: z.number(),
  /** Expanded, k = 2, as a fraction. */
  relativeUncertainty: z.number(),
});
export type CalibrationContent = z.infer<typeof calibrationContent>;
