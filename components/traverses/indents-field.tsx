"use client";

import { TextField } from "@/components/ui/labelled-fields";
import type { TraverseContent } from "@/lib/traverses/schemas";

/** Indents by number: "2 to 5", "2, 3, 5"; empty for the usual choice. */
export function IndentsField({
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
