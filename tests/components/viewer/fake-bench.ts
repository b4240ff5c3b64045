import { vi } from "vitest";
import type { BenchActs, BenchAnswer } from "@/components/viewer/bench-acts";
import type { BenchMark, BenchPicture, BenchState } from "@/lib/images/bench-state";
import { MARK_LETTER } from "@/lib/images/constants";
import type { Geometry } from "@/lib/images/mark-schemas";

export const PICTURE: BenchPicture = {
  id: "img_1",
  caseId: "case_1",
  caseNumber: "RL-2026-0142",
  label: "IM-03",
  title: "Fracture face",
  facts: "E1.1 · Stereo microscope",
  fileUmPerPx: null,
};

export const lengthOf = (x: number): Geometry => ({
  tool: "length",
  points: [
    [0, 0],
    [x, 0],
  ],
});

type Call = { verb: keyof BenchActs; input: unknown };

/**
 * Stands in for the server with its rule of versions: a change answers to the version it saw. Its
 * `scale` is there, so the bench opens with the Move tool.
 */
export function fakeServer(given: Partial<BenchState> = {}) {
  const state: BenchState = {
    state: "ready",
    refusal: null,
    widthPx: 1000,
    heightPx: 800,
    scale: {
      id: "cal_1",
      label: "S1",
      number: 1,
      content: {
        settings: { source: "file_resolution", relativeUncertaintyPercent: 2, tiltDeg: null },
        umPerPx: 10,
        relativeUncertainty: 0.02,
      },
      pixelText: "0.0100 ± 0.0002 mm",
      by: "Idris Vale",
      at: "2026-11-20T09:00:00.000Z",
    },
    marks: [],
    deleted: [],
    mayNotMark: null,
    mayNotCalibrate: null,
    ...given,
  };
  const calls: Call[] = [];
  let made = 0;
  let isAway = false;

  function contentOf(geometry: Geometry): BenchMark["content"] {
    return {
      tool: geometry.tool,
      geometry,
      featureCode: null,
      name: "",
      confidence: "likely",
      note: "",
      originId: null,
      measurements: [],
    };
  }
  const isIt = (id: string) => (mark: BenchMark) => mark.id === id;
  const refused = <T>(code: string, message: string): BenchAnswer<T> => ({
    ok: false,
    error: { code, message },
  });

  function add(geometry: Geometry, by = "Idris Vale"): BenchMark {
    made += 1;
    const label = `${MARK_LETTER[geometry.tool]}${made}`;
    const mark: BenchMark = {
      id: `mark_${made}`,
      label,
      versionId: `ver_${made}_1`,
      number: 1,
      content: contentOf(geometry),
      caption: label,
      by,
      at: "2026-11-20T09:00:00.000Z",
    };
    state.marks = [...state.marks, mark];
    return mark;
  }

  function put(id: string, geometry: Geometry, by: string): BenchMark {
    state.marks = state.marks.map((mark) =>
      mark.id === id
        ? { ...mark, number: mark.number + 1, content: contentOf(geometry), by }
        : mark,
    );
    const changed = state.marks.find(isIt(id));
    if (!changed) throw new Error(`no mark ${id}`);
    return changed;
  }

  const heard = (verb: Call["verb"], input: unknown) => {
    calls.push({ verb, input });
    if (isAway) throw new TypeError("Failed to fetch");
  };
  const written = ({ id, number, label }: BenchMark) => ({
    ok: true as const,
    value: { recordId: id, number, label },
  });

  const acts: BenchActs = {
    place: async (input) => {
      heard("place", input);
      return written(add(input.geometry));
    },
    change: async (input) => {
      heard("change", input);
      const mark = state.marks.find(isIt(input.markId));
      if (!mark) return refused("LOCKED", "It was withdrawn.");
      if (mark.number === input.seenVersion)
        return written(put(mark.id, input.geometry, "Idris Vale"));
      const conflict = {
        yours: contentOf(input.geometry),
        theirs: mark.content,
        changedBy: mark.by,
        changedAt: "2026-11-20T11:40:00.000Z",
      };
      return { ok: false, error: { code: "CONFLICT", message: "Changed.", conflict } };
    },
    remove: async (input) => {
      heard("remove", input);
      const mark = state.marks.find(isIt(input.markId));
      if (!mark) return refused("CONFLICT", "It was withdrawn already.");
      if (mark.number !== input.seenVersion) return refused("CONFLICT", "It was changed.");
      state.marks = state.marks.filter((one) => one !== mark);
      state.deleted = [...state.deleted, mark];
      return { ok: true, value: null };
    },
    restore: async (input) => {
      heard("restore", input);
      const mark = state.deleted.find(isIt(input.markId));
      if (!mark) return refused("CONFLICT", "It is in place already.");
      state.deleted = state.deleted.filter((one) => one !== mark);
      state.marks = [...state.marks, mark];
      return { ok: true, value: null };
    },
    setScale: async (input) => {
      heard("setScale", input);
      return { ok: true, value: { label: "S1", recomputed: 0 } };
    },
  };

  vi.stubGlobal("fetch", () =>
    isAway
      ? Promise.reject(new TypeError("Failed to fetch"))
      : Promise.resolve(Response.json(state)),
  );

  return {
    acts,
    state,
    calls,
    add,
    /** Somebody else moves a mark, or its values are worked out anew. */
    move: (id: string, geometry: Geometry, by = "Tove Brandt") => put(id, geometry, by),
    deleteElsewhere: (id: string) => {
      const mark = state.marks.find(isIt(id));
      state.marks = state.marks.filter((one) => one !== mark);
      if (mark) state.deleted = [...state.deleted, mark];
    },
    setAway: (away: boolean) => {
      isAway = away;
    },
    shapes: () => state.marks.map((mark) => mark.content.geometry),
    sent: (verb: Call["verb"]) =>
      calls.filter((call) => call.verb === verb).map((call) => call.input),
  };
}
export type FakeServer = ReturnType<typeof fakeServer>;
