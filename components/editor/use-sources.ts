"use client";

import { useMemo } from "react";
import type { Chart } from "@/lib/charts/primitives";
import type { CitedLook, FindingsSources } from "./findings-context";

export type CitedState = CitedLook & { recordId: string; versionId: string; field: string };
export type PictureSource = { id: string; label: string; caption: string };
export type TraverseSource = { id: string; label: string; name: string; chart: Chart };

const CURRENT: CitedLook = { state: "current", now: null };
const keyOf = (recordId: string, versionId: string, field: string) =>
  `${recordId}/${versionId}/${field}`;

/** What the parts of the text show, found by what they are bound to. */
export function useSources(
  cited: readonly CitedState[],
  pictures: readonly PictureSource[],
  traverses: readonly TraverseSource[],
): FindingsSources {
  return useMemo(() => {
    const looks = new Map(
      cited.map((state) => [keyOf(state.recordId, state.versionId, state.field), state]),
    );
    return {
      citedLook: (recordId, versionId, field) =>
        looks.get(keyOf(recordId, versionId, field)) ?? CURRENT,
      picture: (imageId) => pictures.find((picture) => picture.id === imageId) ?? null,
      chart: (traverseId) => traverses.find((traverse) => traverse.id === traverseId) ?? null,
    };
  }, [cited, pictures, traverses]);
}
