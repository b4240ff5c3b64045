import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { caseNumbers } from "@/db/schema";
import { acceptCase } from "@/lib/cases/accept-case";
import { askBack } from "@/lib/cases/ask-back";
import { createDraft } from "@/lib/cases/create-draft";
import { declineCase } from "@/lib/cases/decline-case";
import { holdCase } from "@/lib/cases/hold-case";
import { submitCase } from "@/lib/cases/submit-case";
import { handOver } from "@/lib/evidence/hand-over";
import { registerItem } from "@/lib/evidence/register-item";
import type { MechanismCode, MechanismVerdict } from "@/lib/mechanisms/constants";
import { weighMechanism } from "@/lib/mechanisms/weigh-mechanism";
import { storyDay, setStoryTime } from "./clock";
import type { Cast } from "./actors";
import type { Reached, StoryCase } from "./case-list";
import { fieldReturn } from "./field-return";
import type { PersonKey } from "./people";

const ORDER: Reached[] = [
  "submitted",
  "accepted",
  "examining",
  "weighing",
  "in_review",
  "released",
  "closed",
];

/** Whether a case of the story has come at least so far. */
export const hasReached = (story: StoryCase, stage: Reached): boolean =>
  ORDER.includes(story.reached) && ORDER.indexOf(story.reached) >= ORDER.indexOf(stage);

/** Second reader: an investigator who is not the case's own. */
export const secondReaderOf = (story: StoryCase): PersonKey =>
  story.investigator === "secondInvestigator" ? "investigator" : "secondInvestigator";

async function setLastNumber(last: number): Promise<void> {
  const year = new Date().getUTCFullYear();
  await database()
    .insert(caseNumbers)
    .values({ year, last })
    .onDuplicateKeyUpdate({ set: { last } });
  await database().update(caseNumbers).set({ last }).where(eq(caseNumbers.year, year));
}

/** Takes a case from field return to acceptance, as far as its story goes. */
export async function sendAndTriage(cast: Cast, story: StoryCase): Promise<string> {
  const requester = cast[story.requester];
  setStoryTime(story.sentDaysAgo, "08:10");
  await setLastNumber(story.number - 1);
  const answers = fieldReturn({
    contact: `${requester.name}, ${requester.email}`,
    partOwner: requester.organisationName,
    consentGiver: requester.name,
    neededBy: storyDay(Math.max(story.dueInDays + 5, 2)),
    ...story.answers,
  });
  const draft = await createDraft(requester, { answers });
  await submitCase(requester, { caseId: draft.caseId, revision: draft.revision });

  if (story.reached === "declined") {
    await declineCase(cast.lead, { caseId: draft.caseId, reason: story.declineReason ?? "" });
  }
  if (story.reached === "info_needed") {
    await askBack(cast.lead, { caseId: draft.caseId, questions: [story.question ?? ""] });
  }
  if (hasReached(story, "accepted")) {
    setStoryTime(Math.max(story.sentDaysAgo - 1, 0), "09:00");
    await acceptCase(cast.lead, {
      caseId: draft.caseId,
      priority: story.priority,
      leadId: cast.lead.id,
      investigatorId: cast[story.investigator].id,
      secondReaderId: cast[secondReaderOf(story)].id,
      technicianIds: [cast.technician.id],
      dueOn: storyDay(Math.max(story.dueInDays, 1 - story.sentDaysAgo)),
      impartialityStatement: "Nobody named here owns the design, the process or the supplier.",
      earlierReturnsSeen: true,
    });
  }
  return draft.caseId;
}

/** Registers what came, and takes the first item to a bench where the story has come so far. */
export async function receiveItems(
  cast: Cast,
  story: StoryCase,
  caseId: string,
): Promise<string[]> {
  const requester = cast[story.requester];
  setStoryTime(Math.max(story.sentDaysAgo - 1, 0), "09:40");
  const itemIds: string[] = [];
  for (const [i, item] of story.items.entries()) {
    const registered = await registerItem(cast.technician, {
      caseId,
      kind: item.kind ?? "part",
      parentId: null,
      content: {
        name: item.name,
        description: "",
        condition: ["as fractured", "dry"],
        hazards: item.kind === "fluid" ? [] : ["sharp edges"],
        massG: null,
        seal: String(40_000 + story.number * 10 + i),
      },
      fromPlace: requester.organisationName,
      toPlace: `Store B${(story.number % 4) + 1}`,
      reason: `Carrier Brightway, waybill 77-20${story.number}. Box dry, seal whole, photographed.`,
      at: new Date().toISOString(),
    });
    itemIds.push(registered.itemId);
  }
  if (hasReached(story, "examining") && itemIds[0]) {
    setStoryTime(Math.max(story.sentDaysAgo - 3, 0), "08:30");
    await takeToBench(cast, caseId, itemIds[0], 1, "Photographs and low power examination.");
  }
  return itemIds;
}

export async function takeToBench(
  cast: Cast,
  caseId: string,
  itemId: string,
  seenPosition: number,
  reason: string,
): Promise<void> {
  await handOver(cast.technician, {
    caseId,
    itemId,
    act: "taken_to_bench",
    toPlace: "Bench 2",
    holderId: cast.technician.id,
    reason,
    conditionNote: null,
    sealBroken: null,
    sealFitted: null,
    at: new Date().toISOString(),
    correctsId: null,
    seenPosition,
  });
}

export type StoryMechanism = {
  code: MechanismCode;
  detail: string;
  verdict: MechanismVerdict;
  reason: string;
};

export async function weigh(
  cast: Cast,
  story: StoryCase,
  caseId: string,
  mechanisms: readonly StoryMechanism[],
): Promise<void> {
  for (const content of mechanisms) {
    await weighMechanism(cast[story.investigator], {
      caseId,
      recordId: null,
      seenVersion: null,
      content,
    });
  }
}

export async function putOnHold(cast: Cast, story: StoryCase, caseId: string): Promise<void> {
  if (!story.hold) return;
  setStoryTime(Math.max(story.sentDaysAgo - 5, 0), "15:20");
  await holdCase(cast.lead, { caseId, kind: story.hold.kind, reason: story.hold.reason });
}
