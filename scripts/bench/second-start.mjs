import path from "node:path";
import { TEST_BUILD } from "../lib/test-stages.mjs";
import { choosePort } from "../lib/ports.mjs";
import { step } from "../lib/report.mjs";
import { KNOWN_SETTINGS } from "../lib/settings.mjs";
import { inPairs } from "./measure.mjs";
import { nextStart, startUntilReady } from "./servers.mjs";

/** Empty counts as not set, in the environment and over an .env file: no outside service is touched. */
const nothingGiven = Object.fromEntries(KNOWN_SETTINGS.map((name) => [name, ""]));

async function readyAfter(children, options) {
  const { entry, tookMs } = await startUntilReady(children, options);
  await children.stop(entry);
  return tookMs;
}

/**
 * `npm start` on a state that is there already, to the health page's first good answer, against
 * `next start` alone on the same build with services that are up.
 */
export async function measureSecondStart(children, settings) {
  const port = await choosePort();
  const address = `http://127.0.0.1:${port}/api/health`;
  const npmStart = {
    name: "npm-start",
    command: "npm",
    args: ["start"],
    env: {
      ...nothingGiven,
      NEXT_DIST_DIR: TEST_BUILD,
      PORT: String(port),
      RIVERLINE_STATE: path.join(children.folder, "second-start"),
    },
    address,
  };
  const alone = {
    ...nextStart({ name: "next-start", port, env: { ...settings, NEXT_DIST_DIR: TEST_BUILD } }),
    address,
  };
  await step("Starting the product for the first time, with its demonstration", () =>
    readyAfter(children, npmStart),
  );
  const found = await step("Measuring g: starting it again", () =>
    inPairs(
      {
        product: () => readyAfter(children, npmStart),
        yardstick: () => readyAfter(children, alone),
      },
      { pairs: 3, warmUps: 1 },
    ),
  );
  const what = "second npm start until it is well, database, store and mail included";
  return { letter: "g", what, against: "next start alone, services up", ...found };
}
