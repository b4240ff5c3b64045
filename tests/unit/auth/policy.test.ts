import { describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { ACTIONS, type Action, type CaseSubject, decide, POLICY, roleMay } from "@/lib/auth/policy";
import { CASE_STATES, type CaseState } from "@/lib/cases/constants";
import { type Role, ROLES } from "@/lib/people/constants";

const LAB = "org_lab";
const CLIENT = "org_client";

function actor(
  role: Role,
  id = `per_${role}`,
  organisationId = role === "requester" ? CLIENT : LAB,
): Actor {
  return {
    id,
    name: role,
    email: `${role}@example.test`,
    role,
    organisationId,
    organisationName: "",
    organisationKind: organisationId === LAB ? "laboratory" : "client",
  };
}

const base: CaseSubject = {
  state: "examining",
  wasSent: true,
  organisationId: CLIENT,
  requesterId: "per_requester",
  investigatorId: "per_investigator",
  leadId: "per_lead",
  secondReaderId: null,
  technicianIds: ["per_technician"],
  isRestricted: false,
  authorIds: [],
  hasReleasedIssue: false,
};
const in_ = (state: CaseState, change: Partial<CaseSubject> = {}): CaseSubject => ({
  ...base,
  state,
  wasSent: state !== "draft",
  ...change,
});

const WORK = [
  "accepted",
  "awaiting_evidence",
  "examining_nd",
  "plan_review",
  "examining",
  "analysing",
  "reopened",
  "in_review",
] as const;
const SENT = CASE_STATES.filter((state) => state !== "draft");
const OPEN = SENT.filter((state) => !["declined", "cancelled", "closed"].includes(state));
const BENCH: Role[] = ["technician", "investigator", "lead"];

/** Who may do what on a case of their own relation, and in which states; typed out, not derived. */
const TABLE: Partial<
  Record<Action, { roles: Role[]; states: readonly CaseState[]; subject?: Partial<CaseSubject> }>
> = {
  "case.view": { roles: [...ROLES], states: SENT },
  "case.viewFieldReturn": { roles: ["requester", ...BENCH], states: SENT },
  "case.viewWork": { roles: BENCH, states: SENT },
  "case.viewHistory": { roles: [...BENCH, "administrator"], states: SENT },
  "case.accept": { roles: ["lead"], states: ["submitted"] },
  "case.askBack": { roles: ["investigator", "lead"], states: ["submitted", "accepted"] },
  "case.answer": { roles: ["requester"], states: ["info_needed"] },
  "case.decline": { roles: ["lead"], states: ["submitted"] },
  "case.cancel": { roles: ["requester", "lead"], states: ["submitted", "info_needed"] },
  "case.assign": { roles: ["lead"], states: ["submitted", "info_needed", ...WORK] },
  "case.startExamining": { roles: BENCH, states: ["accepted", "awaiting_evidence"] },
  "case.startWeighing": {
    roles: ["investigator", "lead"],
    states: ["examining_nd", "plan_review", "examining"],
  },
  "case.hold": { roles: BENCH, states: OPEN },
  "case.clearHold": { roles: ["lead"], states: OPEN },
  "case.addRequestFile": {
    roles: ["requester", ...BENCH],
    states: ["submitted", "info_needed", ...WORK],
  },
  "evidence.register": { roles: BENCH, states: WORK },
  "evidence.handOver": { roles: BENCH, states: OPEN },
  "image.add": { roles: BENCH, states: WORK },
  "image.describe": { roles: BENCH, states: WORK },
  "image.calibrate": { roles: BENCH, states: WORK },
  "image.mark": { roles: BENCH, states: WORK },
  "traverse.record": { roles: BENCH, states: WORK },
  "strength.state": { roles: ["investigator", "lead"], states: WORK },
  "mechanism.weigh": { roles: ["investigator", "lead"], states: WORK },
  "findings.write": { roles: ["investigator", "lead"], states: WORK },
  "findings.sendToSecondReader": {
    roles: ["investigator", "lead"],
    states: ["analysing", "reopened"],
  },
  "findings.recordReading": {
    roles: ["lead"],
    states: ["in_review"],
    subject: { secondReaderId: "per_lead" },
  },
  "findings.leaveNote": {
    roles: ["lead"],
    states: ["in_review"],
    subject: { secondReaderId: "per_lead" },
  },
  "findings.answerNote": { roles: ["investigator", "lead"], states: WORK },
  "findings.returnNote": {
    roles: ["lead"],
    states: ["in_review"],
    subject: { secondReaderId: "per_lead" },
  },
  "findings.sendForSignOff": { roles: ["investigator", "lead"], states: ["in_review"] },
  "findings.sendBack": { roles: ["investigator", "lead"], states: ["in_review", "in_approval"] },
  "report.sign": { roles: ["lead"], states: ["in_approval"] },
  "report.release": { roles: ["lead"], states: ["signed"] },
  "report.openNewIssue": { roles: ["lead"], states: ["released", "following_up", "closed"] },
  "report.preview": { roles: BENCH, states: SENT },
  "report.read": {
    roles: ["requester", ...BENCH],
    states: SENT,
    subject: { hasReleasedIssue: true },
  },
};

/** Actions of no case: roles only. */
const HOUSE: Partial<Record<Action, Role[]>> = {
  "case.list": [...ROLES],
  "case.create": ["requester", ...BENCH],
  "view.save": [...ROLES],
  "hardness.convert": [...ROLES],
  "person.view": ["administrator"],
  "person.invite": ["administrator"],
  "person.change": ["administrator"],
  "audit.verify": ["lead", "administrator"],
  "reference.view": [...ROLES],
  "reference.switch": ["administrator"],
  "self.view": [...ROLES],
};
const DRAFT_ONLY: Action[] = ["case.editDraft", "case.submit"];

describe("the policy table", () => {
  it("is typed out here in full: an action added there needs its row here", () => {
    const rows = [...Object.keys(TABLE), ...Object.keys(HOUSE), ...DRAFT_ONLY].sort();
    expect(rows).toEqual([...ACTIONS].sort());
  });

  const cells = (Object.entries(TABLE) as [Action, NonNullable<(typeof TABLE)[Action]>][]).flatMap(
    ([action, row]) => ROLES.flatMap((role) => SENT.map((state) => ({ action, role, state, row }))),
  );
  it.each(cells)("$action by $role in $state", ({ action, role, state, row }) => {
    const expected = row.roles.includes(role) && row.states.includes(state);
    const decision = decide(actor(role), action, in_(state, row.subject));
    expect(decision.allowed).toBe(expected);
    if (!decision.allowed) expect(decision.says).toMatch(/^[A-Z].*\.$/);
  });

  it.each(
    (Object.entries(HOUSE) as [Action, Role[]][]).flatMap(([action, roles]) =>
      ROLES.map((role) => ({ action, role, roles })),
    ),
  )("$action by $role", ({ action, role, roles }) => {
    expect(decide(actor(role), action).allowed).toBe(roles.includes(role));
    expect(roleMay(actor(role), action)).toBe(roles.includes(role));
  });

  it.each(DRAFT_ONLY)("%s is for the person who started it, while it is a draft", (action) => {
    const own = in_("draft");
    expect(decide(actor("requester"), action, own).allowed).toBe(true);
    expect(decide(actor("requester", "per_colleague"), action, own).allowed).toBe(false);
    expect(decide(actor("lead"), action, own).allowed).toBe(false);
    expect(decide(actor("requester"), action, in_("submitted")).allowed).toBe(false);
  });

  it("another client sees and does nothing", () => {
    const stranger = actor("requester", "per_stranger", "org_other");
    for (const action of Object.keys(TABLE) as Action[]) {
      for (const state of SENT) {
        expect(decide(stranger, action, in_(state, { hasReleasedIssue: true })).allowed).toBe(
          false,
        );
      }
    }
  });

  it("a draft is seen by nobody but the one who started it", () => {
    for (const role of ROLES.filter((role) => role !== "requester")) {
      expect(decide(actor(role), "case.view", in_("draft")).allowed).toBe(false);
    }
    expect(decide(actor("requester"), "case.view", in_("draft")).allowed).toBe(true);
  });
  it("a draft that was cancelled before it was sent stays with the one who started it", () => {
    const neverSent = in_("cancelled", { wasSent: false });
    for (const role of ["technician", "investigator", "lead", "administrator"] as const) {
      expect(decide(actor(role), "case.view", neverSent).allowed).toBe(false);
    }
    expect(decide(actor("requester", "per_colleague"), "case.view", neverSent).allowed).toBe(false);
    expect(decide(actor("requester"), "case.view", neverSent).allowed).toBe(true);
  });

  it("a technician or investigator who is not assigned does no work on a case", () => {
    for (const role of ["technician", "investigator"] as const) {
      const outsider = actor(role, "per_outsider");
      expect(decide(outsider, "image.mark", base).allowed).toBe(false);
      expect(decide(outsider, "traverse.record", base).allowed).toBe(false);
    }
    expect(decide(actor("technician", "per_outsider"), "case.view", base).allowed).toBe(false);
    expect(decide(actor("investigator", "per_outsider"), "case.view", base).allowed).toBe(true);
  });

  it("a restricted case is open to those named on it and to lead engineers", () => {
    const restricted = in_("examining", { isRestricted: true });
    expect(decide(actor("investigator", "per_outsider"), "case.view", restricted).allowed).toBe(
      false,
    );
    expect(decide(actor("investigator"), "case.view", restricted).allowed).toBe(true);
    expect(decide(actor("lead", "per_other_lead"), "case.view", restricted).allowed).toBe(true);
    expect(decide(actor("administrator"), "case.view", restricted).allowed).toBe(false);
  });

  it("a lead signs no report they wrote, investigated or read as second reader", () => {
    const lead = actor("lead");
    const waiting = in_("in_approval");
    expect(decide(lead, "report.sign", waiting).allowed).toBe(true);
    expect(decide(lead, "report.sign", { ...waiting, authorIds: ["per_lead"] }).allowed).toBe(
      false,
    );
    expect(decide(lead, "report.sign", { ...waiting, investigatorId: "per_lead" }).allowed).toBe(
      false,
    );
    expect(decide(lead, "report.sign", { ...waiting, secondReaderId: "per_lead" }).allowed).toBe(
      false,
    );
  });

  it("a second reader who wrote part of it does not read it as second reader", () => {
    const reader = actor("investigator", "per_reader");
    const review = in_("in_review", { secondReaderId: "per_reader" });
    expect(decide(reader, "findings.recordReading", review).allowed).toBe(true);
    expect(
      decide(reader, "findings.recordReading", { ...review, authorIds: ["per_reader"] }).allowed,
    ).toBe(false);
    expect(decide(actor("investigator"), "findings.recordReading", review).allowed).toBe(false);
  });

  it("a second reader leaves notes and neither writes in the text they read nor answers them", () => {
    const reader = actor("investigator", "per_reader");
    const review = in_("in_review", { secondReaderId: "per_reader" });
    expect(decide(reader, "findings.leaveNote", review).allowed).toBe(true);
    for (const action of ["findings.write", "findings.answerNote"] as const) {
      expect(decide(reader, action, review)).toMatchObject({ because: "condition" });
      expect(decide(reader, action, { ...review, state: "analysing" }).allowed).toBe(true);
    }
    const author = actor("investigator");
    expect(decide(author, "findings.leaveNote", review).allowed).toBe(false);
    expect(decide(author, "findings.returnNote", review).allowed).toBe(false);
    expect(decide(author, "findings.answerNote", review).allowed).toBe(true);
  });

  it("nobody without a released issue reads a report", () => {
    expect(decide(actor("requester"), "report.read", in_("signed")).allowed).toBe(false);
    expect(
      decide(actor("requester"), "report.read", in_("released", { hasReleasedIssue: true }))
        .allowed,
    ).toBe(true);
  });

  it("an action of a case asked without a case is no", () => {
    for (const [action, rule] of Object.entries(POLICY)) {
      if ("states" in rule) expect(decide(actor("lead"), action as Action).allowed).toBe(false);
    }
  });
});
