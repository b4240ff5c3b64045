"use client";

import { useMemo, useRef, useState } from "react";
import type { BenchPicture, BenchState, FilmPicture } from "@/lib/images/bench-state";
import type { CalibrateImage } from "@/lib/images/calibration-schemas";
import { routes } from "@/lib/routes";
import type { BenchActs } from "./bench-acts";
import { BenchFooter } from "./bench-footer";
import { BenchHeader } from "./bench-header";
import type { BenchKey } from "./bench-keys";
import { DrawPanel } from "./draw-panel";
import { leastPoints } from "./drawing";
import { KeyList } from "./key-list";
import { MarkConflict } from "./mark-conflict";
import { MarkLayer } from "./mark-layer";
import { MarkTable } from "./mark-table";
import { MarksPanel } from "./marks-panel";
import { PictureNotice } from "./picture-notice";
import { PointPanel } from "./point-panel";
import { ScaleBarMark } from "./scale-bar-mark";
import { ScaleForm } from "./scale-form";
import { ScalePanel } from "./scale-panel";
import { ToolBar } from "./tool-bar";
import type { BenchTool } from "./tools";
import { useBenchKeys } from "./use-bench-keys";
import { useBenchState } from "./use-bench-state";
import { useDeepZoom, ZOOM_STEP } from "./use-deep-zoom";
import { useDrawing } from "./use-drawing";
import { useLetterKeys } from "./use-letter-keys";
import { useMarks } from "./use-marks";
import { usePointEdits } from "./use-point-edits";
import { useServer } from "./use-server";
import { toPicture } from "./view";

type Props = {
  picture: BenchPicture;
  first: BenchState;
  film: readonly FilmPicture[];
  chosenId: string | null;
  acts: BenchActs;
};

const MARGINS = { left: 84, top: 56, right: 320, bottom: 110 };
const PAN_PX = 60;

/** The image bench: a deep-zoom picture with marks that are measured by the server. */
export function Bench({ picture, first, film, chosenId: firstChosen, acts }: Props) {
  const { state, isStale, refresh } = useBenchState(picture.id, first);
  const host = useRef<HTMLDivElement>(null);
  const [chosenId, setChosenId] = useState(firstChosen);
  const [isHidden, setHidden] = useState(false);
  const [isKeyList, setKeyList] = useState(false);
  const [said, say] = useState("");
  const [letters, setLetters] = useLetterKeys();
  const server = useServer();

  const isReady = state.state === "ready" && state.widthPx !== null && state.heightPx !== null;
  const size = useMemo(
    () => ({ widthPx: state.widthPx ?? 0, heightPx: state.heightPx ?? 0 }),
    [state.widthPx, state.heightPx],
  );
  const mayMark = state.mayNotMark === null && isReady;
  const mayScale = state.mayNotCalibrate === null && isReady;
  const mayUse = (tool: BenchTool) => tool === "move" || (tool === "scale" ? mayScale : mayMark);

  const marks = useMarks({ imageId: picture.id, acts, server, refresh, say });
  const edits = usePointEdits({
    imageId: picture.id,
    size,
    acts,
    server,
    refresh,
    onMoved: marks.moved,
  });
  const drawing = useDrawing({
    firstTool: first.scale || first.mayNotCalibrate ? "move" : "scale",
    size,
    isOpen: (tool) => mayUse(tool) && !server.isBusy,
    onDone: async (shape, words) => {
      const placed = await marks.place(shape, words);
      if (placed) setChosenId(placed);
      return placed !== null;
    },
    say,
  });
  const { tool } = drawing;

  function takeUp(next: BenchTool): void {
    drawing.takeUp(next);
    edits.giveUp();
    server.tell(null);
    if (next === "move") return;
    setChosenId(null);
    // The arrows that move the cross and Enter that sets a point belong to the picture.
    host.current?.focus();
  }

  const zoom = useDeepZoom(
    host,
    isReady ? routes.api.imageInfo(picture.id) : null,
    MARGINS,
    (at, isSecond, pressed) => {
      const place = toPicture(at, pressed);
      if (edits.editing) edits.movePoint(place);
      else drawing.press(place, isSecond, pressed.scale);
    },
  );
  const { view } = zoom;

  async function setTheScale(scale: CalibrateImage): Promise<void> {
    const answer = await server.ask(() => acts.setScale(scale));
    if (!answer.ok) {
      if (answer.error.conflict) server.tell(answer.error.message);
      return;
    }
    takeUp("move");
    say(`Scale ${answer.value.label} set`);
    await refresh();
  }

  /** Gives up points that are being moved first, since they are the last thing that was done. */
  function undo(): void {
    if (edits.editing) edits.giveUp();
    else void marks.history.undo();
  }

  function act(key: BenchKey): boolean {
    switch (key.does) {
      case "undo":
        undo();
        return true;
      case "redo":
        void marks.history.redo();
        return true;
      case "takeUp":
        if (mayUse(key.tool)) takeUp(key.tool);
        return mayUse(key.tool);
      case "zoomIn":
        zoom.zoomBy(ZOOM_STEP);
        return true;
      case "zoomOut":
        zoom.zoomBy(1 / ZOOM_STEP);
        return true;
      case "whole":
        zoom.whole();
        return true;
      case "hide":
        setHidden(!isHidden);
        return true;
      case "keyList":
        setKeyList(true);
        return true;
      case "leave":
        takeUp("move");
        return true;
      case "takeBack":
        drawing.takeBackPoint();
        return drawing.points.length > 0;
      case "step":
        if (edits.editing) edits.stepPoint(key.by);
        else if (tool === "move") zoom.panBy(key.by[0] * PAN_PX, key.by[1] * PAN_PX);
        else zoom.show(drawing.stepCross(key.by));
        return true;
      case "set":
        if (edits.editing) void edits.save();
        else drawing.pressCross(view?.scale ?? 1);
        return true;
    }
  }
  useBenchKeys({ letters, isOff: edits.clash !== null || isKeyList, act });

  const umPerPx = state.scale?.content.umPerPx ?? null;
  const drawn = tool === "move" || tool === "scale" ? null : tool;
  return (
    <main className="fixed inset-0 overflow-hidden bg-ib-surround text-ib-ink [--focus:var(--ib-focus)]">
      <h1 className="sr-only">
        Image bench, {picture.label} {picture.title}
      </h1>
      <BenchHeader
        picture={picture}
        isCalibrated={state.scale !== null}
        isStale={isStale}
        canUndo={edits.editing !== null || marks.history.canUndo}
        canRedo={marks.history.canRedo}
        onUndo={undo}
        onRedo={() => void marks.history.redo()}
        onKeys={() => setKeyList(true)}
      />
      <div
        ref={host}
        role="application"
        aria-label={`${picture.label} ${picture.title}. Tools by letter; arrows move the cross, Enter sets a point.`}
        tabIndex={0}
        className="absolute inset-0 outline-offset-[-3px]"
        style={{ cursor: tool === "move" && !edits.editing ? "grab" : "crosshair" }}
      />
      {view && (
        <MarkLayer
          view={view}
          marks={isHidden ? [] : state.marks}
          chosenId={chosenId}
          editing={edits.editing}
          drawn={drawing}
          cross={drawing.cross}
          canChoose={tool === "move" && !edits.editing}
          onChoose={setChosenId}
          onChoosePoint={edits.choosePoint}
          onMovePoint={edits.movePoint}
        />
      )}
      {(!isReady || zoom.hasFailed) && <PictureNotice state={state} hasFailed={zoom.hasFailed} />}
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
        {drawn && (
          <DrawPanel
            tool={drawn}
            words={drawing.words}
            options={drawing.options}
            pointCount={drawing.points.length}
            canFinish={
              drawing.shape !== null && drawing.points.length >= leastPoints(drawn, drawing.options)
            }
            error={server.error}
            isBusy={server.isBusy}
            onWords={drawing.setWords}
            onOptions={drawing.setOptions}
            onBack={drawing.takeBackPoint}
            onFinish={() => void drawing.finish()}
          />
        )}
        {tool === "scale" && (
          <ScaleForm
            imageId={picture.id}
            seenVersion={state.scale?.number ?? null}
            points={drawing.points}
            fileUmPerPx={picture.fileUmPerPx}
            markCount={state.marks.length}
            error={server.error}
            isBusy={server.isBusy}
            onSet={(scale) => void setTheScale(scale)}
          />
        )}
        {tool === "move" && !edits.editing && server.error && (
          <p
            role="alert"
            className="rounded-4 border border-ib-final bg-ib-panel px-3.5 py-2 text-12 text-ib-final"
          >
            {server.error}
          </p>
        )}
        <PointPanel edits={edits} error={server.error} isBusy={server.isBusy} />
        <MarksPanel
          marks={state.marks}
          deleted={state.deleted}
          chosenId={chosenId}
          isHidden={isHidden}
          isEditing={edits.editing !== null}
          refusal={state.mayNotMark}
          onChoose={(id) => {
            takeUp("move");
            setChosenId(id);
          }}
          onHide={() => setHidden(!isHidden)}
          onEdit={edits.start}
          onDelete={(mark) => void marks.remove(mark).then((isGone) => isGone && setChosenId(null))}
          onRestore={(mark) => void marks.restore(mark)}
        />
        <ScalePanel scale={state.scale} mayScale={mayScale} onScale={() => takeUp("scale")} />
      </div>
      {view && umPerPx !== null && (
        <div className="absolute bottom-27 left-22 z-10">
          <ScaleBarMark umPerScreenPx={umPerPx / view.scale} />
        </div>
      )}
      <BenchFooter picture={picture} film={film} zoom={zoom} />
      <p role="status" className="sr-only">
        {said}
      </p>
      <MarkTable marks={state.marks} />
      {isKeyList && (
        <KeyList letters={letters} onLetters={setLetters} onClose={() => setKeyList(false)} />
      )}
      {edits.clash && (
        <MarkConflict
          clash={edits.clash}
          size={size}
          imageId={picture.id}
          onKeepMine={() => void edits.keepMine()}
          onLater={edits.chooseLater}
          onTakeTheirs={() => void edits.takeTheirs()}
        />
      )}
    </main>
  );
}
