import type { Editor } from "@tiptap/react";
import { CITED_VALUE, SECTION_HEADING } from "@/lib/findings/document";
import type { CitableValue } from "./cite-panel";
import type { CitedLook, CitedNow } from "./findings-context";

export type UnsettledValue = {
  position: number;
  /** Words for what it is: "SHD of T2 at fillet". */
  label: string;
  tag: string;
  section: string;
  cited: string;
};
export type StaleValue = UnsettledValue & { versionId: string; now: CitedNow };

type Look = (recordId: string, versionId: string, field: string) => CitedLook;

/** Cited values of the text that need a decision, in reading order. */
export function unsettledValues(
  editor: Editor,
  lookOf: Look,
  citable: readonly CitableValue[],
): { stale: StaleValue[]; withdrawn: UnsettledValue[] } {
  const stale: StaleValue[] = [];
  const withdrawn: UnsettledValue[] = [];
  let section = "";
  editor.state.doc.descendants((node, position) => {
    if (node.type.name === SECTION_HEADING) section = String(node.attrs.title);
    if (node.type.name !== CITED_VALUE) return;
    const { recordId, versionId, field, text, tag, keptReason } = node.attrs;
    const look = lookOf(recordId, versionId, field);
    const label = citable.find((value) => value.recordId === recordId && value.field === field);
    const value = { position, section, tag, cited: text, label: label?.label ?? "" };
    if (look.state === "withdrawn") withdrawn.push(value);
    else if (look.state !== "current" && !keptReason && look.now)
      stale.push({ ...value, versionId, now: look.now });
  });
  return { stale, withdrawn };
}
