import type { Conflict, FieldErrors } from "@/lib/errors";
import type { CalibrateImage } from "@/lib/images/calibration-schemas";
import type { ChangeMark, PlaceMark } from "@/lib/images/mark-schemas";

type Written = { recordId: string; number: number; label: string };
export type BenchAnswer<T> =
  | { ok: true; value: T }
  | {
      ok: false;
      error: { code: string; message: string; fields?: FieldErrors; conflict?: Conflict };
    };

/** What the bench asks of the server. */
export type BenchActs = {
  place: (mark: PlaceMark) => Promise<BenchAnswer<Written>>;
  change: (mark: ChangeMark) => Promise<BenchAnswer<Written>>;
  remove: (mark: {
    markId: string;
    seenVersion: number;
    reason?: string;
  }) => Promise<BenchAnswer<unknown>>;
  restore: (mark: { markId: string }) => Promise<BenchAnswer<unknown>>;
  setScale: (scale: CalibrateImage) => Promise<BenchAnswer<{ label: string; recomputed: number }>>;
};
