import "server-only";
import { z } from "zod";
import type { Chart } from "@/lib/charts/primitives";
import { findingsDocument } from "@/lib/findings/document-schema";
import { RECORD_KINDS } from "@/lib/records/constants";

const person = z.object({ name: z.string(), role: z.string(), at: z.string() });
const row = z.array(z.string());

const isChart = (value: unknown): value is Chart =>
  typeof value === "object" && value !== null && "primitives" in value && "widthPx" in value;

/** Everything a report renders from, as plain data. Once signed, this and the pictures are all it reads. */
export const frozenReport = z.object({
  caseNumber: z.string(),
  issueNumber: z.number(),
  title: z.string(),
  laboratory: z.object({ name: z.string(), addressLine: z.string() }),
  facts: z.array(z.object({ label: z.string(), text: z.string() })),
  rootCause: z.string(),
  document: findingsDocument,
  investigatedBy: person.nullable(),
  readBy: person.nullable(),
  signedBy: person.nullable(),
  /** Said where author, reader and signer are not three people. */
  sameHandsNote: z.string().nullable(),
  items: z.array(row),
  supplied: z.array(row),
  unknowns: z.array(z.string()),
  conversions: z.array(row),
  gates: z.array(row),
  issues: z.array(row),
  manifest: z.array(
    z.object({
      label: z.string(),
      kind: z.enum(RECORD_KINDS),
      version: z.number(),
      sha256: z.string(),
    }),
  ),
  charts: z.record(z.string(), z.custom<Chart>(isChart)),
  at: z.string(),
});
export type FrozenReport = z.infer<typeof frozenReport>;
