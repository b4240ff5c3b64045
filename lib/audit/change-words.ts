import { CASE_STATE_NAMES, HOLD_NAMES, PRIORITY_NAMES } from "@/lib/cases/constants";
import { CUSTODY_ACT_NAMES, ITEM_KIND_NAMES } from "@/lib/evidence/constants";
import { formatDate, formatDateTime } from "@/lib/format/dates";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import { MATERIAL_GROUPS } from "@/lib/hardness/material-groups";
import { CALIBRATION_SOURCE_NAMES, TECHNIQUE_NAMES } from "@/lib/images/constants";
import { FEATURES } from "@/lib/images/feature-codes";
import { MARK_TOOL_NAMES } from "@/lib/images/mark-names";
import { MECHANISM_CODES, MECHANISM_VERDICT_NAMES } from "@/lib/mechanisms/constants";
import { ROLE_NAMES } from "@/lib/people/constants";
import { STRENGTH_VERDICT_NAMES } from "@/lib/strength/constants";
import { HARDENING_PROCESS_NAMES } from "@/lib/traverses/constants";

type Words = { label: string; show?: (value: string) => string };

const named = (...names: readonly Readonly<Record<string, string>>[]) => {
  const all: Readonly<Record<string, string>> = Object.assign({}, ...names);
  return (value: string) => (Object.hasOwn(all, value) ? (all[value] ?? value) : value);
};
const inUnit = (unit: string) => (value: string) => `${value}${NO_BREAK_SPACE}${unit}`;
const digest = (value: string) => value.slice(0, 12);

/** Words for the fields of an entry that their names alone would not say well. */
const FIELD_WORDS: Readonly<Record<string, Words>> = {
  act: { label: "Act", show: named(CUSTODY_ACT_NAMES) },
  acceptedAt: { label: "Accepted", show: formatDateTime },
  calibrationSource: { label: "Scale from", show: named(CALIBRATION_SOURCE_NAMES) },
  code: { label: "Mechanism", show: named(MECHANISM_CODES) },
  coreHv: { label: "Core hardness", show: inUnit("HV") },
  coreReadingIds: { label: "Core readings" },
  depthKindReason: { label: "Reason for the depth" },
  diagonalUncertaintyUm: { label: "Uncertainty of a diagonal", show: inUnit("µm") },
  documentSha256: { label: "Digest of the text read", show: digest },
  dueOn: { label: "Due", show: formatDate },
  edgeReference: { label: "Depth from", show: named({ surface: "the surface" }) },
  endReason: { label: "Reason" },
  featureCode: {
    label: "Feature",
    show: (code) => (Object.hasOwn(FEATURES, code) ? `${code} ${nameOfFeature(code)}` : code),
  },
  investigatorId: { label: "Investigator" },
  isRequirementFromReturn: { label: "Requirement from the field return" },
  issueId: { label: "Report" },
  itemId: { label: "Item" },
  kind: { label: "Kind", show: named(ITEM_KIND_NAMES, HOLD_NAMES) },
  leadId: { label: "Lead engineer" },
  loadKgf: { label: "Load", show: inUnit("kgf") },
  manifestSha256: { label: "Digest of the manifest", show: digest },
  massG: { label: "Mass", show: inUnit("g") },
  materialGroup: {
    label: "Material",
    show: named(Object.fromEntries(Object.entries(MATERIAL_GROUPS).map(([k, v]) => [k, v.name]))),
  },
  minSurfaceHv: { label: "Least surface hardness", show: inUnit("HV") },
  originId: { label: "Origin" },
  pdfSha256: { label: "Digest of the report", show: digest },
  positionUncertaintyMm: { label: "Uncertainty of a position", show: inUnit("mm") },
  priority: { label: "Priority", show: named(PRIORITY_NAMES) },
  process: { label: "Hardening", show: named(HARDENING_PROCESS_NAMES) },
  readerId: { label: "Second reader" },
  recomputed: { label: "Marks worked out again" },
  relativeUncertainty: { label: "Relative uncertainty" },
  requiredCore: { label: "Required core hardness" },
  requiredDepthMm: { label: "Required depth" },
  requiredSurface: { label: "Required surface hardness" },
  role: { label: "Role", show: named(ROLE_NAMES) },
  secondReaderId: { label: "Second reader" },
  sectionAngleDeg: { label: "Section angle", show: inUnit("°") },
  sentBy: { label: "Sent by" },
  sha256: { label: "Digest", show: digest },
  signedAt: { label: "Signed", show: formatDateTime },
  sizeBytes: { label: "Size", show: inUnit("bytes") },
  spacingClass: {
    label: "Spacing for",
    show: named({ steel_copper: "steel and copper alloys", light_metals: "light metals" }),
  },
  state: { label: "State", show: named(CASE_STATE_NAMES, { void: "deleted" }) },
  submittedAt: { label: "Sent", show: formatDateTime },
  surfaceReadingIds: { label: "Surface readings" },
  tableId: { label: "Conversion table" },
  technique: { label: "Taken with", show: named(TECHNIQUE_NAMES) },
  technicianId: { label: "Technician" },
  tool: { label: "Drawn with", show: named(MARK_TOOL_NAMES) },
  umPerPx: { label: "Scale", show: inUnit("µm a pixel") },
  verdict: {
    label: "Verdict",
    show: named(STRENGTH_VERDICT_NAMES, MECHANISM_VERDICT_NAMES, {
      sent_back: "Sent back",
      read: "Read",
    }),
  },
};

function nameOfFeature(code: string): string {
  return Object.entries(FEATURES).find(([known]) => known === code)?.[1].name ?? "";
}

/** "spacingClass" → "Spacing class", for a field that has no words of its own. */
function spelledOut(name: string): string {
  const words = name.replace(/([a-z])([A-Z0-9])/g, "$1 $2").toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

const wordsOf = (field: string): Words | undefined =>
  Object.hasOwn(FIELD_WORDS, field) ? FIELD_WORDS[field] : undefined;

export const fieldLabel = (field: string) => wordsOf(field)?.label ?? spelledOut(field);

export const fieldText = (field: string, value: string) => wordsOf(field)?.show?.(value) ?? value;
