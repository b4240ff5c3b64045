import "server-only";
import { z } from "zod";

const described = z.object({ caption: z.string().optional() });

/** Caption of a picture's content; empty where none was written. */
export function captionOf(content: unknown): string {
  const read = described.safeParse(content);
  return read.success ? (read.data.caption ?? "") : "";
}
