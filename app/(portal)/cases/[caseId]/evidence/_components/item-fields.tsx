import { TextAreaField, TextField } from "@/components/ui/labelled-fields";
import type { FieldErrors } from "@/lib/errors";
import { CONDITION_WORDS, HAZARDS } from "@/lib/evidence/constants";
import type { ItemContent } from "@/lib/evidence/schemas";
import { oneNumber } from "@/lib/intake/one-number";
import { WordChoices } from "./word-choices";

type Props = {
  /** Null for an item that is new. */
  content: ItemContent | null;
  errors: FieldErrors;
  massProblem: string | null;
  nameClassName?: string;
};

/** What an item is and how it looked. */
export function ItemFields({ content, errors, massProblem, nameClassName }: Props) {
  const error = (name: string) => errors[`content.${name}`];
  return (
    <>
      <TextField
        name="name"
        label="What it is"
        required
        fieldClassName={nameClassName}
        defaultValue={content?.name}
        error={error("name")}
      />
      <TextAreaField
        name="description"
        label="Description"
        optional
        fieldClassName="sm:col-span-2"
        defaultValue={content?.description}
        error={error("description")}
      />
      <WordChoices
        name="condition"
        label="Condition"
        words={CONDITION_WORDS}
        chosen={content?.condition}
      />
      <WordChoices name="hazards" label="Hazards" words={HAZARDS} chosen={content?.hazards} />
      <TextField
        name="massG"
        label="Mass"
        unit="g"
        optional
        inputMode="decimal"
        defaultValue={content?.massG ?? undefined}
        error={massProblem ?? error("massG")}
      />
      <TextField
        name="seal"
        label="Seal fitted"
        optional
        defaultValue={content?.seal}
        error={error("seal")}
      />
    </>
  );
}

/** The fields as they were typed, or what is wrong with the mass. */
export function readItemFields(
  data: FormData,
): { content: ItemContent; massProblem: null } | { content: null; massProblem: string } {
  const text = (name: string) => String(data.get(name) ?? "");
  const typedMass = text("massG").trim();
  const mass = typedMass === "" ? null : oneNumber(typedMass, "g");
  if (mass && !mass.ok) return { content: null, massProblem: mass.says };
  return {
    massProblem: null,
    content: {
      name: text("name"),
      description: text("description"),
      condition: CONDITION_WORDS.filter((word) => data.getAll("condition").includes(word)),
      hazards: HAZARDS.filter((word) => data.getAll("hazards").includes(word)),
      massG: mass?.value ?? null,
      seal: text("seal"),
    },
  };
}
