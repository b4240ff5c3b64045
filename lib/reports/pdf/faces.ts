import "server-only";
import { readFileSync } from "node:fs";
import path from "node:path";
import { readCoverage, type Coverage } from "./font-coverage";

const FACE_FILES = {
  serif: "RiverlineSerif-Regular.ttf",
  "serif-italic": "RiverlineSerif-Italic.ttf",
  "serif-semibold": "RiverlineSerif-SemiBold.ttf",
  sans: "Inter-Regular.ttf",
  "sans-medium": "Inter-Medium.ttf",
  "sans-semibold": "Inter-SemiBold.ttf",
  mono: "RiverlineMono-Regular.ttf",
  math: "RiverlineMath-Regular.ttf",
  "math-semibold": "RiverlineMath-SemiBold.ttf",
} as const;

export type FaceName = keyof typeof FACE_FILES;
export type Face = { name: FaceName; file: Buffer; coverage: Coverage };

export const FACE_NAMES: readonly FaceName[] = [
  "serif",
  "serif-italic",
  "serif-semibold",
  "sans",
  "sans-medium",
  "sans-semibold",
  "mono",
  "math",
  "math-semibold",
];

const loaded = new Map<FaceName, Face>();

/** Reads a face once for the life of the process. Every process starts in the project's root. */
export function face(name: FaceName): Face {
  const known = loaded.get(name);
  if (known) return known;
  const file = readFileSync(path.join(process.cwd(), "app/fonts/pdf", FACE_FILES[name]));
  const read = { name, file, coverage: readCoverage(file) };
  loaded.set(name, read);
  return read;
}

const HEAVY: ReadonlySet<FaceName> = new Set(["serif-semibold", "sans-semibold"]);

/** The face itself, then those that stand in for it, by weight, where it lacks a sign. */
export function faceChain(name: FaceName): readonly FaceName[] {
  return HEAVY.has(name) ? [name, "math-semibold", "sans-semibold"] : [name, "math", "sans"];
}
