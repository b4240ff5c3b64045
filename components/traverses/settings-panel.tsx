"use client";

import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/labelled-fields";
import type { FieldErrors } from "@/lib/errors";
import {
  isMaterialGroup,
  MATERIAL_GROUP_NAMES,
  MATERIAL_GROUPS,
} from "@/lib/hardness/material-groups";
import { SPACING_CLASSES } from "@/lib/hardness/spacing";
import { HARDNESS_METHODS } from "@/lib/traverses/constants";
import type { TraverseProposal } from "@/lib/traverses/propose-from-return";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { IndentsField } from "./indents-field";
import { NumberSetting } from "./number-setting";
import { pick } from "./pick";
import { RequirementFields } from "./requirement-fields";

const EDGES = {
  surface: "Surface, cut square",
  taper_section: "Surface, taper section",
  none: "No edge",
} as const;
const METHOD_NAMES = { vickers: "Vickers", knoop: "Knoop" } as const;
const SPACINGS = ["steel_copper", "light_metals"] as const;
const TRACKS = ["each", "means"] as const;
const TRACK_NAMES = { each: "A depth for each row", means: "One depth of their means" } as const;
const EDGE_KEYS = ["surface", "taper_section", "none"] as const;

type Props = {
  content: TraverseContent;
  proposal: TraverseProposal;
  items: readonly { id: string; label: string }[];
  errors: FieldErrors;
  onChange: (change: Partial<TraverseContent>) => void;
  onClose: () => void;
};

/** How the traverse was run and what is asked of it. */
export function SettingsPanel({ content, proposal, items, errors, onChange, onClose }: Props) {
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
        <RequirementFields content={content} errors={errors} onChange={onChange} />
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
        {content.readings.some(({ track }) => (track ?? "") !== "") ? (
          <SelectField
            name="traverse-tracks"
            label="Several rows"
            hint="The smaller depth is stated, unless means were asked for"
            value={content.tracks}
            options={TRACKS.map((value) => ({ value, label: TRACK_NAMES[value] }))}
            onChange={(event) => onChange({ tracks: pick(TRACKS, event.target.value, "each") })}
          />
        ) : null}
        <IndentsField
          key={`surface-${content.surfaceReadingIds.join()}`}
          name="traverse-surface-mean"
          label="Surface, mean of indents"
          content={content}
          ids={content.surfaceReadingIds}
          onIds={(surfaceReadingIds) => onChange({ surfaceReadingIds })}
        />
        <IndentsField
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
