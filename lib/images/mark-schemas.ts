import { z } from "zod";
import { CONFIDENCES, MARK_TOOLS, type MarkTool } from "./constants";
import { FEATURE_CODES } from "./feature-codes";

export const MAX_POINTS = 5000;
export const MAX_LINES = 500;
export const MARK_NAME_MAX = 120;
export const MARK_NOTE_MAX = 2000;
/** No picture that is taken in is wider or higher than this. */
const FARTHEST_PX = 1_000_000;

const coordinate = z
  .number({ error: "A point needs two plain numbers in pixels." })
  .min(0, "A point lies outside the picture.")
  .max(FARTHEST_PX, "A point lies outside the picture.");
export const pointSchema = z.tuple([coordinate, coordinate], {
  error: "A point needs two plain numbers in pixels.",
});
const tooMany = `A mark takes at most ${MAX_POINTS} points. Draw it with fewer.`;
const points = (least: number, words: string) =>
  z.array(pointSchema).min(least, words).max(MAX_POINTS, tooMany);

/** Shapes of marks, in image pixels; which tool decides which. */
export const geometrySchema = z.discriminatedUnion(
  "tool",
  [
    z.object({
      tool: z.literal("origin"),
      point: pointSchema,
      /** Radius within which the origin lies. */
      radiusPx: z.number().positive().max(FARTHEST_PX).optional(),
      /** Where clock angles start from; straight up in the picture when there is none. */
      landmark: z
        .object({
          point: pointSchema,
          name: z.string().trim().min(1, "Say what the landmark is, for example keyway.").max(60),
        })
        .nullish(),
    }),
    z.object({
      tool: z.literal("ratchet"),
      /** Each from the rim inward. */
      lines: z
        .array(z.tuple([pointSchema, pointSchema]))
        .min(1, "Draw at least one line.")
        .max(MAX_LINES, `A mark takes at most ${MAX_LINES} lines.`),
    }),
    z.object({
      tool: z.literal("front"),
      points: points(2, "A front needs two points or more."),
    }),
    z.object({
      tool: z.literal("area"),
      points: points(3, "An area needs three points or more."),
      /** The section's outline: areas are given as a share of it, clock angles about its centre. */
      isOutline: z.boolean().optional(),
    }),
    z.object({
      tool: z.literal("length"),
      points: points(2, "A length needs two points or more."),
    }),
    z.object({
      tool: z.literal("angle"),
      points: z.tuple([pointSchema, pointSchema, pointSchema], {
        error: "An angle needs three points: arm, corner, arm.",
      }),
    }),
    z.object({ tool: z.literal("count"), points: points(1, "Count at least one.") }),
    z.object({ tool: z.literal("note"), point: pointSchema }),
  ],
  { error: "This mark has no shape that the bench knows." },
);
export type Geometry = z.infer<typeof geometrySchema>;
export type GeometryOf<T extends MarkTool> = Extract<Geometry, { tool: T }>;

const describing = {
  featureCode: z.enum(FEATURE_CODES, { error: "This feature code is not known." }).nullable(),
  name: z.string().trim().max(MARK_NAME_MAX, `Keep the name to ${MARK_NAME_MAX} characters.`),
  confidence: z.enum(CONFIDENCES),
  note: z.string().trim().max(MARK_NOTE_MAX, `Keep the note to ${MARK_NOTE_MAX} characters.`),
  /** For fronts: the origin their depth is read from; the first on the picture when null. */
  originId: z.string().max(40).nullable(),
};

/** One measured value of a mark; without a number there is the reason why not. */
export const measurementSchema = z.object({
  key: z.string(),
  label: z.string(),
  value: z.number().nullable(),
  unit: z.string(),
  /** k = 2; null where it is exact, as a count is. */
  expandedUncertainty: z.number().nullable(),
  /** As it is printed, unit included; a dash where there is no number. */
  text: z.string(),
  /** What the value is from or of, "from keyway", "over 49° of rim". */
  basis: z.string().nullable(),
  refused: z.string().nullable(),
});
export type Measurement = z.infer<typeof measurementSchema>;

/** Content of one version of a mark. */
export const markContent = z.object({
  tool: z.enum(MARK_TOOLS),
  ...describing,
  geometry: geometrySchema,
  measurements: z.array(measurementSchema),
});
export type MarkContent = z.infer<typeof markContent>;

const described = {
  geometry: geometrySchema,
  featureCode: describing.featureCode.default(null),
  name: describing.name.default(""),
  confidence: describing.confidence.default("likely"),
  note: describing.note.default(""),
  originId: describing.originId.default(null),
};
const recordId = z.string().min(1).max(40);
const seenVersion = z.number().int().positive();

export const PlaceMarkInput = z.object({ imageId: recordId, ...described });
export type PlaceMark = z.input<typeof PlaceMarkInput>;
export const ChangeMarkInput = z.object({ markId: recordId, seenVersion, ...described });
export type ChangeMark = z.input<typeof ChangeMarkInput>;
export const DeleteMarkInput = z.object({
  markId: recordId,
  seenVersion,
  reason: z.string().trim().max(MARK_NOTE_MAX).default(""),
});
export const RestoreMarkInput = z.object({ markId: recordId });

/** All points of a shape, in the order they were drawn. */
export function pointsOf(geometry: Geometry): (readonly [number, number])[] {
  switch (geometry.tool) {
    case "origin":
      return geometry.landmark ? [geometry.point, geometry.landmark.point] : [geometry.point];
    case "note":
      return [geometry.point];
    case "ratchet":
      return geometry.lines.flat();
    default:
      return geometry.points;
  }
}
