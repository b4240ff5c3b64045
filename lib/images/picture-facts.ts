import "server-only";
import { eq } from "drizzle-orm";
import { z } from "zod";
import type { Reader } from "@/db/client";
import { records } from "@/db/schema";
import { formatDate } from "@/lib/format/dates";
import { TECHNIQUE_NAMES, TECHNIQUES } from "./constants";

/** What the bench and figures read of a picture's content; what was not given is left out. */
const described = z.object({
  caption: z.string().catch(""),
  technique: z.enum(TECHNIQUES).nullable().catch(null),
  itemId: z.string().nullable().catch(null),
  magnification: z.number().positive().nullable().catch(null),
  takenOn: z.string().nullable().catch(null),
});

/** The caption of a picture; empty where nobody wrote one. */
export function pictureTitle(content: unknown): string {
  const read = described.safeParse(content);
  return read.success ? read.data.caption : "";
}

export type PictureFacts = { title: string; facts: string; magnification: string };

/** Caption, "E1.1 · Stereo microscope · 20 Nov 2026" and "×500" of a picture's content. */
export async function pictureFacts(reader: Reader, content: unknown): Promise<PictureFacts> {
  const read = described.safeParse(content);
  if (!read.success) return { title: "", facts: "", magnification: "" };
  const { caption, technique, itemId, magnification, takenOn } = read.data;
  const [item] = itemId
    ? await reader.select({ label: records.label }).from(records).where(eq(records.id, itemId))
    : [];
  const facts = [
    item?.label,
    technique && TECHNIQUE_NAMES[technique],
    takenOn && formatDate(takenOn),
  ].filter(Boolean);
  return {
    title: caption,
    facts: facts.join(" · "),
    magnification: magnification === null ? "" : `×${magnification}`,
  };
}
