/** What the commands print: each step as it happens with its time, and failures in plain words. */

const plain = !process.stdout.isTTY || process.env.NO_COLOR !== undefined;
const dim = (text) => (plain ? text : `\u001b[2m${text}\u001b[22m`);
const bold = (text) => (plain ? text : `\u001b[1m${text}\u001b[22m`);

/** A failure that the reader can act on: what happened, what was kept, what to do. */
export class Failure extends Error {
  name = "Failure";
  constructor(happened, todo = "", kept = "") {
    super([happened, kept, todo].filter(Boolean).join("\n"));
  }
}

/** Thrown through the running step when somebody asked the command to stop. */
export class Stopped extends Error {
  name = "Stopped";
}

/** Runs what comes before any child is started; a failure there ends the command with its words. */
export function orExit(work) {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof Failure)) throw error;
    process.stderr.write(`\n${error.message}\n`);
    process.exit(1);
  }
}

export function formatDuration(ms) {
  if (ms < 60_000) return `${(ms / 1000).toFixed(1)} s`;
  return `${Math.floor(ms / 60_000)} min ${Math.round((ms % 60_000) / 1000)} s`;
}

export function say(text = "") {
  process.stdout.write(`${text}\n`);
}

export function sayDetail(text) {
  for (const line of text.trimEnd().split("\n")) say(dim(`    ${line}`));
}

export function sayBold(text) {
  say(bold(text));
}

/** Prints the label before the work begins, and the time it took after it. */
export async function step(label, work) {
  say(`${bold("•")} ${label}`);
  const begun = performance.now();
  const result = await work();
  const took = performance.now() - begun;
  if (took > 400) sayDetail(`done in ${formatDuration(took)}`);
  return result;
}
