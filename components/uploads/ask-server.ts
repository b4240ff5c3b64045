/** A refusal in the server's own words. Trying again would bring the same. */
export class Refused extends Error {
  override name = "Refused";
}

/** No answer, or one that may be another in a moment. */
export class NoAnswer extends Error {
  override name = "NoAnswer";
}

type Said = { error?: { message?: unknown } };

function wordsOf(body: unknown): string | null {
  const said: Said = typeof body === "object" && body !== null ? body : {};
  return typeof said.error?.message === "string" ? said.error.message : null;
}

/** Whether a status may pass by itself: too many at once, or a server in trouble. */
const mayPass = (status: number) => status === 429 || status >= 500;

/**
 * Asks the portal and reads its JSON.
 * @throws Refused with the portal's words; NoAnswer when trying again may help
 */
export async function askServer<T>(
  url: string,
  ask: {
    method?: "GET" | "POST" | "DELETE";
    body?: unknown;
    signal?: AbortSignal;
    /** Nobody pressed anything for it, so it does not keep a sign-in alive. */
    isBackground?: boolean;
  } = {},
): Promise<T> {
  const { method = "GET", body, signal, isBackground = false } = ask;
  let response: Response;
  try {
    response = await fetch(url, {
      method,
      signal,
      headers: {
        ...(body !== undefined && { "content-type": "application/json" }),
        ...(isBackground && { "x-riverline-background": "1" }),
      },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
  } catch (cause) {
    signal?.throwIfAborted();
    throw new NoAnswer("There was no answer.", { cause });
  }
  const text = await response.text();
  if (response.ok) return (text === "" ? undefined : JSON.parse(text)) as T;
  if (mayPass(response.status)) throw new NoAnswer("The server could not answer.");
  let words: string | null = null;
  try {
    words = wordsOf(JSON.parse(text));
  } catch {
    // An answer from something in between, such as a gateway, is not JSON.
  }
  throw new Refused(words ?? `The server refused this (${response.status}). Nothing was changed.`);
}
