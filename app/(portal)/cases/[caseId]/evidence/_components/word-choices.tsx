import { Checkbox } from "@/components/ui/checkbox";

/** Several words of a closed list, each a check box. */
export function WordChoices({
  name,
  label,
  words,
}: {
  name: string;
  label: string;
  words: readonly string[];
}) {
  return (
    <fieldset className="sm:col-span-2">
      <legend className="mb-1 text-13 font-strong">{label}</legend>
      <div className="flex flex-wrap gap-x-4 gap-y-1.5">
        {words.map((word) => (
          <Checkbox key={word} name={name} value={word} label={word} />
        ))}
      </div>
    </fieldset>
  );
}
