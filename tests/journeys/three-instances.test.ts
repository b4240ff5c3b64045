import { createHash } from "node:crypto";
import { setTimeout as sleep } from "node:timers/promises";
import { type Connection, createConnection, type RowDataPacket } from "mysql2/promise";
import type { Browser, Page } from "playwright-core";
import sharp from "sharp";
import { afterAll, beforeAll, expect, it } from "vitest";
import { type Cluster, type Instance, startCluster } from "./instances";
import { caseAddress, openBrowser, signedIn } from "./portal";

const INVESTIGATOR = "investigator@calderstreet.example";
const TECHNICIAN = "technician@calderstreet.example";
/** Sets what this run sends apart from what is there. */
const RUN = Date.now().toString(36);
const STRANGER = `nobody-${RUN}@tesselwind.example`;

let browser: Browser;
let cluster: Cluster;
let db: Connection;

beforeAll(async () => {
  db = await createConnection(setting("DATABASE_URL"));
  browser = await openBrowser();
  cluster = await startCluster(3);
}, 240_000);
afterAll(async () => {
  await browser.close();
  await cluster.stop();
  await db.end();
});

function setting(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set; run the journeys by the test command`);
  return value;
}

const open = (email: string) => signedIn(browser, email, {}, cluster.address);

/** What each instance, asked by itself, says of this person's sign-in. */
async function statuses(page: Page): Promise<number[]> {
  const answers: number[] = [];
  for (const { address } of cluster.instances)
    answers.push((await page.request.get(`${address}/api/session`)).status());
  return answers;
}

async function sendPicture(page: Page, caseId: string, name: string): Promise<string> {
  const grey = createHash("sha256").update(name).digest();
  const bytes = await sharp(grey, { raw: { width: 8, height: 4, channels: 1 } })
    .resize(160, 80)
    .png()
    .toBuffer();
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  const started = await page.request.post("/api/uploads", {
    data: {
      caseId,
      purpose: "image",
      fileName: `${name}.png`,
      sizeBytes: bytes.byteLength,
      mediaType: "image/png",
      lastModified: 1_700_000_000_000,
      firstPartSha256: sha256,
      details: { technique: "stereo" },
    },
  });
  expect(started.status()).toBe(201);
  const { uploadId, way }: { uploadId: string; way: { url: string } } = await started.json();
  const put = await fetch(way.url, {
    method: "PUT",
    body: new Uint8Array(bytes),
    headers: { "content-type": "image/png" },
  });
  expect(put.status).toBe(200);
  const finished = await page.request.post(`/api/uploads/${uploadId}/finish`, { data: { sha256 } });
  expect(finished.status()).toBe(200);
  return uploadId;
}

async function rows<Row>(sql: string, values: unknown[]): Promise<Row[]> {
  const [found] = await db.query<(Row & RowDataPacket)[]>(sql, values);
  return found;
}

type JobRow = { state: string; attempts: number; worker: string };

/** The jobs of these files, once all are done. */
async function finishedJobs(uploadIds: readonly string[]): Promise<JobRow[]> {
  const sql = `select state, attempts, worker from jobs where unique_key in (?)`;
  for (;;) {
    const jobs = await rows<JobRow>(sql, [uploadIds.map((id) => `take-in-${id}`)]);
    if (jobs.length === uploadIds.length && jobs.every((job) => job.state === "done")) return jobs;
    await sleep(300);
  }
}

async function picturesOf(uploadIds: readonly string[]): Promise<string[]> {
  const found = await rows<{ state: string }>(
    "select images.state from images join uploads on uploads.image_id = images.record_id where uploads.id in (?)",
    [uploadIds],
  );
  return found.map((picture) => picture.state);
}

it("honours a sign-in on every instance, and ends it on every instance", async () => {
  const { page, faults } = await open(INVESTIGATOR);
  expect(await statuses(page)).toEqual([200, 200, 200]);
  const before = cluster.instances.map((instance) => instance.served);
  for (let i = 0; i < 6; i++) expect((await page.goto("/cases"))?.status()).toBe(200);
  for (const [i, { served }] of cluster.instances.entries())
    expect(served).toBeGreaterThan(before[i] ?? Infinity);
  await page.getByRole("button", { name: /Idris Vale/ }).click();
  await page.getByRole("menuitem", { name: "Sign out" }).click();
  await page.waitForURL((url) => url.pathname.startsWith("/sign-in"));
  expect(await statuses(page)).toEqual([401, 401, 401]);
  expect(faults).toEqual([]);
});

it("puts a deactivated person out of every instance at their next request", async () => {
  const person = await open(TECHNICIAN);
  const { page } = await open("admin@calderstreet.example");
  await page.goto("/admin/people");
  try {
    await page.getByRole("button", { name: "Deactivate Tove Brandt", exact: true }).click();
    await page.getByRole("button", { name: "Activate Tove Brandt", exact: true }).waitFor();
    expect(await statuses(person.page)).toEqual([401, 401, 401]);
  } finally {
    await page.getByRole("button", { name: "Activate Tove Brandt", exact: true }).click();
    await page.getByRole("button", { name: "Deactivate Tove Brandt", exact: true }).waitFor();
  }
});

it("counts wrong passwords together, whichever instance was asked", async () => {
  const context = await browser.newContext({ baseURL: cluster.address });
  const page = await context.newPage();
  await page.goto("/sign-in");
  const tryOnce = async () => {
    await page.getByLabel("E-mail").fill(STRANGER);
    await page.getByLabel("Password", { exact: true }).fill("not the password");
    const answered = page.waitForResponse((answer) => answer.url().includes("/callback/"));
    await page.getByRole("button", { name: "Sign in" }).click();
    await answered;
  };
  // Eight tries for an account; each instance saw fewer.
  for (let i = 0; i < 8; i++) await tryOnce();
  await page.getByText("E-mail and password do not fit together").waitFor();
  await tryOnce();
  await page.getByText("Too many tries for this account or from this place").waitFor();
});

it("lets one of two instances write a record, and tells the other's person of it", async () => {
  const { page } = await open("requester@harrowbay.example");
  await page.goto("/cases/new");
  await page.getByRole("button", { name: "Start the field return" }).click();
  await page.waitForURL(/\/field-return$/);
  const caseId = new URL(page.url()).pathname.split("/")[2] ?? "";
  const [draft] = await rows<{ revision: number }>(
    "select revision from field_returns where case_id = ?",
    [caseId],
  );
  await page.goto("/cases");
  const save = ({ address }: Instance, partName: string) =>
    page.request.put(`${address}/api/cases/${caseId}/field-return`, {
      data: {
        revision: draft?.revision,
        answers: { partName: { kind: "value", value: partName } },
      },
    });
  const [first, second, third] = cluster.instances;
  if (!first || !second || !third) throw new Error("three instances were asked for");
  const answers = await Promise.all([save(first, "Pawl"), save(second, "Ratchet")]);
  expect(answers.map((answer) => answer.status()).sort()).toEqual([200, 409]);
  const kept = answers[0]?.status() === 200 ? "Pawl" : "Ratchet";
  const shown = await page.request.get(`${third.address}/cases/${caseId}/field-return`);
  expect(await shown.text()).toContain(kept);
});

it("runs each job once, with three workers and more at work", async () => {
  const { page } = await open(INVESTIGATOR);
  const caseId = (await caseAddress(page, "RL-2026-0142")).split("/")[2] ?? "";
  const names = Array.from({ length: 12 }, (_, i) => `one-of-twelve-${RUN}-${i}`);
  const uploadIds = await Promise.all(names.map((name) => sendPicture(page, caseId, name)));
  const jobs = await finishedJobs(uploadIds);
  expect(jobs.map((job) => job.attempts)).toEqual(names.map(() => 1));
  expect(new Set(jobs.map((job) => job.worker)).size).toBeGreaterThan(1);
  expect(await picturesOf(uploadIds)).toEqual(names.map(() => "ready"));
  const told = await rows<{ times: number }>(
    "select count(*) as times from audit_events where chain = ? and action = 'system.takeInImage' and json_value(`after`, '$.fileName') in (?) group by json_value(`after`, '$.fileName')",
    [caseId, names.map((name) => `${name}.png`)],
  );
  expect(told.map((row) => Number(row.times))).toEqual(names.map(() => 1));
});

it("sends each letter once", async () => {
  const { page } = await open("admin@calderstreet.example");
  await page.goto("/admin/people");
  const guests = [1, 2, 3].map((i) => `guest-${i}-${RUN}@tesselwind.example`);
  for (const guest of guests) {
    await page.getByLabel("Name", { exact: true }).fill(`Guest ${guest.slice(6, 7)}`);
    await page.getByLabel("E-mail").fill(guest);
    await page.getByLabel("Organisation").selectOption({ label: "Tessel Wind" });
    await page.getByRole("button", { name: "Send the invitation" }).click();
    await page.getByText(`The invitation is on its way to ${guest}.`).waitFor();
  }
  const lettersTo = async (guest: string): Promise<number> => {
    const answer = await fetch(`${setting("MAIL_SINK_URL")}/messages.json?to=${guest}`);
    const letters: unknown[] = await answer.json();
    return letters.length;
  };
  for (const guest of guests)
    await expect.poll(() => lettersTo(guest), { timeout: 20_000 }).toBe(1);
  // Long enough for every worker to have looked again.
  await sleep(2_000);
  for (const guest of guests) expect(await lettersTo(guest)).toBe(1);
});

it("goes on when one machine of the three stops without a word", async () => {
  const { page, faults } = await open(INVESTIGATOR);
  const caseId = (await caseAddress(page, "RL-2026-0142")).split("/")[2] ?? "";
  await cluster.instances[1]?.kill();
  for (let i = 0; i < 6; i++) expect((await page.goto("/cases"))?.status()).toBe(200);
  const names = [1, 2, 3].map((i) => `after-the-stop-${RUN}-${i}`);
  const uploadIds: string[] = [];
  for (const name of names) uploadIds.push(await sendPicture(page, caseId, name));
  await finishedJobs(uploadIds);
  expect(await picturesOf(uploadIds)).toEqual(names.map(() => "ready"));
  expect(faults).toEqual([]);
});
