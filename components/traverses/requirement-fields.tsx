"use client";

import { SelectField, TextField } from "@/components/ui/labelled-fields";
import type { FieldErrors } from "@/lib/errors";
import { proposedDepthKind, SHD_FRACTION } from "@/lib/hardness/depth-limits";
import {
  DEPTH_KINDS,
  HARDENING_PROCESS_NAMES,
  HARDENING_PROCESSES,
} from "@/lib/traverses/constants";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { NumberSetting } from "./number-setting";
import { pick } from "./pick";
import { RequiredHardness } from "./required-hardness";

const SHD_PERCENT = Math.round(SHD_FRACTION * 100);

type Props = {
  content: TraverseContent;
  errors: FieldErrors;
  onChange: (change: Partial<TraverseContent>) => void;
};

/** What is asked of the traverse: process, depth and hardness, as the drawing or the order has them. */
export function RequirementFields({ content, errors, onChange }: Props) {
  const proposed = proposedDepthKind(content.process);
  const differs =
    content.depthKind !== "none" && proposed !== "none" && proposed !== content.depthKind;
  const own = (change: Partial<TraverseContent>) =>
    onChange({ ...change, isRequirementFromReturn: false });
  const depth = content.requiredDepthMm ?? { min: null, max: null };
  const setDepth = (change: Partial<typeof depth>) => {
    const next = { ...depth, ...change };
    own({ requiredDepthMm: next.min === null && next.max === null ? null : next });
  };
  return (
    <>
      <SelectField
        name="traverse-process"
        label="Process"
        value={content.process}
        options={HARDENING_PROCESSES.map((value) => ({
          value,
          label: HARDENING_PROCESS_NAMES[value],
        }))}
        onChange={(event) => {
          const process = pick(HARDENING_PROCESSES, event.target.value, "none");
          own({ process, depthKind: proposedDepthKind(process), depthKindReason: "" });
        }}
      />
      <SelectField
        name="traverse-depth-kind"
        label="Depth"
        hint={proposed === "none" ? undefined : `The process asks for ${proposed}.`}
        value={content.depthKind}
        options={DEPTH_KINDS.map((value) => ({
          value,
          label: value === "none" ? "No depth" : value,
        }))}
        onChange={(event) => onChange({ depthKind: pick(DEPTH_KINDS, event.target.value, "none") })}
      />
      {differs ? (
        <TextField
          name="traverse-depth-reason"
          label={`Why ${content.depthKind}`}
          maxLength={500}
          value={content.depthKindReason}
          onChange={(event) => onChange({ depthKindReason: event.target.value })}
        />
      ) : null}
      <NumberSetting
        name="traverse-min-surface"
        label="Least surface hardness"
        unit="HV"
        hint={`${SHD_PERCENT} % of it is the SHD limit (ISO 18203)`}
        value={content.minSurfaceHv}
        onValue={(minSurfaceHv) => own({ minSurfaceHv })}
        error={errors["content.minSurfaceHv"]}
      />
      <NumberSetting
        name="traverse-agreed"
        label="Agreed limit"
        unit={content.method === "vickers" ? "HV" : "HK"}
        hint="Only where one was agreed"
        value={content.agreedLimit}
        onValue={(agreedLimit) => own({ agreedLimit })}
        error={errors["content.agreedLimit"]}
      />
      <NumberSetting
        name="traverse-core"
        label="Core hardness, measured apart"
        unit="HV"
        value={content.coreHv}
        onValue={(coreHv) => onChange({ coreHv })}
        error={errors["content.coreHv"]}
      />
      <NumberSetting
        name="traverse-depth-min"
        label="Required depth, least"
        unit="mm"
        value={depth.min}
        onValue={(min) => setDepth({ min })}
        error={errors["content.requiredDepthMm"] ?? errors["content.requiredDepthMm.min"]}
      />
      <NumberSetting
        name="traverse-depth-max"
        label="Required depth, most"
        unit="mm"
        value={depth.max}
        onValue={(max) => setDepth({ max })}
        error={errors["content.requiredDepthMm.max"]}
      />
      <RequiredHardness
        name="traverse-required-surface"
        label="Required surface hardness"
        value={content.requiredSurface}
        error={errors["content.requiredSurface"]}
        onValue={(requiredSurface) => own({ requiredSurface })}
      />
      <RequiredHardness
        name="traverse-required-core"
        label="Required core hardness"
        value={content.requiredCore}
        error={errors["content.requiredCore"]}
        onValue={(requiredCore) => own({ requiredCore })}
      />
    </>
  );
}
