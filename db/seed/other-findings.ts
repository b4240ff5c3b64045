import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { images, records } from "@/db/schema";
import type { Cast } from "./actors";
import type { StoryCase } from "./case-list";
import { type WrittenSections, writeFindings } from "./write-findings";

const CAUSES: Record<number, { rootCause: string; seen: string; actions: string }> = {
  112: {
    rootCause: "Bending fatigue of the bolt under its head, after the joint had worked loose.",
    seen: "Beach marks start at the head radius on one side; the last tenth broke by dimples.",
    actions: "Check the tightening of all eight bolts. Owner: Harrow Bay. Check: torque record.",
  },
  127: {
    rootCause:
      "Bending fatigue at the tooth roots; what raised the root stress is still being weighed.",
    seen: "Both teeth show beach marks from the root fillet of the loaded side.",
    actions:
      "Measure the contact pattern of the mating gear. Owner: Orrin Pumps. Check: blue print.",
  },
  129: {
    rootCause:
      "Cavitation at the inlet edges, from running below the suction head that the pump needs.",
    seen: "Craters without product on the low-pressure side of every blade.",
    actions:
      "Raise the suction head or lower the speed. Owner: Orrin Pumps. Check: suction pressure log.",
  },
  134: {
    rootCause: "Bending fatigue of the boom pin from the sharp edge of the grease hole.",
    seen: "Beach marks run from the edge of the cross hole over two thirds of the section; the rest broke by dimples.",
    actions:
      "Round the edges of the grease hole to R 1 mm and replace pins of the same drawing. Owner: Harrow Bay. Check: radius gauge.",
  },
};

async function firstScaledPicture(caseId: string): Promise<string | null> {
  const [row] = await database()
    .select({ id: images.recordId })
    .from(images)
    .innerJoin(records, and(eq(records.scopeId, images.recordId), eq(records.kind, "calibration")))
    .where(eq(images.caseId, caseId))
    .limit(1);
  return row?.id ?? null;
}

/** Writes short findings of the cases beside the hoist shaft. */
export async function writeOtherFindings(
  cast: Cast,
  story: StoryCase,
  caseId: string,
): Promise<void> {
  const cause = CAUSES[story.number];
  if (!cause) throw new Error(`no cause for ${story.number}`);
  const picture = await firstScaledPicture(caseId);
  const sections: WrittenSections = {
    answer: [[cause.rootCause], ["This rests on the items sent and on nothing else."]],
    scope: [["Why the part failed, and whether parts of the same kind can stay in service."]],
    sent: [["The items of the annex, as received, not cleaned."]],
    fractography: [
      [cause.seen],
      ...(picture ? [{ figure: picture, caption: "E1, surface as received, oblique light." }] : []),
    ],
    weighing: [
      [
        "The mechanism that stands has nothing against it; the others are weighed out or ruled out with their reasons in the case.",
      ],
    ],
    conclusions: [{ list: [[`Probable: ${cause.rootCause}`]] }],
    limitations: [["One part was examined. Service data are as supplied and were not verified."]],
    actions: [{ list: [[cause.actions]] }],
  };
  await writeFindings(cast[story.investigator], caseId, cause.rootCause, sections);
}
