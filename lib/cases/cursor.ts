import { z } from "zod";

const cursor = z.tuple([z.union([z.string(), z.number()]), z.string()]);
export type Cursor = z.infer<typeof cursor>;

/** Place in a list: the sort value and id of the last row seen. */
export function encodeCursor(value: Cursor): string {
  return btoa(encodeURIComponent(JSON.stringify(value)))
    .replace(/\+/g, "-")
    .replace(/\//g, "_")
    .replace(/=+$/, "");
}

/** Null when it cannot be read; the list then starts at its beginning. */
export function decodeCursor(text: string): Cursor | null {
  if (text === "") return null;
  try {
    return cursor.parse(
      JSON.parse(decodeURIComponent(atob(text.replace(/-/g, "+").replace(/_/g, "/")))),
    );
  } catch {
    return null;
  }
}
