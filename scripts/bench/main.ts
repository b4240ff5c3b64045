import { cpus } from "node:os";
import { closeDatabase } from "@/db/client";
import { benchCaseList } from "./case-list";
import { benchConversion } from "./conversion";
import { lineOf } from "./measure";
import { benchPyramid } from "./pyramid";

/** Prints every measurement as a ratio against its yardstick. */
async function main(): Promise<void> {
  const [cpu] = cpus();
  console.log(`${cpus().length} x ${cpu?.model ?? "unknown processor"}, Node ${process.version}`);
  console.log(lineOf(await benchConversion()));
  for (const measured of await benchCaseList()) console.log(lineOf(measured));
  console.log(lineOf(await benchPyramid()));
  await closeDatabase();
}

await main();
