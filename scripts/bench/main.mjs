import { cpus } from "node:os";
import { ensureBuild } from "../lib/application.mjs";
import { Failure, formatDuration, say, sayBold, sayDetail, step } from "../lib/report.mjs";
import { root } from "../lib/root.mjs";
import { startTestServices } from "../lib/test-services.mjs";
import { TEST_BUILD } from "../lib/test-stages.mjs";
import { measureCaseList, measureSignedIn } from "./case-list.mjs";
import { measureConversion } from "./conversion.mjs";
import { buildEmptyApplication, startEmptyApplication } from "./empty-application.mjs";
import { startPortal } from "./portals.mjs";
import { measurePictures } from "./pictures.mjs";
import { measureScriptBytes } from "./script-bytes.mjs";
import { measureSecondStart } from "./second-start.mjs";
import { figuresTable } from "./table.mjs";

const FEW = 1_000;
const MANY = 100_000;
export const LETTERS = ["a", "b", "c", "d", "e", "f", "g"];

/** @throws Failure for a figure that is not there */
export function checkLetters(letters) {
  const unknown = letters.find((letter) => !LETTERS.includes(letter));
  if (unknown === undefined) return;
  throw new Failure(
    `There is no figure "${unknown}".`,
    `Name some of ${LETTERS.join(", ")}, or none for all.`,
  );
}

function sayFigures({ rows, notes }) {
  if (rows.length === 0) return;
  const [cpu] = cpus();
  sayBold("\nFigures");
  say(`${cpus().length} x ${cpu?.model ?? "unknown processor"}, Node ${process.version}`);
  say(figuresTable(rows));
  for (const note of notes) say(note);
}

/** The services, builds and servers that figures share, each made when it is first asked for. */
function workshop(children, settings) {
  const once = (label, make) => {
    let made;
    return () => (made ??= step(label, make));
  };
  const emptyFolder = once("Building the framework's empty application", () =>
    buildEmptyApplication(children, children.folder),
  );
  return {
    few: once("Starting a portal with 1 000 cases", () =>
      startPortal({ children, settings, name: "few", count: FEW }),
    ),
    many: once("Starting a portal with 100 000 cases", () =>
      startPortal({ children, settings, name: "many", count: MANY }),
    ),
    empty: async () => {
      const folder = await emptyFolder();
      return startEmptyApplication(children, folder);
    },
  };
}

async function measureAll(children, letters, figures) {
  const wants = (...some) => some.some((letter) => letters.includes(letter));
  const add = async (label, work) => figures.rows.push(...(await step(`Measuring ${label}`, work)));
  const { settings: given } = await step(
    "Starting a throw-away database, store and mail sink",
    () => startTestServices(children.folder, children),
  );
  const settings = { ...given, NODE_ENV: "production" };
  const announce = (work) => step("Building the portal", work);
  await ensureBuild({ root, settings, children, announce, distFolder: TEST_BUILD });
  const { few, many, empty } = workshop(children, settings);
  const portal = await few();

  if (wants("a", "b")) {
    await add("a, b: pictures of 100 megapixels and their tiles", async () => {
      const { rows, workerPeakMb } = await measurePictures(children, portal);
      figures.notes.push(`Most memory of the worker in a: ${workerPeakMb.toFixed(0)} MB (VmHWM)`);
      return rows;
    });
  }
  if (wants("c")) {
    const full = await many();
    await add("c: case lists", () => measureCaseList(portal, full));
    await children.stop(full.entry);
  }
  if (wants("d")) await add("d: signed-in routes", () => measureSignedIn(portal));
  if (wants("e", "f")) {
    const application = await empty();
    if (wants("e")) await add("e: conversion", () => measureConversion(portal, application.base));
    if (wants("f")) await add("f: JavaScript", () => measureScriptBytes(portal, application.base));
    await children.stop(application.entry);
  }
  await children.stop(portal.entry);
  if (wants("g")) figures.rows.push(await measureSecondStart(children, portal.settings));
}

/**
 * Measures the figures of these letters and prints them as one table; when one cannot be measured,
 * those before it are printed all the same.
 * @param {import("../lib/children.mjs").Children} children
 * @param {string[]} letters
 */
export async function bench(children, letters) {
  const begun = performance.now();
  const figures = { rows: [], notes: [] };
  try {
    await measureAll(children, letters.length > 0 ? letters : LETTERS, figures);
  } finally {
    sayFigures(figures);
    sayDetail(`${formatDuration(performance.now() - begun)} in all`);
  }
}
