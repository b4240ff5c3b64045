"use client";

import { CONFIDENCES, type Confidence } from "@/lib/images/constants";
import { codesForTool, type FeatureCode, FEATURES, featureOf } from "@/lib/images/feature-codes";
import { BenchCheck, BenchInput, BenchSelect, BenchTextArea } from "./bench-fields";
import { BENCH_PANEL, benchButton } from "./bench-look";
import type { DrawingOptions } from "./drawing";
import { type DrawingTool, TOOL_HELP, TOOL_WORDS } from "./tools";

export type MarkWords = {
  featureCode: FeatureCode | null;
  name: string;
  confidence: Confidence;
  note: string;
};

type Props = {
  tool: Exclude<DrawingTool, "scale">;
  words: MarkWords;
  options: DrawingOptions;
  pointCount: number;
  canFinish: boolean;
  error: string | null;
  isBusy: boolean;
  onWords: (words: MarkWords) => void;
  onOptions: (options: DrawingOptions) => void;
  onBack: () => void;
  onFinish: () => void;
};

/** What the mark in hand is: feature, caution, how sure, and its options. */
export function DrawPanel({
  tool,
  words,
  options,
  pointCount,
  canFinish,
  error,
  isBusy,
  onWords,
  onOptions,
  onBack,
  onFinish,
}: Props) {
  const codes = codesForTool(tool);
  const feature = featureOf(words.featureCode);
  return (
    <section
      aria-label={`Drawing: ${TOOL_WORDS[tool]}`}
      className={`${BENCH_PANEL} grid gap-2.5 px-3.5 py-3 text-12`}
    >
      <h2 className="text-13 font-head">{TOOL_WORDS[tool]}</h2>
      <p>
        {TOOL_HELP[tool]}{" "}
        <span className="text-ib-ink-2">
          By keys: arrows move the cross, Enter sets a point, Backspace takes the last away.
        </span>
      </p>
      {codes.length > 0 && (
        <BenchSelect
          id="bench-feature"
          label="Feature"
          value={words.featureCode ?? ""}
          options={[
            { value: "", label: "Measurement only" },
            ...codes.map((code) => ({ value: code, label: `${code} ${FEATURES[code].name}` })),
          ]}
          onChange={(value) =>
            onWords({ ...words, featureCode: codes.find((code) => code === value) ?? null })
          }
        />
      )}
      {feature && (
        <p className="text-ib-ink-2">
          Indicates {feature.indicates}.
          {feature.doNotConclude && (
            <b className="block font-strong text-ib-origin">
              Do not conclude {feature.doNotConclude}.
            </b>
          )}
          {feature.couldAlsoBe && (
            <span className="block">Could also be: {feature.couldAlsoBe.join(", ")}.</span>
          )}
        </p>
      )}
      {tool === "origin" && (
        <>
          <BenchCheck
            id="bench-landmark"
            label="Clock angle from a landmark: press it second"
            checked={options.hasLandmark}
            onChange={(hasLandmark) => onOptions({ ...options, hasLandmark })}
          />
          {options.hasLandmark && (
            <BenchInput
              id="bench-landmark-name"
              label="Landmark"
              value={options.landmarkName}
              onChange={(landmarkName) => onOptions({ ...options, landmarkName })}
            />
          )}
        </>
      )}
      {tool === "area" && (
        <BenchCheck
          id="bench-outline"
          label="This is the outline of the section"
          checked={options.isOutline}
          onChange={(isOutline) => onOptions({ ...options, isOutline })}
        />
      )}
      {tool === "length" && (
        <BenchCheck
          id="bench-along"
          label="Along several points"
          checked={options.isAlongLine}
          onChange={(isAlongLine) => onOptions({ ...options, isAlongLine })}
        />
      )}
      <BenchInput
        id="bench-name"
        label="Name"
        value={words.name}
        onChange={(name) => onWords({ ...words, name })}
      />
      <BenchSelect
        id="bench-confidence"
        label="How sure"
        value={words.confidence}
        options={CONFIDENCES.map((value) => ({ value, label: value }))}
        onChange={(value) =>
          onWords({
            ...words,
            confidence: CONFIDENCES.find((known) => known === value) ?? "likely",
          })
        }
      />
      <BenchTextArea
        id="bench-note"
        label="Note"
        value={words.note}
        onChange={(note) => onWords({ ...words, note })}
      />
      {error && (
        <p role="alert" className="text-ib-final">
          {error} What you drew is kept.
        </p>
      )}
      <div className="flex gap-2">
        <button
          type="button"
          className={benchButton({ small: true })}
          disabled={pointCount === 0}
          onClick={onBack}
        >
          Take back a point
        </button>
        <button
          type="button"
          className={benchButton({ small: true, primary: true })}
          disabled={!canFinish || isBusy}
          onClick={onFinish}
        >
          {isBusy ? "Saving" : "Finish"}
        </button>
      </div>
    </section>
  );
}
