import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { people, signIns } from "@/db/schema";
import { endSignIn, findSignIn } from "@/lib/auth/sign-ins";
import { env } from "@/lib/env";
import { signInOf } from "../../helpers/accounts";
import { asInvestigator, asLead } from "../../helpers/people";

const SECOND = 1000;
const MINUTE = 60 * SECOND;
const HOUR = 60 * MINUTE;
const IDLE_MS = env().SESSION_IDLE_MINUTES * MINUTE;
const LONGEST_MS = env().SESSION_MAX_HOURS * HOUR;

const ago = (ms: number) => new Date(Date.now() - ms);

async function aSignIn(set: { startedAt?: Date; lastUsedAt?: Date } = {}) {
  const id = await signInOf(await asLead());
  if (Object.keys(set).length > 0) {
    await database().update(signIns).set(set).where(eq(signIns.id, id));
  }
  return id;
}

async function rowOf(id: string) {
  const [row] = await database().select().from(signIns).where(eq(signIns.id, id));
  if (!row) throw new Error(`there is no sign-in ${id}`);
  return row;
}

const use = (id: string) => findSignIn(id, { countsAsUse: true });
const poll = (id: string) => findSignIn(id, { countsAsUse: false });

describe("a sign-in", () => {
  it("is of thirty minutes without use and twelve hours unless set otherwise", () => {
    expect([env().SESSION_IDLE_MINUTES, env().SESSION_MAX_HOURS]).toEqual([30, 12]);
  });

  it("holds while it is used, and gives the person as the database has them now", async () => {
    const lead = await asLead();
    const id = await aSignIn();
    await database().update(people).set({ name: "Renamed Lead" }).where(eq(people.id, lead.id));
    expect((await use(id))?.actor).toEqual({ ...lead, name: "Renamed Lead" });
    await database().update(people).set({ name: lead.name }).where(eq(people.id, lead.id));
  });

  it("ends when it was not used for its time, and not a moment before", async () => {
    expect(await use(await aSignIn({ lastUsedAt: ago(IDLE_MS + SECOND) }))).toBeNull();
    const justInTime = await aSignIn({ lastUsedAt: ago(IDLE_MS - 5 * SECOND) });
    expect(await use(justInTime)).not.toBeNull();
    expect(Date.now() - (await rowOf(justInTime)).lastUsedAt.getTime()).toBeLessThan(5 * SECOND);
  });

  it("is not kept alive by a page that asks by itself", async () => {
    const lastUsedAt = ago(IDLE_MS - 5 * SECOND);
    const id = await aSignIn({ lastUsedAt });
    const found = await poll(id);
    expect((await rowOf(id)).lastUsedAt).toEqual(lastUsedAt);
    expect(found?.deadlines.endsInMs).toBeGreaterThan(0);
    expect(found?.deadlines.endsInMs).toBeLessThanOrEqual(5 * SECOND);
  });

  it("ends after its longest time however much it is used", async () => {
    const justNow = ago(SECOND);
    const over = await aSignIn({ startedAt: ago(LONGEST_MS + SECOND), lastUsedAt: justNow });
    expect(await use(over)).toBeNull();
    const under = await aSignIn({ startedAt: ago(LONGEST_MS - MINUTE), lastUsedAt: justNow });
    const found = await use(under);
    expect(found?.deadlines.endsInMs).toBeLessThanOrEqual(MINUTE);
    expect(found?.deadlines.idleEndsAt).toEqual(found?.deadlines.endsAt);
  });

  it("that ended does not come back with use", async () => {
    const id = await aSignIn({ lastUsedAt: ago(IDLE_MS + SECOND) });
    await use(id);
    await use(id);
    expect(await poll(id)).toBeNull();
  });

  it("ends at signing out, and only that one", async () => {
    const [one, other] = [await aSignIn(), await aSignIn()];
    await endSignIn(one);
    const { endedAt } = await rowOf(one);
    await endSignIn(one);
    expect((await rowOf(one)).endedAt).toEqual(endedAt);
    expect(await use(one)).toBeNull();
    expect(await use(other)).not.toBeNull();
  });

  it("ends with the activity of its person", async () => {
    const person = await asInvestigator();
    const id = await signInOf(person);
    await database().update(people).set({ isActive: false }).where(eq(people.id, person.id));
    expect(await use(id)).toBeNull();
  });

  it.each(["", "sin_nobody", "日本", "' or '1'='1", "\u0000", "x".repeat(10_000)])(
    "called %.20j is nobody's",
    async (id) => {
      expect(await use(id)).toBeNull();
      await endSignIn(id);
    },
  );

  it("has an id that nobody guesses", async () => {
    const ids = [await aSignIn(), await aSignIn(), await aSignIn()];
    expect(new Set(ids).size).toBe(3);
    for (const id of ids) expect(id.length).toBeGreaterThanOrEqual(24);
  });
});
