/**
 * Copies of what is typed, kept in this browser. A browser may have no room left or keep nothing
 * at all (private windows, storage switched off); each answer says so, and the page tells.
 */

/** False where the browser keeps no copy. */
export function keepOnDevice(key: string, value: unknown): boolean {
  try {
    localStorage.setItem(key, JSON.stringify(value));
    return true;
  } catch {
    return false;
  }
}

/** Null where nothing is kept, or it cannot be read. */
export function readFromDevice(key: string): unknown {
  try {
    const text = localStorage.getItem(key);
    return text === null ? null : JSON.parse(text);
  } catch {
    return null;
  }
}

/** False where the browser's storage cannot be reached; there is nothing of ours in it then. */
export function dropFromDevice(key: string): boolean {
  try {
    localStorage.removeItem(key);
    return true;
  } catch {
    return false;
  }
}
