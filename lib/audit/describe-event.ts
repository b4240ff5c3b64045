import "server-only";
import type { Action } from "@/lib/auth/policy";
import type { SystemAction } from "./record";

/** Past-tense words for what was done; `label` is what it was done to, `isNew` unless it was there. */
type Wording = (label: string, isNew: boolean) => string;
const WORDS: Record<Action | SystemAction, Wording> = {
  "case.list": (l) => `listed ${l}`,
  "case.create": () => "started the field return",
  "case.editDraft": () => "filled in the field return",
  "case.submit": () => "sent the field return to the laboratory",
  "case.view": (l) => `looked at ${l}`,
  "case.viewFieldReturn": (l) => `read ${l}`,
  "case.viewWork": (l) => `looked at ${l}`,
  "case.viewHistory": (l) => `read the history of ${l}`,
  "case.accept": () => "accepted the case",
  "case.askBack": () => "asked the requester a question",
  "case.answer": () => "answered for the requester",
  "case.decline": () => "declined the case",
  "case.cancel": () => "cancelled the request",
  "case.assign": () => "changed people or due date",
  "case.startExamining": () => "started the examination",
  "case.startWeighing": () => "started weighing",
  "case.hold": () => "put the case on hold",
  "case.clearHold": () => "took the case off hold",
  "case.addRequestFile": (l) => `added ${l}`,
  "view.save": (l) => `kept the view ${l}`,
  "evidence.register": (l, isNew) => `${isNew ? "registered" : "described"} ${l}`,
  "evidence.handOver": (l) => `wrote the custody of ${l}`,
  "image.add": (l) => `added ${l}`,
  "image.describe": (l) => `described ${l}`,
  "image.calibrate": (l) => `set the scale of ${l}`,
  "image.mark": (l) => `marked ${l}`,
  "hardness.convert": (l) => `converted ${l}`,
  "traverse.record": (l) => `recorded ${l}`,
  "strength.state": () => "stated the strength",
  "mechanism.weigh": (l) => `weighed ${l}`,
  "findings.write": () => "wrote in Findings",
  "findings.sendToSecondReader": () => "sent the findings to the second reader",
  "findings.recordReading": () => "recorded the second reading",
  "findings.leaveNote": (l) => `left ${l}`,
  "findings.answerNote": (l) => `answered ${l}`,
  "findings.returnNote": (l) => `came back to ${l}`,
  "findings.sendForSignOff": () => "sent the findings for sign-off",
  "findings.sendBack": () => "sent the findings back with a note",
  "report.sign": () => "signed the findings report",
  "report.release": () => "released the report",
  "report.openNewIssue": () => "opened a new issue of the report",
  "report.preview": () => "printed a draft",
  "report.read": (l) => `read ${l}`,
  "person.view": (l) => `looked at ${l}`,
  "person.invite": (l) => `invited ${l}`,
  "person.change": (l) => `changed ${l}`,
  "audit.verify": () => "verified the audit log",
  "reference.view": (l) => `read ${l}`,
  "reference.switch": (l) => `switched ${l}`,
  "self.view": (l) => `looked at ${l}`,
  "system.seed": (l) => `wrote ${l} for the demonstration`,
  "system.takeInImage": (l) => `took in ${l}`,
  "system.storeReport": (l) => `stored ${l}`,
  "system.signIn": () => "signed in",
  "system.signOut": () => "signed out",
  "system.setUp": (l) => `set up ${l}`,
  "system.password": () => "set a password",
};

type Event = { action: string; subjectLabel: string; before: unknown };

export function describeEvent(event: Event): string {
  const words = Object.hasOwn(WORDS, event.action)
    ? WORDS[event.action as Action | SystemAction]
    : undefined;
  return words
    ? words(event.subjectLabel, event.before === null)
    : `${event.action} ${event.subjectLabel}`;
}
