/** Runs once when a server process starts: a wrong setting stops it here, not at the first click. */
export async function register() {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { env } = await import("@/lib/env");
  env();
}
