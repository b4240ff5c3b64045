import { z } from "zod";

const cursor = z.tuple([z.union([z.string(), z.number(), z.null()]), z.string()]);
export type Cursor = z.infer<typeof cursor>;

/** Place in a list: the sort value and id of the last row seen; null where the row has no value. */
export function encodeCursor(value: Cursor): string {
  const bytes = new TextEncoder().encode(JSON.stringify(value));
  return btoa(String.fromCharCode(...bytes))
    .replace(/\+/g, "-")
    .replace(/\//g, "_")
    .replace(/=+$/, "");
}

/** Null when it cannot be read; the list then starts at its beginning. */
export function decodeCursor(text: string): Cursor | null {
  if (text === "") return null;
  try {
    const bytes = Uint8Array.from(atob(text.replace(/-/g, "+").replace(/_/g, "/")), (letter) =>
      letter.charCodeAt(0),
    );
    return cursor.parse(JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes)));
  } catch {
    return null;
  }
}
