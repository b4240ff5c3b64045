import type { Actor } from "@/lib/auth/actor";
import { createDraft } from "@/lib/cases/create-draft";
import { submitCase } from "@/lib/cases/submit-case";
import type { Answer, Answers, AnyValue } from "@/lib/intake/answers";
import { FIELDS } from "@/lib/intake/fields";
import { asRequester } from "./people";

export const value = (given: AnyValue): Answer => ({ kind: "value", value: given });
export const unknown = (why: string): Answer => ({ kind: "unknown", why });

/** A field return that can be sent: a few values, and for the rest why there is none. */
export function sendableAnswers(change: Answers = {}): Answers {
  const asked = FIELDS.filter(({ need }) => need !== "optional");
  return {
    ...Object.fromEntries(asked.map(({ key }) => [key, unknown("Not recorded by the owner")])),
    headline: value("Hoist shaft, broken at the journal fillet"),
    partName: value("Hoist shaft"),
    drawingNumber: value("HB-2210"),
    serialNumber: value("0417"),
    ...change,
  };
}

/** A draft of the requester of ./people, complete unless said otherwise. */
export async function aDraft(answers = sendableAnswers(), by?: Actor) {
  return createDraft(by ?? (await asRequester()), { answers });
}

/** A field return that reached the laboratory by the portal's own verbs. */
export async function aSentCase(answers = sendableAnswers(), by?: Actor) {
  const requester = by ?? (await asRequester());
  return submitCase(requester, await aDraft(answers, requester));
}
