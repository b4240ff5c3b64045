import type { Conflict, FieldErrors } from "@/lib/errors";
import type { CalibrateImage } from "@/lib/images/calibration-schemas";
import type { ChangeMark, PlaceMark } from "@/lib/images/mark-schemas";

type Written = { recordId: string; number: number; label: string };
type Answer<T> =
  | { ok: true; value: T }
  | {
      ok: false;
      error: { code: string; message: string; fields?: FieldErrors; conflict?: Conflict };
    };

/** What the bench asks of the server. */
export type BenchActs = {
  place: (mark: PlaceMark) => Promise<Answer<Written>>;
  change: (mark: ChangeMark) => Promise<Answer<Written>>;
  remove: (mark: {
    markId: string;
    seenVersion: number;
    reason?: string;
  }) => Promise<Answer<unknown>>;
  restore: (mark: { markId: string }) => Promise<Answer<unknown>>;
  setScale: (scale: CalibrateImage) => Promise<Answer<{ label: string; recomputed: number }>>;
};
export type BenchError = Extract<Answer<unknown>, { ok: false }>["error"];
