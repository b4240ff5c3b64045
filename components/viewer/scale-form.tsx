"use client";

import { useState } from "react";
import { formatQuantity } from "@/lib/format/numbers";
import type { CalibrateImage } from "@/lib/images/calibration-schemas";
import type { Point } from "@/lib/imaging/point";
import { oneNumber } from "@/lib/intake/one-number";
import { BenchInput, BenchSelect } from "./bench-fields";
import { BENCH_PANEL, benchButton } from "./bench-look";
import { TOOL_HELP } from "./tools";

type Props = {
  imageId: string;
  seenVersion: number | null;
  points: readonly Point[];
  fileUmPerPx: { x: number; y: number } | null;
  markCount: number;
  error: string | null;
  isBusy: boolean;
  onSet: (scale: CalibrateImage) => void;
};

/** Sets the scale from two points of known distance or from the file; marks are worked out anew. */
export function ScaleForm({
  imageId,
  seenVersion,
  points,
  fileUmPerPx,
  markCount,
  error,
  isBusy,
  onSet,
}: Props) {
  const [source, setSource] = useState<"two_points" | "file_resolution">("two_points");
  const [standard, setStandard] = useState("Scale bar");
  const [known, setKnown] = useState("");
  const [uncertainty, setUncertainty] = useState("");
  const [percent, setPercent] = useState("2");
  const [tilt, setTilt] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [first, second] = points;

  function set() {
    const read = (text: string, unit: string) => {
      const number = oneNumber(text, unit);
      if (!number.ok) setProblem(number.says);
      return number.ok ? number.value : null;
    };
    setProblem(null);
    const tiltDeg = tilt.trim() === "" ? null : read(tilt, "°");
    if (tilt.trim() !== "" && tiltDeg === null) return;
    if (source === "file_resolution") {
      const relativeUncertaintyPercent = read(percent, "%");
      if (relativeUncertaintyPercent !== null)
        onSet({ imageId, seenVersion, source, relativeUncertaintyPercent, tiltDeg });
      return;
    }
    const knownDistanceMm = read(known, "mm");
    const knownDistanceUncertaintyMm = read(uncertainty, "mm");
    if (knownDistanceMm === null || knownDistanceUncertaintyMm === null || !first || !second)
      return;
    onSet({
      imageId,
      seenVersion,
      source,
      standard,
      points: [
        [first[0], first[1]],
        [second[0], second[1]],
      ],
      knownDistanceMm,
      knownDistanceUncertaintyMm,
      tiltDeg,
    });
  }

  const canSet = source === "file_resolution" || points.length === 2;
  return (
    <section
      aria-label="Set the scale"
      className={`${BENCH_PANEL} grid gap-2.5 px-3.5 py-3 text-12`}
    >
      <h2 className="text-13 font-head">Set the scale</h2>
      {fileUmPerPx && (
        <BenchSelect
          id="scale-source"
          label="From"
          value={source}
          options={[
            { value: "two_points", label: "Two points of known distance" },
            { value: "file_resolution", label: "The file's own resolution" },
          ]}
          onChange={(value) => setSource(value === "file_resolution" ? value : "two_points")}
        />
      )}
      {source === "two_points" ? (
        <>
          <p>
            {TOOL_HELP.scale} {points.length} of 2 points set.
          </p>
          <BenchInput
            id="scale-standard"
            label="Known distance is on"
            value={standard}
            onChange={setStandard}
          />
          <BenchInput
            id="scale-known"
            label="Known distance"
            unit="mm"
            numeric
            value={known}
            onChange={setKnown}
          />
          <BenchInput
            id="scale-u"
            label="Its uncertainty, k = 2"
            unit="mm"
            numeric
            value={uncertainty}
            onChange={setUncertainty}
          />
        </>
      ) : (
        <>
          <p>
            The file states {formatQuantity(fileUmPerPx?.x ?? 0, "µm", { figures: 4 })} per pixel.
            Nobody has checked it; you say how far it can be off.
          </p>
          <BenchInput
            id="scale-percent"
            label="Uncertainty, k = 2"
            unit="%"
            numeric
            value={percent}
            onChange={setPercent}
          />
        </>
      )}
      <BenchInput
        id="scale-tilt"
        label="Tilt of the face"
        unit="°"
        numeric
        hint="Optional. Against the plane of the picture. Lengths are not corrected for it."
        value={tilt}
        onChange={setTilt}
      />
      {seenVersion !== null && markCount > 0 && (
        <p className="text-ib-origin">
          Values of {markCount} marks are worked out anew. Texts that cite them show as stale.
        </p>
      )}
      {(problem ?? error) && (
        <p role="alert" className="text-ib-final">
          {problem ?? error}
        </p>
      )}
      <p>
        <button
          type="button"
          className={benchButton({ small: true, primary: true })}
          disabled={!canSet || isBusy}
          onClick={set}
        >
          Set the scale
        </button>
      </p>
    </section>
  );
}
