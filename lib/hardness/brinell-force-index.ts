import { answer, isPositive, refuse, type Answer, type Refusal } from "../numerics/verdict";

/** Force-diameter indices 0.102 F / D2 that ISO 6506-1 knows; another needs special agreement. */
const STANDARD_INDICES = [30, 15, 10, 5, 2.5, 1.25, 1] as const;

/** An index counts as one of the list when it lies within 1 %. */
const INDEX_TOLERANCE = 0.01;

interface IndexRow {
  readonly indices: readonly number[];
  readonly from?: number;
  readonly to?: number;
  /** Whether the bounds themselves belong to the row. */
  readonly includesFrom?: boolean;
  readonly includesTo?: boolean;
}

/** Index by material and hardness. Source: ISO 6506-1 table of force-diameter index (from memory). */
export const BRINELL_MATERIALS = {
  steel_nickel_titanium: {
    name: "steel, nickel alloys, titanium alloys",
    rows: [{ indices: [30] }],
  },
  cast_iron: {
    name: "cast iron (D >= 2.5 mm)",
    smallestBallMm: 2.5,
    rows: [
      { to: 140, indices: [10] },
      { from: 140, includesFrom: true, indices: [30] },
    ],
  },
  copper: {
    name: "copper and copper alloys",
    rows: [
      { to: 35, indices: [5] },
      { from: 35, to: 200, includesFrom: true, includesTo: true, indices: [10] },
      { from: 200, indices: [30] },
    ],
  },
  light_metals: {
    name: "light metals and alloys",
    rows: [
      { to: 35, indices: [2.5] },
      { from: 35, to: 80, includesFrom: true, includesTo: true, indices: [5, 10, 15] },
      { from: 80, indices: [10, 15] },
    ],
  },
  lead_tin: { name: "lead, tin", rows: [{ indices: [1] }] },
  sintered_metal: { name: "sintered metal", rows: [] },
} as const satisfies Record<
  string,
  { name: string; smallestBallMm?: number; rows: readonly IndexRow[] }
>;

export type BrinellMaterial = keyof typeof BRINELL_MATERIALS;

export type IndexWarningCode =
  | "index_not_standard"
  | "index_not_for_material"
  | "ball_too_small"
  | "see_iso_4498"
  | "hardness_not_given";

/** 0.102 F / D2, F in N, D in mm: 30 for 29 420 N on a 10 mm ball. Source: ISO 6506-1. */
export function brinellForceIndex(forceN: number, ballDiameterMm: number): number {
  return (0.102 * forceN) / ballDiameterMm ** 2;
}

function rowHolds(row: IndexRow, hbw: number): boolean {
  const { from = -Infinity, to = Infinity } = row;
  const above = row.includesFrom ? hbw >= from : hbw > from;
  const below = row.includesTo ? hbw <= to : hbw < to;
  return above && below;
}

/** Whether force and ball suit the material. An index that does not is a warning, never a refusal. */
export function brinellIndexVerdict(input: {
  readonly forceN: number;
  readonly ballDiameterMm: number;
  readonly material: BrinellMaterial;
  readonly hbw?: number;
}): Answer<{ readonly index: number }, IndexWarningCode> | Refusal<"not_positive"> {
  const { forceN, ballDiameterMm, hbw } = input;
  if (!isPositive(forceN) || !isPositive(ballDiameterMm))
    return refuse("not_positive", "Force and ball diameter have to be above zero.");
  const index = brinellForceIndex(forceN, ballDiameterMm);
  const warn = (code: IndexWarningCode, text: string) => answer({ index }, [{ code, text }]);
  const matches = (nominal: number) => Math.abs(index / nominal - 1) <= INDEX_TOLERANCE;
  const material: { name: string; smallestBallMm?: number; rows: readonly IndexRow[] } =
    BRINELL_MATERIALS[input.material];

  if (input.material === "sintered_metal")
    return warn("see_iso_4498", "For sintered metal the index is that of ISO 4498.");
  if (!STANDARD_INDICES.some(matches))
    return warn(
      "index_not_standard",
      `The force index is ${index.toFixed(1)}: special agreement needed.`,
    );
  if (material.smallestBallMm !== undefined && ballDiameterMm < material.smallestBallMm)
    return warn("ball_too_small", `For ${material.name} the ball is too small.`);
  const rows = material.rows.filter((row) => hbw === undefined || rowHolds(row, hbw));
  const allowed = rows.flatMap((row) => row.indices);
  if (!allowed.some(matches))
    return warn(
      "index_not_for_material",
      `The force index is ${index.toFixed(1)}; ${material.name} takes ${allowed.join(" or ")} here: special agreement needed.`,
    );
  if (hbw === undefined && material.rows.length > 1)
    return warn(
      "hardness_not_given",
      "Whether the index suits the material depends on the hardness, which is not given.",
    );
  return answer({ index });
}
