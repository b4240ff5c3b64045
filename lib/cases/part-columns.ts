import "server-only";
import { type Answers, valueAs } from "@/lib/intake/answers";
import type { FieldKey } from "@/lib/intake/fields";

const COLUMN_FIELDS = {
  title: ["headline", 200],
  partName: ["partName", 200],
  drawingNumber: ["drawingNumber", 100],
  serialNumber: ["serialNumber", 100],
  heatNumber: ["heatNumber", 100],
  material: ["grade", 100],
} as const satisfies Record<string, readonly [FieldKey, number]>;

export type PartColumns = Record<keyof typeof COLUMN_FIELDS, string>;

/** What list and search show of a field return; shortened in a draft, where anything is typed. */
export function partColumns(answers: Answers): PartColumns {
  const text = (name: keyof typeof COLUMN_FIELDS) => {
    const [key, most] = COLUMN_FIELDS[name];
    return valueAs("text", answers[key]).trim().slice(0, most);
  };
  return {
    title: text("title"),
    partName: text("partName"),
    drawingNumber: text("drawingNumber"),
    serialNumber: text("serialNumber"),
    heatNumber: text("heatNumber"),
    material: text("material"),
  };
}
