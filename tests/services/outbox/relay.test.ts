import { afterEach, beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { database } from "@/db/client";
import { jobs } from "@/db/schema";
import { transaction } from "@/db/transaction";
import type { Mail } from "@/lib/outbox/mail";
import { type Relay, startRelay } from "../../helpers/mail-relay";
import { endPauses, workOff } from "../../helpers/run-worker";

/** The port is settled before the relay is up, as it is where a relay is down for a while. */
let port: number;
let work: typeof import("@/lib/jobs/worker").work;
let queueMail: typeof import("@/lib/outbox/mail").queueMail;
let relay: Relay | undefined;

beforeAll(async () => {
  const first = await startRelay();
  port = first.port;
  await first.close();
  vi.stubEnv("SMTP_HOST", "127.0.0.1");
  vi.stubEnv("SMTP_PORT", String(port));
  vi.stubEnv("LOG_LEVEL", "silent");
  vi.resetModules();
  ({ work } = await import("@/lib/jobs/worker"));
  ({ queueMail } = await import("@/lib/outbox/mail"));
});

beforeEach(() => database().delete(jobs));

afterEach(async () => {
  await relay?.close();
  relay = undefined;
});

const mailTo = (to: string, change: Partial<Mail> = {}): Mail => ({
  to,
  subject: "RL-2026-0001, accepted",
  news: "The laboratory took the case.",
  facts: [["Case", "RL-2026-0001"]],
  button: { label: "Open the case", path: "/cases/case_1" },
  ...change,
});

const put = (mail: Mail, uniqueKey?: string) => transaction((tx) => queueMail(tx, mail, uniqueKey));
const theJob = async () => (await database().select().from(jobs))[0];

describe("a mail in the outbox", () => {
  it("is sent once, in text and in HTML, with the address of the portal in its link", async () => {
    relay = await startRelay({ port });
    await put(mailTo("one@example.test"));
    await workOff(work);
    await endPauses();
    await workOff(work);
    expect(relay.arrived).toHaveLength(1);
    const [message] = relay.arrived;
    expect(message?.recipients).toEqual(["one@example.test"]);
    expect(message?.mail.subject).toBe("RL-2026-0001, accepted");
    const link = new URL("/cases/case_1", process.env.NEXTAUTH_URL).toString();
    expect(message?.mail.text).toContain(link);
    expect(message?.mail.html).toContain(link);
    expect(await theJob()).toMatchObject({ state: "done", attempts: 1, lastError: null });
  });

  it("waits while the relay is down, and goes once when it is back", async () => {
    await put(mailTo("one@example.test"));
    await workOff(work);
    const waiting = await theJob();
    expect(waiting).toMatchObject({ state: "ready", attempts: 1, worker: null, leaseUntil: null });
    expect(waiting?.lastError).toContain("ECONNREFUSED");
    expect(waiting?.runAt.getTime()).toBeGreaterThan(Date.now());
    await endPauses();
    await workOff(work);
    expect(await theJob()).toMatchObject({ state: "ready", attempts: 2 });

    relay = await startRelay({ port });
    await endPauses();
    await workOff(work);
    expect(relay.arrived).toHaveLength(1);
    expect(await theJob()).toMatchObject({ state: "done", attempts: 3 });
  });

  it("is tried again when the relay will not take it now, with longer pauses", async () => {
    let refusals = 2;
    relay = await startRelay({
      port,
      refusal: () => (refusals-- > 0 ? { code: 451, says: "try again later" } : null),
    });
    await put(mailTo("one@example.test"));
    const pauses: number[] = [];
    for (let i = 0; i < 2; i += 1) {
      await workOff(work);
      pauses.push(((await theJob())?.runAt.getTime() ?? 0) - Date.now());
      await endPauses();
    }
    expect(pauses[1]).toBeGreaterThan(pauses[0] ?? Infinity);
    await workOff(work);
    expect(relay.arrived).toHaveLength(1);
  });

  it("is laid aside after its last try, with what the relay said", async () => {
    relay = await startRelay({ port, refusal: () => ({ code: 550, says: "no such person" }) });
    await put(mailTo("nobody@example.test"));
    await database().update(jobs).set({ maxAttempts: 2 });
    await workOff(work);
    await endPauses();
    await workOff(work);
    expect(await theJob()).toMatchObject({ state: "dead", attempts: 2 });
    expect((await theJob())?.lastError).toContain("no such person");
    await endPauses();
    await workOff(work);
    expect((await theJob())?.attempts).toBe(2);
  });

  it("does not keep the others back when it cannot be sent", async () => {
    let isFirst = true;
    relay = await startRelay({
      port,
      refusal: () => {
        const refused = isFirst;
        isFirst = false;
        return refused ? { code: 550, says: "no such person" } : null;
      },
    });
    await put(mailTo("nobody@example.test"));
    await put(mailTo("one@example.test"));
    await workOff(work);
    expect(relay.arrived.map(({ recipients }) => recipients)).toEqual([["one@example.test"]]);
  });

  it("asked for twice under one name goes once", async () => {
    relay = await startRelay({ port });
    await put(mailTo("one@example.test"), "released:report_1");
    await put(mailTo("one@example.test"), "released:report_1");
    await workOff(work);
    expect(relay.arrived).toHaveLength(1);
  });

  it("goes nowhere when the deed that called for it does not hold", async () => {
    relay = await startRelay({ port });
    const undone = transaction(async (tx) => {
      await queueMail(tx, mailTo("one@example.test"));
      throw new Error("undone");
    });
    await expect(undone).rejects.toThrow("undone");
    await workOff(work);
    expect(relay.arrived).toEqual([]);
  });
});

it("sends each of many once with two workers of two lanes each", async () => {
  relay = await startRelay({ port });
  const everyone = Array.from({ length: 40 }, (_, i) => `person.${i}@example.test`);
  for (const to of everyone) await put(mailTo(to));
  await workOff(work, 2, 2);
  expect(relay.arrived.flatMap(({ recipients }) => recipients).sort()).toEqual(everyone.sort());
  const kept = await database().select().from(jobs);
  expect(new Set(kept.map(({ state, attempts }) => `${state} ${attempts}`))).toEqual(
    new Set(["done 1"]),
  );
});

describe("what people typed stays in its place", () => {
  const LINES = "Hoist shaft\r\nBcc: eve@example.test\r\n\r\n<script>alert(1)</script>";

  it("a subject of several lines makes no header and no recipient", async () => {
    relay = await startRelay({ port });
    await put(
      mailTo("one@example.test", {
        subject: `RL-2026-0001, accepted, ${LINES}`,
        news: `Eve\r\nBcc: eve@example.test asks`,
        facts: [["Title", LINES]],
        after: LINES,
      }),
    );
    await workOff(work);
    const [message] = relay.arrived;
    expect(message?.recipients).toEqual(["one@example.test"]);
    expect(message?.mail.bcc).toBeUndefined();
    expect(message?.mail.cc).toBeUndefined();
    expect(message?.source.split(/\r?\n\r?\n/)[0]).not.toMatch(/^bcc:/im);
    expect(message?.mail.subject).toContain("Bcc: eve@example.test");
    expect(message?.mail.subject).not.toMatch(/[\r\n]/);
    expect(message?.mail.html).not.toContain("<script");
    expect(message?.mail.html).toContain("&#60;script");
  });

  it("letters of every kind arrive as typed", async () => {
    relay = await startRelay({ port });
    const typed = "Wälzlager ×4 – 軸 عمود 🪛 “Ø” ".repeat(6).trim();
    await put(mailTo("one@example.test", { subject: typed, facts: [["Title", typed]] }));
    await workOff(work);
    expect(relay.arrived[0]?.mail.subject).toBe(typed);
    expect(relay.arrived[0]?.mail.text).toContain(`Title: ${typed}`);
  });

  it("a line that is one full stop does not end the message", async () => {
    relay = await startRelay({ port });
    await put(mailTo("one@example.test", { news: "Before\n.\nAfter" }));
    await workOff(work);
    expect(relay.arrived[0]?.mail.text).toContain("Before\n.\nAfter");
    expect(relay.arrived[0]?.mail.text).toContain("Sent by Riverline");
  });
});
