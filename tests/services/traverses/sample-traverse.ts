import { createRecord } from "@/lib/records/write-version";
import { transaction } from "@/db/transaction";
import type { Answers } from "@/lib/intake/answers";
import { newTraverse } from "@/lib/traverses/new-traverse";
import type { TraverseContent, TypedReading } from "@/lib/traverses/schemas";
import { asRequester } from "../../helpers/people";

/** Depth mm and diagonals um of an induction hardened shaft; invented. */
const ROWS: readonly [string, string, string][] = [
  ["0.30", "54.2", "54.6"],
  ["0.70", "54.3", "54.1"],
  ["1.10", "55.4", "55.0"],
  ["1.50", "57.4", "56.6"],
  ["1.90", "62.9", "63.5"],
  ["2.30", "72.4", "72.8"],
  ["2.80", "77.1", "77.9"],
  ["3.50", "79.0", "78.8"],
];

export const shaftRows = (): TypedReading[] =>
  ROWS.map(([depth, d1, d2], index) => ({ id: `r${index + 1}`, depth, d1, d2 }));

export function aTraverse(change: Partial<TraverseContent> = {}): TraverseContent {
  return {
    ...newTraverse(),
    name: "at fillet",
    tableId: "steel-unalloyed-lowalloy-iso18265-a1",
    process: "induction",
    depthKind: "SHD",
    minSurfaceHv: 560,
    requiredDepthMm: { min: 2.5, max: 4 },
    readings: shaftRows(),
    ...change,
  };
}

/** A field return as it stands once it was sent. */
export async function aFieldReturn(caseId: string): Promise<{ versionId: string }> {
  const requester = await asRequester();
  const answers: Answers = {
    caseDepth: {
      kind: "value",
      value: { process: "induction", definition: "SHD", min: "2.5", max: "4.0" },
    },
    surfaceHardness: {
      kind: "value",
      value: { scale: "HV1", min: "560", max: "", location: "journal" },
    },
  };
  return transaction((tx) =>
    createRecord(
      tx,
      requester,
      { caseId, kind: "field_return", label: "F1" },
      { content: { answers } },
    ),
  );
}
