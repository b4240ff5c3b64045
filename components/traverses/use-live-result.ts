"use client";

import { useDeferredValue, useMemo } from "react";
import type { TableId } from "@/lib/hardness/published-tables";
import { filledReadings } from "@/lib/traverses/edit-readings";
import { evaluateContent } from "@/lib/traverses/evaluate-content";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { cellProblems } from "@/lib/traverses/typed-cells";

/** What follows from the traverse as it is being typed; lags behind the keys, never blocks them. */
export function useLiveResult(
  content: TraverseContent,
  made: { traverseId: string; label: string; enabledTableIds: readonly TableId[] },
) {
  const { traverseId, label, enabledTableIds } = made;
  const shown = useDeferredValue(content);
  const filled = useMemo(() => ({ ...shown, readings: filledReadings(shown.readings) }), [shown]);
  const result = useMemo(
    () =>
      evaluateContent(filled, {
        traverseId,
        traverseLabel: label,
        enabledTableIds: new Set(enabledTableIds),
      }),
    [filled, traverseId, label, enabledTableIds],
  );
  const problems = useMemo(() => cellProblems(filled.readings), [filled]);
  const flagged = useMemo(
    () =>
      new Set(
        result.items.flatMap(({ level, readingIds }) => (level === "must" ? readingIds : [])),
      ),
    [result],
  );
  return { filled, result, problems, flagged };
}
