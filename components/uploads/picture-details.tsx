"use client";

import { Checkbox } from "@/components/ui/checkbox";
import { SelectField } from "@/components/ui/labelled-fields";
import { TECHNIQUE_NAMES, TECHNIQUES } from "@/lib/images/constants";
import type { UploadDetails } from "@/lib/uploads/schemas";

export type ItemChoice = { id: string; label: string };

/** What is said of the pictures added next; each can be changed later. */
export function PictureDetails({
  details,
  items,
  onChange,
}: {
  details: UploadDetails;
  items: readonly ItemChoice[];
  onChange: (details: UploadDetails) => void;
}) {
  return (
    <div className="grid gap-3 sm:grid-cols-2">
      <SelectField
        name="technique"
        id="add-technique"
        label="Taken with"
        value={details.technique ?? "camera"}
        onChange={(event) =>
          onChange({
            ...details,
            technique: TECHNIQUES.find((known) => known === event.target.value) ?? "other",
          })
        }
        options={TECHNIQUES.map((known) => ({ value: known, label: TECHNIQUE_NAMES[known] }))}
      />
      <SelectField
        name="itemId"
        id="add-item"
        label="Shows"
        value={details.itemId ?? ""}
        onChange={(event) => onChange({ ...details, itemId: event.target.value || null })}
        options={[
          { value: "", label: "No item, or several" },
          ...items.map((item) => ({ value: item.id, label: item.label })),
        ]}
      />
      <div className="sm:col-span-2">
        <Checkbox
          label="The requester may see it before the report"
          checked={details.isShareable ?? false}
          onChange={(event) => onChange({ ...details, isShareable: event.target.checked })}
        />
      </div>
    </div>
  );
}
