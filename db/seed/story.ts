import { eq } from "drizzle-orm";
import { connectionPool, database } from "@/db/client";
import { jobs } from "@/db/schema";
import type { Cast } from "./actors";
import { STORY_CASES, type StoryCase } from "./case-list";
import { installStoryClock, setRealTime, setStoryTime } from "./clock";
import { otherMechanisms } from "./other-mechanisms";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { writeHoistShaft } from "./hoist-shaft";
import { writeOtherFindings } from "./other-findings";
import { otherPictures } from "./other-pictures";
import { hasReached, putOnHold, receiveItems, secondReaderOf, sendAndTriage, weigh } from "./reach";
import { closeCase, haveRead, signAndRelease, stateNoStrength } from "./sign-and-release";

/** Writes the cases of the demonstration, each as far as it has come, through the portal's own verbs. */
export async function writeStory(cast: Cast): Promise<void> {
  installStoryClock(connectionPool());
  for (const story of STORY_CASES) await writeCaseStory(cast, story);
  setRealTime();
  // The people of the demonstration are invented; nobody is to be written to.
  await database().delete(jobs).where(eq(jobs.kind, "mail.send"));
}

const HOIST_SHAFT = 142;

async function writeCaseStory(cast: Cast, story: StoryCase): Promise<void> {
  const caseId = await sendAndTriage(cast, story);
  const itemIds = hasReached(story, "accepted") ? await receiveItems(cast, story, caseId) : [];
  if (story.number === HOIST_SHAFT) {
    await writeHoistShaft(cast, story, caseId, itemIds);
    return;
  }
  await otherPictures(cast, story, caseId, itemIds[0] ?? null);
  if (hasReached(story, "weighing")) {
    setStoryTime(Math.max(story.sentDaysAgo - 6, 0), "13:15");
    await weigh(cast, story, caseId, otherMechanisms(story));
  }
  await putOnHold(cast, story, caseId);
  if (!hasReached(story, "in_review")) return;
  const signedDaysAgo = Math.max(-story.dueInDays, 1);
  setStoryTime(signedDaysAgo + 3, "11:00");
  await stateNoStrength(cast, story, caseId);
  await writeOtherFindings(cast, story, caseId);
  if (story.reached === "in_review") {
    setStoryTime(1, "09:10");
    await sendToSecondReader(cast[story.investigator], {
      caseId,
      readerId: cast[secondReaderOf(story)].id,
    });
    return;
  }
  await haveRead(cast, story, caseId, signedDaysAgo + 2);
  await signAndRelease(cast, story, caseId, signedDaysAgo + 1);
  if (story.reached === "closed") await closeCase(cast, caseId, Math.max(signedDaysAgo - 20, 1));
}
