"use client";

import { createContext, useContext } from "react";
import type { Chart } from "@/lib/charts/primitives";

export type CitedNow = {
  versionId: string;
  text: string;
  by: string;
  at: string;
  reason: string | null;
};
export type CitedLook = { state: "current" | "stale" | "kept" | "withdrawn"; now: CitedNow | null };

export type FindingsSources = {
  citedLook: (recordId: string, versionId: string, field: string) => CitedLook;
  picture: (imageId: string) => { label: string; caption: string } | null;
  chart: (traverseId: string) => { label: string; chart: Chart } | null;
};

const Context = createContext<FindingsSources | null>(null);
export const FindingsProvider = Context.Provider;

/** Sources of the findings on screen, for the parts of the text that show them. */
export function useFindingsSources(): FindingsSources {
  const sources = useContext(Context);
  if (!sources) throw new Error("findings parts stand inside FindingsProvider");
  return sources;
}
