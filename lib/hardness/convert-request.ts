import { converterFor, type Conversion, type InputStatus } from "./convert";
import { isMaterialGroup, type MaterialGroup } from "./material-groups";
import { isTableId, type TableId } from "./published-tables";
import { isScale, type Scale } from "./scales";

/** A request whose shape is already checked; its names are not. */
export interface ConvertRequest {
  readonly materialGroup: string;
  readonly from: string;
  readonly values: readonly (number | { readonly value: number; readonly status: InputStatus })[];
  readonly to: readonly string[];
  readonly table?: string;
}

export interface ConvertedValue {
  readonly from: Scale;
  readonly value: number;
  readonly conversions: readonly Conversion[];
}

export interface UnknownName {
  readonly kind: "material group" | "scale" | "table";
  readonly name: string;
}

export type ConvertAnswer =
  | { readonly ok: true; readonly results: readonly ConvertedValue[] }
  | { readonly ok: false; readonly unknownNames: readonly UnknownName[] };

interface KnownNames {
  readonly materialGroup: MaterialGroup;
  readonly from: Scale;
  readonly to: readonly Scale[];
  readonly tableId?: TableId;
}

function readNames(request: ConvertRequest): KnownNames | readonly UnknownName[] {
  const { materialGroup, from, to, table } = request;
  const unknownNames: UnknownName[] = [];
  if (!isMaterialGroup(materialGroup))
    unknownNames.push({ kind: "material group", name: materialGroup });
  for (const name of new Set([from, ...to]))
    if (!isScale(name)) unknownNames.push({ kind: "scale", name });
  if (table !== undefined && !isTableId(table)) unknownNames.push({ kind: "table", name: table });
  const known = to.filter(isScale);
  if (!isMaterialGroup(materialGroup) || !isScale(from) || known.length < to.length)
    return unknownNames;
  if (table === undefined) return { materialGroup, from, to: known };
  return isTableId(table) ? { materialGroup, from, to: known, tableId: table } : unknownNames;
}

/**
 * Answers a whole conversion request: for each value, in the order given, one conversion for each
 * scale asked. A name that stands nowhere in the tables fails the request as a whole.
 */
export function answerConvertRequest(
  request: ConvertRequest,
  enabledTableIds: ReadonlySet<TableId>,
): ConvertAnswer {
  const names = readNames(request);
  if (!("materialGroup" in names)) return { ok: false, unknownNames: names };
  const { materialGroup, from, to, tableId } = names;
  const converters = to.map((scale) =>
    converterFor({ materialGroup, from, to: scale, tableId, enabledTableIds }),
  );
  const results = request.values.map((given) => {
    const { value, status } =
      typeof given === "number" ? { value: given, status: "measured" as const } : given;
    return { from, value, conversions: converters.map((toScale) => toScale(value, status)) };
  });
  return { ok: true, results };
}
