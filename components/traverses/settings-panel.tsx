"use client";

import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import type { FieldErrors } from "@/lib/errors";
import { proposedDepthKind } from "@/lib/hardness/depth-limits";
import {
  isMaterialGroup,
  MATERIAL_GROUP_NAMES,
  MATERIAL_GROUPS,
} from "@/lib/hardness/material-groups";
import { SPACING_CLASSES } from "@/lib/hardness/spacing";
import {
  DEPTH_KINDS,
  HARDENING_PROCESS_NAMES,
  HARDENING_PROCESSES,
  HARDNESS_METHODS,
} from "@/lib/traverses/constants";
import type { TraverseProposal } from "@/lib/traverses/propose-from-return";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { NumberSetting } from "./number-setting";

const EDGES = {
  surface: "Surface, cut square",
  taper_section: "Surface, taper section",
  none: "No edge",
} as const;
const METHOD_NAMES = { vickers: "Vickers", knoop: "Knoop" } as const;
const SPACINGS = ["steel_copper", "light_metals"] as const;
const EDGE_KEYS = ["surface", "taper_section", "none"] as const;

type Props = {
  content: TraverseContent;
  proposal: TraverseProposal;
  items: readonly { id: string; label: string }[];
  errors: FieldErrors;
  onChange: (change: Partial<TraverseContent>) => void;
  onClose: () => void;
};

const pick = <T extends string>(known: readonly T[], value: string, otherwise: T): T =>
  known.find((name) => name === value) ?? otherwise;

/** How the traverse was run and what is asked of it. */
export function SettingsPanel({ content, proposal, items, errors, onChange, onClose }: Props) {
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
    <Panel className="no-print mx-4 mb-3" id="traverse-settings">
      <PanelHead
        title="Settings"
        note={
          content.isRequirementFromReturn
            ? "Requirement as in the field return"
            : "Requirement typed here"
        }
        actions={
          <>
            {content.isRequirementFromReturn || !proposal.isRequirementFromReturn ? null : (
              <Button small onClick={() => onChange(proposal)}>
                Take it from the field return
              </Button>
            )}
            <Button small look="quiet" onClick={onClose}>
              Close
            </Button>
          </>
        }
      />
      <PanelBody className="grid gap-x-4 gap-y-3 sm:grid-cols-3 xl:grid-cols-4">
        <TextField
          name="traverse-name"
          label="Where it was run"
          maxLength={60}
          value={content.name}
          error={errors["content.name"]}
          onChange={(event) => onChange({ name: event.target.value })}
        />
        <SelectField
          name="traverse-item"
          label="On which piece"
          optional
          placeholder="Not stated"
          value={content.itemId ?? ""}
          error={errors["content.itemId"]}
          options={items.map(({ id, label }) => ({ value: id, label }))}
          onChange={(event) => onChange({ itemId: event.target.value || null })}
        />
        <SelectField
          name="traverse-method"
          label="Method"
          value={content.method}
          options={HARDNESS_METHODS.map((value) => ({ value, label: METHOD_NAMES[value] }))}
          onChange={(event) =>
            onChange({
              method: pick(HARDNESS_METHODS, event.target.value, "vickers"),
              tableId: null,
            })
          }
        />
        <SelectField
          name="traverse-group"
          label="Material group"
          value={content.materialGroup}
          options={MATERIAL_GROUP_NAMES.map((value) => ({
            value,
            label: MATERIAL_GROUPS[value].name,
          }))}
          onChange={({ target: { value } }) =>
            isMaterialGroup(value) ? onChange({ materialGroup: value, tableId: null }) : undefined
          }
        />
        <SelectField
          name="traverse-edge"
          label="Depth counted from"
          value={content.edgeReference}
          options={EDGE_KEYS.map((value) => ({ value, label: EDGES[value] }))}
          onChange={(event) =>
            onChange({ edgeReference: pick(EDGE_KEYS, event.target.value, "surface") })
          }
        />
        {content.edgeReference === "taper_section" ? (
          <NumberSetting
            name="traverse-angle"
            label="Angle of the section"
            unit="°"
            value={content.sectionAngleDeg}
            onValue={(sectionAngleDeg) => onChange({ sectionAngleDeg })}
            error={errors["content.sectionAngleDeg"]}
          />
        ) : null}
        <SelectField
          name="traverse-spacing"
          label="Distance between indents"
          value={content.spacingClass}
          options={SPACINGS.map((value) => ({ value, label: SPACING_CLASSES[value].name }))}
          onChange={(event) =>
            onChange({ spacingClass: pick(SPACINGS, event.target.value, "steel_copper") })
          }
        />
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
          onChange={(event) =>
            onChange({ depthKind: pick(DEPTH_KINDS, event.target.value, "none") })
          }
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
          hint="80 % of it is the SHD limit (ISO 18203)"
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
        <NumberSetting
          name="traverse-diagonal-u"
          label="Uncertainty of a mean diagonal"
          unit="µm"
          hint="Standard uncertainty, k = 1"
          value={content.diagonalUncertaintyUm}
          onValue={(value) =>
            value === null ? undefined : onChange({ diagonalUncertaintyUm: value })
          }
          error={errors["content.diagonalUncertaintyUm"]}
        />
        <NumberSetting
          name="traverse-position-u"
          label="Uncertainty of a depth"
          unit="mm"
          hint="Standard uncertainty, k = 1"
          value={content.positionUncertaintyMm}
          onValue={(value) =>
            value === null ? undefined : onChange({ positionUncertaintyMm: value })
          }
          error={errors["content.positionUncertaintyMm"]}
        />
        <RangeOfIndents
          key={`surface-${content.surfaceReadingIds.join()}`}
          name="traverse-surface-mean"
          label="Surface, mean of indents"
          content={content}
          ids={content.surfaceReadingIds}
          onIds={(surfaceReadingIds) => onChange({ surfaceReadingIds })}
        />
        <RangeOfIndents
          key={`core-${content.coreReadingIds.join()}`}
          name="traverse-core-mean"
          label="Core, mean of indents"
          content={content}
          ids={content.coreReadingIds}
          onIds={(coreReadingIds) => onChange({ coreReadingIds })}
        />
      </PanelBody>
    </Panel>
  );
}

/** Indents by number: "2 to 5", "2, 3, 5"; empty for the usual choice. */
function RangeOfIndents({
  name,
  label,
  content,
  ids,
  onIds,
}: {
  name: string;
  label: string;
  content: TraverseContent;
  ids: readonly string[];
  onIds: (ids: string[]) => void;
}) {
  const numbers = content.readings.flatMap(({ id }, index) =>
    ids.includes(id) ? [index + 1] : [],
  );
  return (
    <TextField
      name={name}
      label={label}
      optional
      hint="Such as 2 to 5, or 2, 3, 5"
      defaultValue={numbers.join(", ")}
      onBlur={(event) => {
        const wanted = event.target.value.split(/[,;]/).flatMap((part) => {
          const ends = part.split(/to|-|–/).map((end) => Number(end.trim()));
          const [from = NaN, to = from] = ends;
          return part.trim() === ""
            ? []
            : content.readings.filter((_, i) => i + 1 >= from && i + 1 <= to);
        });
        const next = [...new Set(wanted.map(({ id }) => id))];
        if (next.join() !== ids.join()) onIds(next);
      }}
    />
  );
}
