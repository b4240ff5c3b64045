import { Checkbox } from "@/components/ui/checkbox";

/** Several words of a closed list, each a check box. */
export function WordChoices({
  name,
  label,
  words,
  chosen = [],
}: {
  name: string;
  label: string;
  words: readonly string[];
  /** Those that are ticked as the form opens. */
  chosen?: readonly string[];
}) {
  return (
    <fieldset className="sm:col-span-2">
      <legend className="mb-1 text-13 font-strong">{label}</legend>
      <div className="flex flex-wrap gap-x-4 gap-y-1.5">
        {words.map((word) => (
          <Checkbox
            key={word}
            name={name}
            value={word}
            label={word}
            defaultChecked={chosen.includes(word)}
          />
        ))}
      </div>
    </fieldset>
  );
}
