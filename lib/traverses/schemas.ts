import { z } from "zod";
import { isMaterialGroup } from "@/lib/hardness/material-groups";
import { isTableId } from "@/lib/hardness/published-tables";
import { isScale } from "@/lib/hardness/scales";
import { DEPTH_KINDS, HARDENING_PROCESSES, HARDNESS_METHODS, READINGS_MAX } from "./constants";

export const CELL_MAX = 200;
const text = (max: number) => z.string().trim().max(max, `Use at most ${max} characters.`);
const reason = text(500).min(1, "Say why.");
/** What stands in a cell, as typed: a word in a number cell is kept, and told to the person. */
const cell = z.string().max(CELL_MAX, `A cell holds at most ${CELL_MAX} characters.`).optional();
const positive = z.number("This needs one number.").positive("This has to be above zero.").max(1e6);

export const typedReading = z.object({
  id: z.string().min(1).max(20),
  /** Distance from the reference edge, mm. */
  depth: cell,
  /** Diagonals, µm. */
  d1: cell,
  d2: cell,
  /** HV or HK, where the diagonals are not known. */
  hardness: cell,
  /** Place along the surface, mm, of indents set in zigzag. */
  lateral: cell,
  /** Which row of indents, where there are several: 1, 2, 3. */
  track: cell,
  note: z.string().max(200).optional(),
  leftOutReason: reason.optional(),
  keptReason: reason.optional(),
});
export type TypedReading = z.infer<typeof typedReading>;

const bounds = z
  .object({ min: positive.nullable(), max: positive.nullable() })
  .refine(({ min, max }) => min === null || max === null || min <= max, {
    error: "The least is above the most.",
  });
const scaled = z
  .object({
    scale: z.string().refine(isScale, "Choose a scale."),
    min: positive.nullable(),
    max: positive.nullable(),
  })
  .refine(({ min, max }) => min === null || max === null || min <= max, {
    error: "The least is above the most.",
  });

/** Content of a traverse's version: how it was run and what was typed. */
export const traverseContent = z.object({
  /** Where it was run: "at fillet". */
  name: text(60).min(1, "Say where it was run."),
  itemId: z.string().nullable(),
  method: z.enum(HARDNESS_METHODS),
  loadKgf: positive.max(100, "The load is at most 100 kgf."),
  spacingClass: z.enum(["steel_copper", "light_metals"]),
  edgeReference: z.enum(["surface", "taper_section", "none"]),
  /** Between section and surface, degrees; for a taper section. */
  sectionAngleDeg: positive.max(90, "An angle is at most 90°.").nullable(),
  materialGroup: z.string().refine(isMaterialGroup, "Choose a material group."),
  /** The one table conversions are read from; null where nothing is converted. */
  tableId: z.string().refine(isTableId, "Choose a table.").nullable(),
  process: z.enum(HARDENING_PROCESSES),
  depthKind: z.enum(DEPTH_KINDS),
  depthKindReason: text(500),
  /** Least surface hardness stated, HV. */
  minSurfaceHv: positive.nullable(),
  /** Agreed limit in place of the one of the standard; HV, or HK for Knoop. */
  agreedLimit: positive.nullable(),
  /** Core hardness measured elsewhere, HV. */
  coreHv: positive.nullable(),
  requiredDepthMm: bounds.nullable(),
  requiredSurface: scaled.nullable(),
  requiredCore: scaled.nullable(),
  /** The requirement was taken from the field return, and turns stale with it. */
  isRequirementFromReturn: z.boolean(),
  /** Standard uncertainties (k = 1): of a mean diagonal, of an indent's depth. */
  diagonalUncertaintyUm: z.number("This needs one number.").min(0).max(100),
  positionUncertaintyMm: z.number("This needs one number.").min(0).max(10),
  tracks: z.enum(["each", "means"]),
  surfaceReadingIds: z.array(z.string().max(20)).max(READINGS_MAX),
  coreReadingIds: z.array(z.string().max(20)).max(READINGS_MAX),
  readings: z
    .array(typedReading)
    .max(READINGS_MAX, `A traverse holds at most ${READINGS_MAX} rows. Nothing was taken.`)
    .refine((rows) => new Set(rows.map((row) => row.id)).size === rows.length, {
      error: "Two rows have one name. Nothing was taken.",
    }),
});
export type TraverseContent = z.infer<typeof traverseContent>;

export const CreateTraverseInput = z.object({ caseId: z.string(), content: traverseContent });
export const SaveTraverseInput = z.object({
  caseId: z.string(),
  traverseId: z.string(),
  /** Version the person saw; another in the meantime is a conflict. */
  seenVersion: z.number().int(),
  content: traverseContent,
});
export const WithdrawTraverseInput = z.object({
  caseId: z.string(),
  traverseId: z.string(),
  reason,
});
export const RestoreTraverseInput = z.object({ caseId: z.string(), traverseId: z.string() });

const converted = z.object({
  to: z.string().refine(isScale),
  /** Not rounded; null where the table gives none. */
  value: z.number().nullable(),
  /** Why there is no value, or what weakens it. */
  remarks: z.array(z.string()),
});
export type ConvertedHardness = z.infer<typeof converted>;

const requirement = z
  .object({
    word: z.enum(["pass", "fail", "cannot_be_decided"]),
    reason: z.string(),
    isWithinUncertainty: z.boolean(),
  })
  .nullable();

const statedHardness = z.object({
  value: z.number().nullable(),
  expandedUncertainty: z.number().nullable(),
  readingIds: z.array(z.string()),
  remark: z.string().nullable(),
  conversions: z.array(converted),
  requirement,
});

const item = z.object({
  code: z.string(),
  level: z.enum(["must", "noted", "settled"]),
  text: z.string(),
  readingIds: z.array(z.string()),
});
export type SettleItem = z.infer<typeof item>;

/** Content of a hardness result: all that follows from a traverse. Nothing is rounded. */
export const resultContent = z.object({
  traverseId: z.string(),
  traverseLabel: z.string(),
  symbol: z.string(),
  hasConversions: z.boolean(),
  tableTitles: z.array(z.string()),
  unsettled: z.array(z.string()),
  readings: z.array(
    z.object({
      id: z.string(),
      number: z.number(),
      /** Perpendicular to the surface, mm. */
      depthMm: z.number().nullable(),
      hardness: z.number().nullable(),
      expandedUncertainty: z.number().nullable(),
      isInCurve: z.boolean(),
      conversions: z.array(converted),
    }),
  ),
  depth: z
    .object({
      kind: z.enum(["SHD", "CHD", "NHD"]),
      limit: z.number().nullable(),
      limitBasis: z.string().nullable(),
      depthMm: z.number().nullable(),
      expandedUncertaintyMm: z.number().nullable(),
      uncertaintyStatement: z.string(),
      /** Why there is no depth. */
      reason: z.string().nullable(),
      restsOn: z.array(z.string()),
      requirement,
    })
    .nullable(),
  surface: statedHardness,
  core: statedHardness,
  items: z.array(item),
});
export type ResultContent = z.infer<typeof resultContent>;
