import { eq } from "drizzle-orm";
import { connectionPool, database } from "@/db/client";
import { jobs } from "@/db/schema";
import type { Cast } from "./actors";
import { STORY_CASES, type StoryCase } from "./case-list";
import { installStoryClock, setRealTime, setStoryTime } from "./clock";
import { otherMechanisms } from "./other-mechanisms";
import { hasReached, putOnHold, receiveItems, sendAndTriage, weigh } from "./reach";

/** Writes the cases of the demonstration, each as far as it has come, through the portal's own verbs. */
export async function writeStory(cast: Cast): Promise<void> {
  installStoryClock(connectionPool());
  for (const story of STORY_CASES) await writeCaseStory(cast, story);
  setRealTime();
  // The people of the demonstration are invented; nobody is to be written to.
  await database().delete(jobs).where(eq(jobs.kind, "mail.send"));
}

async function writeCaseStory(cast: Cast, story: StoryCase): Promise<string> {
  const caseId = await sendAndTriage(cast, story);
  if (hasReached(story, "accepted")) await receiveItems(cast, story, caseId);
  if (hasReached(story, "weighing")) {
    setStoryTime(Math.max(story.sentDaysAgo - 6, 0), "13:15");
    await weigh(cast, story, caseId, otherMechanisms(story));
  }
  await putOnHold(cast, story, caseId);
  return caseId;
}
