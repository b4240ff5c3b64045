import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, throttles } from "@/db/schema";
import { checkPassword, THROTTLED } from "@/lib/auth/check-password";
import { addressOf, TRIES_PER_ACCOUNT, TRIES_PER_ADDRESS } from "@/lib/auth/throttle";
import { givePassword } from "../../helpers/accounts";
import { asInvestigator, asLead } from "../../helpers/people";

const PASSWORD = "a long pass phrase";
const WINDOW_MINUTES = 15;

beforeEach(async () => {
  await database().delete(throttles);
  await givePassword(await asLead(), PASSWORD);
  await givePassword(await asInvestigator(), PASSWORD);
});

let callers = 0;
/** An address that has not called before. */
const anAddress = () => {
  callers += 1;
  return `10.1.${callers >> 8}.${callers & 255}`;
};

async function fail(email: string, times: number, address?: string) {
  for (let i = 0; i < times; i += 1) {
    expect(await checkPassword(email, "wrong", address ?? anAddress())).toBeNull();
  }
}

const isShut = (email: string, password = PASSWORD, address = anAddress()) =>
  checkPassword(email, password, address).then(
    () => false,
    (error: unknown) => {
      if (error instanceof Error && error.message === THROTTLED) return true;
      throw error;
    },
  );

const letPass = (minutes: number) =>
  database()
    .update(throttles)
    .set({ windowStartedAt: new Date(Date.now() - minutes * 60_000) });

describe("an account", () => {
  it(`is shut after ${TRIES_PER_ACCOUNT} wrong passwords from anywhere, to the right one too`, async () => {
    const { email } = await asLead();
    await fail(email, TRIES_PER_ACCOUNT - 1);
    expect(await isShut(email)).toBe(false);
    await fail(email, TRIES_PER_ACCOUNT);
    expect(await isShut(email)).toBe(true);
    expect(await isShut((await asInvestigator()).email)).toBe(false);
  });

  it("opens again after its time, with all its tries", async () => {
    const { email } = await asLead();
    await fail(email, TRIES_PER_ACCOUNT);
    await letPass(WINDOW_MINUTES - 1);
    expect(await isShut(email)).toBe(true);
    await letPass(WINDOW_MINUTES + 1);
    await fail(email, TRIES_PER_ACCOUNT - 1);
    expect(await isShut(email)).toBe(false);
  });

  it("is not shut for longer by those who go on trying", async () => {
    const { email } = await asLead();
    await fail(email, TRIES_PER_ACCOUNT);
    for (let i = 0; i < 20; i += 1) expect(await isShut(email, "wrong")).toBe(true);
    await letPass(WINDOW_MINUTES + 1);
    expect(await isShut(email)).toBe(false);
  });

  it("has all its tries again after the right password", async () => {
    const { email } = await asLead();
    for (let round = 1; round <= 3; round += 1) {
      await fail(email, TRIES_PER_ACCOUNT - 1);
      expect(await isShut(email)).toBe(false);
    }
  });

  it("is one account however its name is spelled", async () => {
    const { email } = await asLead();
    const spellings = [
      email,
      email.toUpperCase(),
      ` ${email} `,
      email.replace("e", "é"),
      email.replace("a", "å"),
      email.replace("l", "ｌ"),
      email.replace("e", "E\u0301"),
      `${email}\u200b`,
    ];
    for (const spelling of [...spellings, ...spellings].slice(0, TRIES_PER_ACCOUNT)) {
      await fail(spelling, 1);
    }
    expect(await isShut(email)).toBe(true);
  });

  it("has no more tries when they come at the same time", async () => {
    const { email } = await asLead();
    const results = await Promise.allSettled(
      Array.from({ length: 24 }, () => checkPassword(email, "wrong", anAddress())),
    );
    const looked = results.filter(({ status }) => status === "fulfilled");
    expect(looked.length).toBeLessThanOrEqual(TRIES_PER_ACCOUNT);
    expect(await isShut(email)).toBe(true);
  });

  it("that is not there is shut in the same way", async () => {
    await fail("nobody@example.test", TRIES_PER_ACCOUNT);
    expect(await isShut("nobody@example.test")).toBe(true);
  });

  it("is not looked up with a password of 10 million letters, and that is a wrong one", async () => {
    expect(await checkPassword((await asLead()).email, "x".repeat(10_000_000), anAddress())).toBe(
      null,
    );
  });

  it.each(["", "' or 1=1 --", "\u0000", "日本", "x".repeat(10_000)])(
    "named %.20j is nobody's",
    async (email) => {
      expect(await checkPassword(email, PASSWORD, anAddress())).toBeNull();
    },
  );
});

describe("an address", () => {
  it(`is shut after ${TRIES_PER_ADDRESS} wrong passwords for whatever account`, async () => {
    const address = anAddress();
    for (let i = 0; i < TRIES_PER_ADDRESS; i += 1) {
      await fail(`nobody.${i}@example.test`, 1, address);
    }
    const { email } = await asLead();
    expect(await isShut(email, PASSWORD, address)).toBe(true);
    expect(await isShut(email)).toBe(false);
    await letPass(WINDOW_MINUTES + 1);
    expect(await isShut(email, PASSWORD, address)).toBe(false);
  });

  it("is not shut by those who know their password", async () => {
    const address = anAddress();
    const { email } = await asLead();
    for (let i = 0; i < TRIES_PER_ADDRESS + 5; i += 1) {
      expect(await isShut(email, PASSWORD, address)).toBe(false);
    }
  });

  it("is the first that the header names, and never a failure", () => {
    expect(addressOf({ "x-forwarded-for": "10.0.0.1, 10.0.0.2" })).toBe("10.0.0.1");
    expect(addressOf({ "x-forwarded-for": ["10.0.0.1", "10.0.0.2"] })).toBe("10.0.0.1");
    expect(addressOf({ "x-forwarded-for": "" })).toBe("unknown");
    expect(addressOf({})).toBe("unknown");
  });
});

it("leaves an event for a sign-in, and none with a password in it", async () => {
  const lead = await asLead();
  await checkPassword(lead.email, "a guess that is wrong", anAddress());
  await checkPassword(lead.email, PASSWORD, anAddress());
  const events = await database().select().from(auditEvents);
  expect(events.filter(({ action }) => action === "system.signIn").length).toBeGreaterThan(0);
  expect(JSON.stringify(events)).not.toContain("a guess that is wrong");
  expect(JSON.stringify(events)).not.toContain(PASSWORD);
});
