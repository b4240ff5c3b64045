import "server-only";
import { z } from "zod";

const titled = z.object({ caption: z.string() });

/** The caption of a picture's content; empty where nobody wrote one. */
export function pictureTitle(content: unknown): string {
  const read = titled.safeParse(content);
  return read.success ? read.data.caption : "";
}
