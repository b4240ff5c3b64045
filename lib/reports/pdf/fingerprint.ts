import "server-only";

/** First 16 hex digits in groups of four: enough to compare two prints by eye. */
export function shortFingerprint(sha256Hex: string): string {
  return (sha256Hex.slice(0, 16).match(/.{1,4}/g) ?? []).join(" ");
}
