import { ENDED_STATES, LOCKED_STATES, MOVES, WORK_STATES } from "@/lib/cases/lifecycle";
import { CASE_STATES, type CaseState } from "@/lib/cases/constants";
import type { Role } from "@/lib/people/constants";
import type { Actor } from "./actor";

/**
 * How a person stands to a case.
 * own: they asked for it; organisation: their organisation did; assigned: they are its
 * investigator, lead, second reader or one of its technicians; any: no relation needed.
 */
export type Relation = "own" | "organisation" | "assigned" | "any";

/** What the policy needs to know of a case. Null fields are not assigned yet. */
export type CaseSubject = {
  state: CaseState;
  /** The laboratory got it. What was cancelled before stays with the one who started it. */
  wasSent: boolean;
  organisationId: string;
  requesterId: string;
  investigatorId: string | null;
  leadId: string | null;
  secondReaderId: string | null;
  technicianIds: readonly string[];
  isRestricted: boolean;
  /** People who saved any state of the open issue's document. */
  authorIds: readonly string[];
  hasReleasedIssue: boolean;
};

type Rule = {
  roles: Partial<Record<Role, Relation>>;
  /** States in which it can be done; absent where the action belongs to no case. */
  states?: readonly CaseState[];
  /** A further condition, answered with the sentence of the refusal, or null when met. */
  unless?: (actor: Actor, subject: CaseSubject) => string | null;
  /** "…" in "Only the lead engineer can …". */
  says: string;
};

const EVERYONE = {
  requester: "any",
  technician: "any",
  investigator: "any",
  lead: "any",
  administrator: "any",
} as const satisfies Rule["roles"];

/** Laboratory people at their work on a case. */
const BENCH = { technician: "assigned", investigator: "assigned", lead: "any" } as const;
const WRITERS = { investigator: "assigned", lead: "any" } as const;

const SENT: readonly CaseState[] = CASE_STATES.filter((s) => s !== "draft");
const OPEN: readonly CaseState[] = SENT.filter((s) => !ENDED_STATES.includes(s));
const BEFORE_SIGNING: readonly CaseState[] = CASE_STATES.filter(
  (s) => s !== "draft" && !LOCKED_STATES.includes(s) && !ENDED_STATES.includes(s),
);

const notAuthor = (actor: Actor, subject: CaseSubject) =>
  subject.authorIds.includes(actor.id) || subject.investigatorId === actor.id
    ? "You wrote part of this report. Another lead engineer has to sign it."
    : subject.secondReaderId === actor.id
      ? "You are its second reader. Another lead engineer has to sign it."
      : null;

const isSecondReader = (actor: Actor, subject: CaseSubject) =>
  subject.secondReaderId !== actor.id
    ? "Only the second reader named for this case records the reading and leaves notes."
    : subject.authorIds.includes(actor.id)
      ? "You wrote part of this report. Someone else has to read it."
      : null;

const notWhileReading = (actor: Actor, subject: CaseSubject) =>
  subject.state === "in_review" && subject.secondReaderId === actor.id
    ? "You read this text as second reader, so you do not write in it. Leave notes beside it."
    : null;

/** Who may do what. Nothing else in the product decides this. */
export const POLICY = {
  // Cases
  "case.list": { roles: EVERYONE, says: "see the list of cases" },
  "case.create": {
    roles: { requester: "any", technician: "any", investigator: "any", lead: "any" },
    says: "start a field return",
  },
  "case.editDraft": {
    roles: { requester: "own", technician: "own", investigator: "own", lead: "own" },
    states: ["draft"],
    says: "fill in a field return that they started",
  },
  "case.submit": {
    roles: { requester: "own", technician: "own", investigator: "own", lead: "own" },
    states: MOVES.submit.from,
    says: "send a field return that they started",
  },
  "case.view": {
    roles: {
      requester: "organisation",
      technician: "assigned",
      investigator: "any",
      lead: "any",
      administrator: "any",
    },
    states: CASE_STATES,
    says: "see this case",
  },
  "case.viewFieldReturn": {
    roles: { requester: "organisation", technician: "assigned", investigator: "any", lead: "any" },
    states: CASE_STATES,
    says: "read the field return",
  },
  "case.viewWork": {
    roles: { technician: "assigned", investigator: "any", lead: "any" },
    states: SENT,
    says: "see measurements, drafts and reasoning",
  },
  "case.viewHistory": {
    roles: { technician: "assigned", investigator: "any", lead: "any", administrator: "any" },
    states: SENT,
    says: "read the history of a case",
  },
  "case.accept": { roles: { lead: "any" }, states: MOVES.accept.from, says: "accept a case" },
  "case.askBack": {
    roles: { investigator: "assigned", lead: "any" },
    states: MOVES.askBack.from,
    says: "ask the requester a question",
  },
  "case.answer": {
    roles: { requester: "organisation", lead: "own", investigator: "own", technician: "own" },
    states: MOVES.answer.from,
    says: "answer for the requester",
  },
  "case.decline": { roles: { lead: "any" }, states: MOVES.decline.from, says: "decline a case" },
  "case.cancel": {
    roles: { requester: "own", lead: "any", technician: "own", investigator: "own" },
    states: MOVES.cancel.from,
    says: "cancel a request before it is accepted",
  },
  "case.assign": {
    roles: { lead: "any" },
    states: BEFORE_SIGNING,
    says: "name the people of a case and its date",
  },
  "case.startExamining": {
    roles: BENCH,
    states: MOVES.startExamining.from,
    says: "start the examination",
  },
  "case.startWeighing": {
    roles: WRITERS,
    states: MOVES.startWeighing.from,
    says: "start weighing",
  },
  "case.hold": {
    roles: { technician: "assigned", investigator: "assigned", lead: "any" },
    states: OPEN,
    says: "put a case on hold",
  },
  "case.clearHold": { roles: { lead: "any" }, states: OPEN, says: "take a case off hold" },
  "case.addRequestFile": {
    roles: {
      requester: "organisation",
      technician: "assigned",
      investigator: "assigned",
      lead: "any",
    },
    states: CASE_STATES.filter((s) => !LOCKED_STATES.includes(s) && !ENDED_STATES.includes(s)),
    says: "add photographs and papers to a field return",
  },
  "view.save": { roles: EVERYONE, says: "keep views of their own" },

  // Evidence
  "evidence.register": { roles: BENCH, states: WORK_STATES, says: "register items" },
  "evidence.handOver": { roles: BENCH, states: OPEN, says: "write the chain of custody" },

  // Images
  "image.add": { roles: BENCH, states: WORK_STATES, says: "add pictures" },
  "image.describe": { roles: BENCH, states: WORK_STATES, says: "describe pictures" },
  "image.calibrate": { roles: BENCH, states: WORK_STATES, says: "set the scale of a picture" },
  "image.mark": { roles: BENCH, states: WORK_STATES, says: "mark pictures" },

  // Hardness
  "hardness.convert": { roles: EVERYONE, says: "convert hardness values" },
  "traverse.record": { roles: BENCH, states: WORK_STATES, says: "record hardness traverses" },

  // Reasoning
  "strength.state": { roles: WRITERS, states: WORK_STATES, says: "state the strength" },
  "mechanism.weigh": { roles: WRITERS, states: WORK_STATES, says: "weigh mechanisms" },

  // Findings and report
  "findings.write": {
    roles: WRITERS,
    states: WORK_STATES,
    unless: notWhileReading,
    says: "write the findings",
  },
  "findings.sendToSecondReader": {
    roles: WRITERS,
    states: MOVES.sendToSecondReader.from,
    says: "send the findings to the second reader",
  },
  "findings.recordReading": {
    roles: { investigator: "any", lead: "any" },
    states: ["in_review"],
    unless: isSecondReader,
    says: "record the second reading",
  },
  "findings.leaveNote": {
    roles: { investigator: "any", lead: "any" },
    states: ["in_review"],
    unless: isSecondReader,
    says: "leave a note as second reader",
  },
  "findings.answerNote": {
    roles: WRITERS,
    states: WORK_STATES,
    unless: notWhileReading,
    says: "answer the second reader's notes",
  },
  "findings.returnNote": {
    roles: { investigator: "any", lead: "any" },
    states: ["in_review"],
    unless: isSecondReader,
    says: "open or withdraw a note they left as second reader",
  },
  "findings.sendForSignOff": {
    roles: WRITERS,
    states: MOVES.sendForSignOff.from,
    says: "send the findings for sign-off",
  },
  "findings.sendBack": {
    roles: { investigator: "assigned", lead: "any" },
    states: MOVES.sendBack.from,
    says: "send the findings back with a note",
  },
  "report.sign": {
    roles: { lead: "any" },
    states: MOVES.sign.from,
    unless: notAuthor,
    says: "sign a findings report",
  },
  "report.release": {
    roles: { lead: "any" },
    states: MOVES.release.from,
    says: "release a signed report",
  },
  "report.openNewIssue": {
    roles: { lead: "any" },
    states: MOVES.reopen.from,
    says: "open a new issue of a report",
  },
  "report.preview": {
    roles: { technician: "assigned", investigator: "any", lead: "any" },
    states: SENT,
    says: "print a draft",
  },
  "report.read": {
    roles: { requester: "organisation", technician: "assigned", investigator: "any", lead: "any" },
    states: CASE_STATES,
    unless: (_actor, subject) =>
      subject.hasReleasedIssue ? null : "There is no released report for this case yet.",
    says: "read a released report",
  },

  // The house
  "person.view": { roles: { administrator: "any" }, says: "see the people" },
  "person.invite": { roles: { administrator: "any" }, says: "invite people" },
  "person.change": { roles: { administrator: "any" }, says: "change people" },
  "audit.verify": { roles: { administrator: "any", lead: "any" }, says: "verify the audit log" },
  "reference.view": { roles: EVERYONE, says: "read the reference tables" },
  "reference.switch": {
    roles: { administrator: "any" },
    says: "switch a conversion table on or off",
  },
  "self.view": { roles: EVERYONE, says: "see their own page" },
} as const satisfies Record<string, Rule>;

export type Action = keyof typeof POLICY;
export const ACTIONS = Object.keys(POLICY) as Action[];

/** What anyone may do without signing in, for routes and pages that need no person. */
export const OPEN_TO_ALL = "open" as const;

export type Refusal = "role" | "relation" | "state" | "condition";
export type Decision = { allowed: true } | { allowed: false; because: Refusal; says: string };

/** Restricted cases are open to those named on them, and to these. */
export function seesRestricted(actor: Actor): boolean {
  return actor.role === "lead";
}

export function isAssigned(actor: Actor, subject: CaseSubject): boolean {
  return (
    subject.investigatorId === actor.id ||
    subject.leadId === actor.id ||
    subject.secondReaderId === actor.id ||
    subject.technicianIds.includes(actor.id)
  );
}

function relates(actor: Actor, subject: CaseSubject, relation: Relation): boolean {
  switch (relation) {
    case "own":
      return subject.requesterId === actor.id;
    case "organisation":
      return (
        subject.requesterId === actor.id ||
        (subject.organisationId === actor.organisationId && subject.wasSent)
      );
    case "assigned":
      return subject.requesterId === actor.id || (isAssigned(actor, subject) && subject.wasSent);
    case "any":
      return (
        (subject.wasSent || subject.requesterId === actor.id) &&
        (!subject.isRestricted || isAssigned(actor, subject) || seesRestricted(actor))
      );
  }
}

/**
 * May this person do this, to this case? An unknown action or role is no.
 * Actions that belong to no case are asked without a subject.
 */
export function decide(actor: Actor, action: Action, subject?: CaseSubject): Decision {
  const rule: Rule | undefined = POLICY[action];
  if (!rule) return { allowed: false, because: "role", says: "Nobody can do this." };
  const relation = rule.roles[actor.role];
  if (!relation) {
    return { allowed: false, because: "role", says: `${whoMay(rule)} can ${rule.says}.` };
  }
  if (!rule.states) return { allowed: true };
  if (!subject || !relates(actor, subject, relation)) {
    return { allowed: false, because: "relation", says: `${whoMay(rule)} can ${rule.says}.` };
  }
  if (!rule.states.includes(subject.state)) {
    return { allowed: false, because: "state", says: stateSentence(subject.state) };
  }
  const condition = rule.unless?.(actor, subject) ?? null;
  return condition === null
    ? { allowed: true }
    : { allowed: false, because: "condition", says: condition };
}

/** Whether this person's role does this at all, to some case in some state. */
export function roleMay(actor: Actor, action: Action): boolean {
  const rule: Rule = POLICY[action];
  return rule.roles[actor.role] !== undefined;
}

const ROLE_IN_SENTENCE: Record<Role, string> = {
  requester: "the requester",
  technician: "a technician",
  investigator: "an investigator",
  lead: "the lead engineer",
  administrator: "an administrator",
};
const RELATION_IN_SENTENCE: Record<Relation, string> = {
  own: " who asked for it",
  organisation: " of the client",
  assigned: " of the case",
  any: "",
};

function whoMay(rule: Rule): string {
  const who = (Object.entries(rule.roles) as [Role, Relation][]).map(
    ([role, relation]) => ROLE_IN_SENTENCE[role] + RELATION_IN_SENTENCE[relation],
  );
  const list =
    who.length > 1 ? `${who.slice(0, -1).join(", ")} or ${who.at(-1)}` : (who[0] ?? "nobody");
  return `Only ${list}`;
}

function stateSentence(state: CaseState): string {
  if (state === "in_approval")
    return "The findings wait for signature, so nothing under them can change. Ask the lead engineer to send them back.";
  if (LOCKED_STATES.includes(state))
    return "The report is signed, so nothing under it can change. Open a new issue to go on.";
  if (ENDED_STATES.includes(state)) return "The case has ended.";
  if (state === "draft") return "The field return has not been sent yet.";
  if (state === "submitted" || state === "info_needed")
    return "The laboratory has not accepted the case yet.";
  return "This step does not fit where the case stands now.";
}
