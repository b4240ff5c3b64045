import type { FieldDefinition, SectionDefinition } from "./field-types";
import { HANDLING_AND_HAZARDS } from "./sections/handling-and-hazards";
import { MATERIAL_AND_LIMITS } from "./sections/material-and-limits";
import { QUESTION_AND_DATE } from "./sections/question-and-date";
import { SERVICE_AND_SURROUNDINGS } from "./sections/service-and-surroundings";
import { THE_PART } from "./sections/the-part";
import { WHAT_HAPPENED } from "./sections/what-happened";
import { WHAT_WAS_SENT } from "./sections/what-was-sent";
import { WHO_SENT_IT } from "./sections/who-sent-it";

const ALL = [
  WHO_SENT_IT,
  THE_PART,
  WHAT_HAPPENED,
  MATERIAL_AND_LIMITS,
  SERVICE_AND_SURROUNDINGS,
  WHAT_WAS_SENT,
  HANDLING_AND_HAZARDS,
  QUESTION_AND_DATE,
] as const;

export type FieldKey = (typeof ALL)[number]["groups"][number]["fields"][number]["key"];
export type SectionKey = (typeof ALL)[number]["key"];
export type Field = FieldDefinition & { key: FieldKey };
export type Section = Omit<SectionDefinition, "groups"> & {
  key: SectionKey;
  groups: readonly { title: string | null; fields: readonly Field[] }[];
};

/** Everything a field return asks, in the order of the form. The list is closed. */
export const SECTIONS: readonly Section[] = ALL;

export const FIELDS: readonly Field[] = SECTIONS.flatMap(fieldsOf);

export function fieldsOf(section: Section): readonly Field[] {
  return section.groups.flatMap((group) => group.fields);
}

const BY_KEY = new Map<string, Field>(FIELDS.map((field) => [field.key, field]));

export function isFieldKey(key: string): key is FieldKey {
  return BY_KEY.has(key);
}

export function fieldByKey(key: FieldKey): Field {
  const field = BY_KEY.get(key);
  if (!field) throw new Error(`the field return has no field ${key}`);
  return field;
}
