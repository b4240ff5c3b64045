import type { ReactNode } from "react";
import { describedBy, Field, hasError, type FieldTexts } from "@/components/ui/field";
import { Select, type SelectProps } from "@/components/ui/select";
import { TextArea, type TextAreaProps } from "@/components/ui/text-area";
import { TextInput, type TextInputProps } from "@/components/ui/text-input";

interface Labelled extends FieldTexts {
  name: string;
  aside?: ReactNode;
  fieldClassName?: string;
}

/** The id falls back to the name, which is what an error list links to. */
function split<P extends Labelled & { id?: string }>(props: P) {
  const { label, hint, error, optional, aside, fieldClassName, ...control } = props;
  const id = props.id ?? props.name;
  return {
    field: { id, label, hint, error, optional, aside, className: fieldClassName },
    control: {
      ...control,
      id,
      failed: hasError(error),
      "aria-describedby": describedBy(id, { hint, error }),
    },
  };
}

export function TextField(props: Labelled & TextInputProps) {
  const { field, control } = split(props);
  return (
    <Field {...field}>
      <TextInput {...control} />
    </Field>
  );
}

/** A field for one number. Text, not type=number: it keeps what was typed, comma or point, and the
 *  number of places. */
export function NumberField(props: Labelled & TextInputProps) {
  return <TextField inputMode="decimal" autoComplete="off" {...props} className="tn" />;
}

export function TextAreaField(props: Labelled & TextAreaProps) {
  const { field, control } = split(props);
  return (
    <Field {...field}>
      <TextArea {...control} />
    </Field>
  );
}

export function SelectField(props: Labelled & SelectProps) {
  const { field, control } = split(props);
  return (
    <Field {...field}>
      <Select {...control} />
    </Field>
  );
}
