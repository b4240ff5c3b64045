"use client";

import { SelectField } from "@/components/ui/labelled-fields";
import { SCALE_NAMES, SCALES } from "@/lib/hardness/scales";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { NumberSetting } from "./number-setting";
import { pick } from "./pick";

type Value = NonNullable<TraverseContent["requiredSurface"]>;

type Props = {
  name: string;
  label: string;
  value: Value | null;
  onValue: (value: Value | null) => void;
  error?: string;
};

const NOTHING_ASKED: Value = { scale: "HV", min: null, max: null };

/** A hardness that is asked for: scale, least and most. Without either number nothing is asked. */
export function RequiredHardness({ name, label, value, onValue, error }: Props) {
  const stated = value ?? NOTHING_ASKED;
  const set = (change: Partial<Value>) => {
    const next = { ...stated, ...change };
    onValue(next.min === null && next.max === null ? null : next);
  };
  const unit = SCALES[stated.scale].symbol;
  return (
    <fieldset className="grid grid-cols-3 gap-x-2 sm:col-span-2">
      <legend className="sr-only">{label}</legend>
      <NumberSetting
        name={`${name}-min`}
        label={`${label}, least`}
        unit={unit}
        value={stated.min}
        onValue={(min) => set({ min })}
        error={error}
      />
      <NumberSetting
        name={`${name}-max`}
        label="Most"
        unit={unit}
        value={stated.max}
        onValue={(max) => set({ max })}
      />
      <SelectField
        name={`${name}-scale`}
        label="Scale"
        value={stated.scale}
        disabled={value === null}
        hint={value === null ? "After the number" : undefined}
        options={SCALE_NAMES.map((scale) => ({ value: scale, label: SCALES[scale].symbol }))}
        onChange={(event) => set({ scale: pick(SCALE_NAMES, event.target.value, stated.scale) })}
      />
    </fieldset>
  );
}
