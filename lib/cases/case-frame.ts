import "server-only";
import { and, eq, ne, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { images, organisations, records, recordVersions, reportIssues } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type Action, decide } from "@/lib/auth/policy";
import { formatCount } from "@/lib/format/numbers";
import { mechanismContent } from "@/lib/mechanisms/schemas";
import { routes } from "@/lib/routes";
import { STAGE_OF_STATE, type CaseState } from "./constants";
import { type Gate, gateLedger } from "./gates";
import { getCase } from "./get-case";

export type PartState = "untouched" | "under-way" | "complete" | "needs-attention";
export type Strand = {
  key: string;
  label: string;
  href: string | null;
  state: PartState;
  count: number | null;
  note: string | null;
};
export type CaseFrame = {
  id: string;
  number: string | null;
  title: string;
  client: string;
  state: CaseState;
  isOnHold: boolean;
  dueOn: string | null;
  strands: Strand[];
  rootCause: string;
};

type Counts = {
  items: number;
  images: number;
  calibrated: number;
  traverses: number;
  mechanisms: number;
  standing: number;
};

async function counts(caseId: string): Promise<Counts> {
  const kinds = await database()
    .select({ kind: records.kind, n: sql<number>`count(*)`.mapWith(Number) })
    .from(records)
    .where(and(eq(records.caseId, caseId), ne(records.state, "void")))
    .groupBy(records.kind);
  const of = (kind: string) => kinds.find((row) => row.kind === kind)?.n ?? 0;
  const [ready] = await database()
    .select({ n: sql<number>`count(distinct ${images.recordId})`.mapWith(Number) })
    .from(images)
    .innerJoin(
      records,
      and(
        eq(records.scopeId, images.recordId),
        eq(records.kind, "calibration"),
        ne(records.state, "void"),
      ),
    )
    .where(eq(images.caseId, caseId));
  const mechanisms = await database()
    .select({ content: recordVersions.content })
    .from(records)
    .innerJoin(
      recordVersions,
      and(
        eq(recordVersions.recordId, records.id),
        eq(recordVersions.number, records.latestVersion),
      ),
    )
    .where(
      and(eq(records.caseId, caseId), eq(records.kind, "mechanism"), ne(records.state, "void")),
    );
  return {
    items: of("item"),
    images: of("image"),
    calibrated: ready?.n ?? 0,
    traverses: of("traverse"),
    mechanisms: mechanisms.length,
    standing: mechanisms.filter((m) => mechanismContent.parse(m.content).verdict === "stands")
      .length,
  };
}

const tone = (isEmpty: boolean, gate: Gate | undefined): PartState =>
  isEmpty ? "untouched" : gate === undefined || gate.isMet ? "complete" : "needs-attention";

function strands(
  actorMay: (action: Action) => boolean,
  caseId: string,
  state: CaseState,
  n: Counts,
  gates: Gate[],
): Strand[] {
  const gate = (number: number) => gates.find((g) => g.number === number);
  const work = actorMay("case.viewWork");
  const to = (href: string) => (work ? href : null);
  const openGates = gates.filter((g) => !g.isMet).length;
  const isSigned = STAGE_OF_STATE[state] >= 6;
  const findingsOpen = gate(7)?.detail === "No findings are written yet";
  return [
    {
      key: "field-return",
      label: "Field return",
      href: actorMay("case.viewFieldReturn") ? routes.fieldReturn(caseId) : null,
      state: state === "draft" || state === "info_needed" ? "under-way" : "complete",
      count: null,
      note:
        state === "draft"
          ? "Being filled in"
          : state === "info_needed"
            ? "Waiting for answers"
            : "Complete",
    },
    {
      key: "evidence",
      label: "Evidence",
      href: to(routes.evidence(caseId)),
      state: tone(n.items === 0, gate(1)),
      count: n.items,
      note:
        n.items === 0
          ? "Nothing registered"
          : gate(1)?.isMet
            ? "Custody unbroken"
            : (gate(1)?.detail ?? null),
    },
    {
      key: "images",
      label: "Images",
      href: to(routes.images(caseId)),
      state:
        n.images === 0
          ? "untouched"
          : gate(2)?.isMet === false
            ? "needs-attention"
            : n.calibrated < n.images
              ? "under-way"
              : "complete",
      count: n.images,
      note: n.images === 0 ? null : `${n.calibrated} calibrated`,
    },
    {
      key: "hardness",
      label: "Hardness",
      href: to(routes.hardness(caseId)),
      state:
        n.traverses === 0
          ? "untouched"
          : gate(5)?.isMet && gate(3)?.isMet
            ? "complete"
            : "needs-attention",
      count: n.traverses,
      note: n.traverses === 0 ? null : gate(5)?.isMet ? "All settled" : (gate(5)?.detail ?? null),
    },
    {
      key: "strength",
      label: "Strength",
      href: to(routes.strength(caseId)),
      state: gate(4)?.isMet ? "complete" : "untouched",
      count: null,
      note: gate(4)?.isMet ? "Reconciled" : "Not stated",
    },
    {
      key: "weighing",
      label: "Weighing",
      href: to(routes.weighing(caseId)),
      state: n.mechanisms === 0 ? "untouched" : gate(6)?.isMet ? "complete" : "under-way",
      count: n.mechanisms,
      note: n.mechanisms === 0 ? null : `${n.standing} of ${n.mechanisms} stands`,
    },
    {
      key: "findings",
      label: "Findings",
      href: to(routes.findings(caseId)),
      state: findingsOpen
        ? "untouched"
        : gate(7)?.isMet
          ? gate(8)?.isMet
            ? "complete"
            : "under-way"
          : "needs-attention",
      count: null,
      note: findingsOpen
        ? null
        : gate(7)?.isMet
          ? gate(8)?.isMet
            ? "Read twice"
            : "Being written"
          : `${gate(7)?.detail}`,
    },
    {
      key: "sign-off",
      label: "Sign-off",
      href: to(routes.signOff(caseId)),
      state: isSigned ? "complete" : openGates === 0 ? "under-way" : "untouched",
      count: null,
      note: isSigned
        ? "Signed"
        : state === "in_approval"
          ? "Waiting for signature"
          : `${formatCount(openGates, "gate")} open`,
    },
  ];
}

/** Bar and spine of a case for this person. */
export async function caseFrame(actor: Actor, caseId: string): Promise<CaseFrame> {
  const { row, subject } = await getCase(actor, "case.view", caseId);
  const may = (action: Action) => decide(actor, action, subject).allowed;
  const [client] = await database()
    .select({ name: organisations.name })
    .from(organisations)
    .where(eq(organisations.id, row.organisationId));
  const [n, gates] = await Promise.all([counts(caseId), gateLedger(database(), caseId)]);
  const [signed] = await database()
    .select({ rootCause: reportIssues.rootCause })
    .from(reportIssues)
    .where(and(eq(reportIssues.caseId, caseId), sql`${reportIssues.releasedAt} is not null`))
    .limit(1);
  return {
    id: row.id,
    number: row.number,
    title: row.title || row.partName || "New field return",
    client: client?.name ?? "",
    state: row.state,
    isOnHold: row.isOnHold,
    dueOn: row.dueOn,
    strands: strands(may, caseId, row.state, n, gates),
    rootCause: signed?.rootCause ? "Stated in the report" : "Not stated until sign-off",
  };
}
