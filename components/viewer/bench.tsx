"use client";

import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import Link from "next/link";
import { ChevronLeft, Redo2, Undo2 } from "lucide-react";
import { GateMark } from "@/components/ui/gate-mark";
import type { Conflict } from "@/lib/errors";
import type { BenchMark, BenchPicture, BenchState, FilmPicture } from "@/lib/images/bench-state";
import type { CalibrateImage } from "@/lib/images/calibration-schemas";
import { MARK_TOOL_NAMES } from "@/lib/images/mark-names";
import type { Geometry } from "@/lib/images/mark-schemas";
import type { Point } from "@/lib/imaging/point";
import { routes } from "@/lib/routes";
import type { BenchActs, BenchError } from "./bench-acts";
import { benchButton } from "./bench-look";
import { DrawPanel, type MarkWords } from "./draw-panel";
import {
  closesArea,
  completeAt,
  leastPoints,
  PLAIN_OPTIONS,
  shapeOf,
  withPointMoved,
} from "./drawing";
import { FilmStrip } from "./film-strip";
import { MarkConflict } from "./mark-conflict";
import { MarkLayer } from "./mark-layer";
import { MarksPanel } from "./marks-panel";
import { ScaleBarMark } from "./scale-bar-mark";
import { ScaleForm } from "./scale-form";
import { ScalePanel } from "./scale-panel";
import { ToolBar } from "./tool-bar";
import { BENCH_TOOLS, type BenchTool, TOOL_KEYS, TOOL_WORDS } from "./tools";
import { useBenchState } from "./use-bench-state";
import { useDeepZoom } from "./use-deep-zoom";
import { useUndo } from "./use-undo";
import { ontoPicture, toPicture } from "./view";

type Props = {
  picture: BenchPicture;
  first: BenchState;
  film: readonly FilmPicture[];
  chosenId: string | null;
  acts: BenchActs;
};

const MARGINS = { left: 84, top: 56, right: 320, bottom: 110 };
const PLAIN_WORDS: MarkWords = { featureCode: null, name: "", confidence: "likely", note: "" };
const STEP_PX: Record<string, Point> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

const isTyping = (target: EventTarget | null) =>
  target instanceof HTMLElement && /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName);

/** The image bench: a deep-zoom picture with marks that are measured by the server. */
export function Bench({ picture, first, film, chosenId: firstChosen, acts }: Props) {
  const { state, isStale, refresh } = useBenchState(picture.id, first);
  const host = useRef<HTMLDivElement>(null);
  const [tool, setTool] = useState<BenchTool>(
    first.scale || first.mayNotCalibrate ? "move" : "scale",
  );
  const [points, setPoints] = useState<Point[]>([]);
  const [cross, setCross] = useState<Point | null>(null);
  const [options, setOptions] = useState(PLAIN_OPTIONS);
  const [words, setWords] = useState(PLAIN_WORDS);
  const [chosenId, setChosenId] = useState(firstChosen);
  const [edited, setEdited] = useState<Geometry | null>(null);
  const [isHidden, setHidden] = useState(false);
  const [error, setError] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(false);
  const [said, setSaid] = useState("");
  const [clash, setClash] = useState<{
    conflict: Conflict;
    mark: BenchMark;
    geometry: Geometry;
  } | null>(null);
  const history = useUndo();

  const isReady = state.state === "ready" && state.widthPx !== null && state.heightPx !== null;
  const size = useMemo(
    () => ({ widthPx: state.widthPx ?? 0, heightPx: state.heightPx ?? 0 }),
    [state.widthPx, state.heightPx],
  );
  const mayMark = state.mayNotMark === null && isReady;
  const mayScale = state.mayNotCalibrate === null && isReady;
  const shape = tool === "move" ? null : shapeOf(tool, points, options);

  const takeUp = useCallback((next: BenchTool) => {
    setTool(next);
    setPoints([]);
    setCross(null);
    setError(null);
    setEdited(null);
    setOptions(PLAIN_OPTIONS);
    setWords(PLAIN_WORDS);
    if (next !== "move") setChosenId(null);
  }, []);

  const fail = (failed: BenchError) => {
    setError(Object.values(failed.fields ?? {})[0] ?? failed.message);
    return false;
  };

  const removeMark = useCallback(
    async (markId: string) => {
      const current = await fetchMark(picture.id, markId);
      if (!current) return false;
      const answer = await acts.remove({ markId, seenVersion: current.number });
      await refresh();
      return answer.ok || fail(answer.error);
    },
    [acts, picture.id, refresh],
  );
  const restoreMark = useCallback(
    async (markId: string) => {
      const answer = await acts.restore({ markId });
      await refresh();
      return answer.ok || fail(answer.error);
    },
    [acts, refresh],
  );

  async function finish(drawn: Geometry) {
    setBusy(true);
    setError(null);
    try {
      const answer = await acts.place({ imageId: picture.id, geometry: drawn, ...words });
      if (!answer.ok) {
        fail(answer.error);
        return;
      }
      const { recordId, label } = answer.value;
      history.did({
        words: `${label} placed`,
        undo: () => removeMark(recordId),
        redo: () => restoreMark(recordId),
      });
      setPoints([]);
      setWords({ ...PLAIN_WORDS, featureCode: words.featureCode });
      setSaid(`${label} placed`);
      setChosenId(recordId);
      await refresh();
    } catch {
      setError("There was no answer. Nothing was saved; press Finish again.");
    } finally {
      setBusy(false);
    }
  }

  function setPoint(at: Point, isDouble: boolean, scale: number) {
    if (tool === "move" || isBusy) return;
    if (tool === "scale" ? !mayScale : !mayMark) return;
    if (closesArea(tool, points, at, scale)) {
      if (shape) void finish(shape);
      return;
    }
    if (isDouble) {
      if (tool !== "scale" && shape && completeAt(tool, options) === null) void finish(shape);
      return;
    }
    const next = tool === "scale" && points.length === 2 ? [at] : [...points, at];
    setPoints(next);
    setSaid(`Point ${next.length} set`);
    const all = completeAt(tool, options);
    const whole = tool === "scale" ? null : shapeOf(tool, next, options);
    if (all !== null && next.length >= all && whole && tool !== "note") void finish(whole);
  }

  const { view, hasFailed, zoomBy, whole, oneToOne, panBy, show } = useDeepZoom(
    host,
    isReady ? routes.api.imageInfo(picture.id) : null,
    MARGINS,
    (at, isDouble, pressed) => {
      setCross(null);
      setPoint(ontoPicture(toPicture(at, pressed), size), isDouble, pressed.scale);
    },
  );

  async function saveEdit(mark: BenchMark, geometry: Geometry, seenVersion = mark.number) {
    const { content } = mark;
    const { featureCode, name, confidence, note, originId } = content;
    const before = content.geometry;
    setBusy(true);
    const answer = await acts.change({
      markId: mark.id,
      seenVersion,
      geometry,
      featureCode,
      name,
      confidence,
      note,
      originId,
    });
    setBusy(false);
    if (!answer.ok) {
      if (answer.error.conflict) setClash({ conflict: answer.error.conflict, mark, geometry });
      else fail(answer.error);
      return;
    }
    const put = async (to: Geometry) => {
      const current = await fetchMark(picture.id, mark.id);
      if (!current) return false;
      const again = await acts.change({
        markId: mark.id,
        seenVersion: current.number,
        geometry: to,
        featureCode,
        name,
        confidence,
        note,
        originId,
      });
      await refresh();
      return again.ok || fail(again.error);
    };
    history.did({
      words: `${mark.label} moved`,
      undo: () => put(before),
      redo: () => put(geometry),
    });
    setEdited(null);
    setSaid(`${mark.label} saved`);
    await refresh();
  }

  async function setTheScale(scale: CalibrateImage) {
    setBusy(true);
    setError(null);
    const answer = await acts.setScale(scale);
    setBusy(false);
    if (!answer.ok) {
      fail(answer.error);
      return;
    }
    takeUp("move");
    setSaid(`Scale ${answer.value.label} set`);
    await refresh();
  }

  const keys = useRef<(event: KeyboardEvent) => void>(() => undefined);
  useEffect(() => {
    keys.current = (event) => {
      if (isTyping(event.target) || event.altKey || clash) return;
      const key = event.key.toLowerCase();
      const done = () => event.preventDefault();
      if ((event.ctrlKey || event.metaKey) && key === "z") {
        done();
        void (event.shiftKey ? history.redo() : history.undo());
        return;
      }
      if (event.ctrlKey || event.metaKey) return;
      const named = BENCH_TOOLS.find((known) => TOOL_KEYS[known] === key);
      if (named && (named === "move" || (named === "scale" ? mayScale : mayMark)))
        return (done(), takeUp(named));
      if (key === "+" || key === "=") return (done(), zoomBy(1.4));
      if (key === "-") return (done(), zoomBy(1 / 1.4));
      if (key === "0") return (done(), whole());
      if (key === "h") return (done(), setHidden(!isHidden));
      if (key === "escape") return (done(), takeUp("move"));
      const step = STEP_PX[event.key];
      if (step && tool === "move" && !(event.target instanceof HTMLButtonElement))
        return (done(), panBy(step[0] * 60, step[1] * 60));
      if (step && tool !== "move") {
        done();
        const by = event.shiftKey ? 10 : 1;
        const from = cross ?? [size.widthPx / 2, size.heightPx / 2];
        const to = ontoPicture([from[0] + step[0] * by, from[1] + step[1] * by], size);
        setCross(to);
        show(to);
        return;
      }
      if (key === "backspace" && points.length > 0) return (done(), setPoints(points.slice(0, -1)));
      if (
        key === "enter" &&
        tool !== "move" &&
        cross &&
        !(event.target instanceof HTMLButtonElement)
      ) {
        done();
        const last = points.at(-1);
        // Enter twice at one place ends a shape that has no fixed number of points.
        setPoint(
          cross,
          last !== undefined && last[0] === cross[0] && last[1] === cross[1],
          view?.scale ?? 1,
        );
      }
    };
  });
  useEffect(() => {
    const listen = (event: KeyboardEvent) => keys.current(event);
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, []);

  const umPerPx = state.scale?.content.umPerPx ?? null;
  const drawing = tool !== "move" && tool !== "scale" ? tool : null;
  return (
    <main className="fixed inset-0 overflow-hidden bg-ib-surround text-ib-ink [--focus:var(--ib-focus)]">
      <h1 className="sr-only">
        Image bench, {picture.label} {picture.title}
      </h1>
      <header className="absolute inset-x-0 top-0 z-20 flex h-12 items-center gap-3 border-b border-ib-rule bg-ib-panel px-3 text-13">
        <Link
          href={routes.images(picture.caseId)}
          className="flex h-11 items-center gap-1 text-ib-ink no-underline hover:text-ib-ink"
        >
          <ChevronLeft size={16} aria-hidden="true" /> Images
        </Link>
        <span className="font-mono text-12 whitespace-nowrap text-ib-ink-2">
          {picture.caseNumber} / {picture.label}
        </span>
        <b className="raw truncate font-head">{picture.title}</b>
        <span className="truncate text-ib-ink-2 max-xl:hidden">{picture.facts}</span>
        {state.scale ? (
          <span className="flex items-center gap-1.5 whitespace-nowrap text-ib-length">
            <GateMark met /> Calibrated
          </span>
        ) : (
          <span className="whitespace-nowrap text-ib-origin">▲ Not calibrated</span>
        )}
        {isStale && <span className="text-ib-origin">No connection; this may be old</span>}
        <span className="ml-auto flex gap-2">
          <button
            type="button"
            className={benchButton({ small: true })}
            disabled={!history.canUndo}
            onClick={() => void history.undo()}
          >
            <Undo2 size={15} aria-hidden="true" /> Undo
          </button>
          <button
            type="button"
            className={benchButton({ small: true })}
            disabled={!history.canRedo}
            onClick={() => void history.redo()}
          >
            <Redo2 size={15} aria-hidden="true" /> Redo
          </button>
          <Link
            href={routes.images(picture.caseId)}
            className={benchButton({ small: true, primary: true })}
          >
            Done
          </Link>
        </span>
      </header>
      <div
        ref={host}
        role="application"
        aria-label={`${picture.label} ${picture.title}. Tools by letter; arrows move the cross, Enter sets a point.`}
        tabIndex={0}
        className="absolute inset-0 outline-offset-[-3px]"
        style={{ cursor: tool === "move" ? "grab" : "crosshair" }}
      />
      {view && (
        <MarkLayer
          view={view}
          marks={isHidden ? [] : state.marks}
          chosenId={chosenId}
          edited={edited}
          drawn={{ shape, points }}
          cross={cross}
          canChoose={tool === "move"}
          onChoose={(id) => {
            setChosenId(id);
            setEdited(null);
          }}
          onMovePoint={(index, to) =>
            edited && setEdited(withPointMoved(edited, index, ontoPicture(to, size)))
          }
        />
      )}
      {(!isReady || hasFailed) && (
        <p
          role="status"
          className="absolute inset-x-0 top-1/3 z-10 mx-auto max-w-98 text-center text-14"
        >
          {hasFailed
            ? "The picture could not be shown. It is kept; load the page again."
            : state.state === "refused"
              ? `This file was refused. ${state.refusal ?? ""}`
              : "The picture is being checked and cut into tiles. You can leave this page."}
        </p>
      )}
      {(mayMark || mayScale) && (
        <ToolBar
          tool={tool}
          mayMark={mayMark}
          mayScale={mayScale}
          isCalibrated={state.scale !== null}
          onTool={takeUp}
        />
      )}
      <div className="absolute top-15 right-3 z-10 grid max-h-[calc(100dvh-11.5rem)] w-76 gap-3 overflow-y-auto">
        {drawing && (
          <DrawPanel
            tool={drawing}
            words={words}
            options={options}
            pointCount={points.length}
            canFinish={shape !== null && points.length >= leastPoints(drawing, options)}
            error={error}
            isBusy={isBusy}
            onWords={setWords}
            onOptions={setOptions}
            onBack={() => setPoints(points.slice(0, -1))}
            onFinish={() => shape && void finish(shape)}
          />
        )}
        {tool === "scale" && (
          <ScaleForm
            imageId={picture.id}
            seenVersion={state.scale?.number ?? null}
            points={points}
            fileUmPerPx={picture.fileUmPerPx}
            markCount={state.marks.length}
            error={error}
            isBusy={isBusy}
            onSet={(scale) => void setTheScale(scale)}
          />
        )}
        {tool === "move" && error && (
          <p
            role="alert"
            className="rounded-4 border border-ib-final bg-ib-panel px-3.5 py-2 text-12 text-ib-final"
          >
            {error}
          </p>
        )}
        <MarksPanel
          marks={state.marks}
          deleted={state.deleted}
          chosenId={chosenId}
          isHidden={isHidden}
          isEditing={edited !== null}
          refusal={state.mayNotMark}
          onChoose={(id) => {
            takeUp("move");
            setChosenId(id);
          }}
          onHide={() => setHidden(!isHidden)}
          onEdit={(mark) => {
            if (edited) void saveEdit(mark, edited);
            else setEdited(mark.content.geometry);
          }}
          onDelete={(mark) => {
            void removeMark(mark.id).then((worked) => {
              if (!worked) return;
              history.did({
                words: `${mark.label} deleted`,
                undo: () => restoreMark(mark.id),
                redo: () => removeMark(mark.id),
              });
              setChosenId(null);
              setSaid(`${mark.label} deleted`);
            });
          }}
          onRestore={(mark) => void restoreMark(mark.id)}
        />
        <ScalePanel scale={state.scale} mayScale={mayScale} onScale={() => takeUp("scale")} />
      </div>
      {view && umPerPx !== null && (
        <div className="absolute bottom-27 left-22 z-10">
          <ScaleBarMark umPerScreenPx={umPerPx / view.scale} />
        </div>
      )}
      <footer className="absolute inset-x-3 bottom-3 z-10 flex items-center gap-4 rounded-4 border border-ib-rule bg-ib-panel p-1.5">
        <FilmStrip caseId={picture.caseId} film={film} currentId={picture.id} />
        <span className="flex items-center gap-2 text-13">
          <button
            type="button"
            aria-label="Zoom out"
            className={benchButton()}
            onClick={() => zoomBy(1 / 1.4)}
          >
            −
          </button>
          <span className="tn w-14 text-center">
            {view ? `${Math.round(view.scale * 100)} %` : "–"}
          </span>
          <button
            type="button"
            aria-label="Zoom in"
            className={benchButton()}
            onClick={() => zoomBy(1.4)}
          >
            +
          </button>
          <button type="button" className={benchButton()} onClick={whole}>
            Whole
          </button>
          <button type="button" className={benchButton()} onClick={oneToOne}>
            1 : 1
          </button>
        </span>
      </footer>
      <p role="status" className="sr-only">
        {said || (tool === "move" ? "" : `${TOOL_WORDS[tool]} tool`)}
      </p>
      <MarkTable marks={state.marks} />
      {clash && (
        <MarkConflict
          conflict={clash.conflict}
          label={clash.mark.label}
          onKeepMine={() => {
            const { mark, geometry } = clash;
            setClash(null);
            void fetchMark(picture.id, mark.id).then(
              (current) => current && saveEdit(current, geometry, current.number),
            );
          }}
          onTakeTheirs={() => {
            setClash(null);
            setEdited(null);
            void refresh();
          }}
        />
      )}
    </main>
  );
}

/** The newest version of one mark. */
async function fetchMark(imageId: string, markId: string): Promise<BenchMark | null> {
  const answer = await fetch(routes.api.marks(imageId), { cache: "no-store" });
  if (!answer.ok) return null;
  const state: BenchState = await answer.json();
  return state.marks.find((mark) => mark.id === markId) ?? null;
}

/** The marks as a table, for those who hear the page. */
function MarkTable({ marks }: { marks: readonly BenchMark[] }) {
  return (
    <table className="sr-only">
      <caption>Marks and their values</caption>
      <thead>
        <tr>
          <th>Mark</th>
          <th>Kind</th>
          <th>Values</th>
        </tr>
      </thead>
      <tbody>
        {marks.map((mark) => (
          <tr key={mark.id}>
            <td>{mark.label}</td>
            <td>{MARK_TOOL_NAMES[mark.content.tool]}</td>
            <td>
              {mark.content.measurements
                .map((value) => `${value.label} ${value.refused ?? value.text}`)
                .join(", ")}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
