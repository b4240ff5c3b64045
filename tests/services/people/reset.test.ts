import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, people, personTokens, throttles } from "@/db/schema";
import { checkPassword } from "@/lib/auth/check-password";
import { findSignIn } from "@/lib/auth/sign-ins";
import { TRIES_PER_ACCOUNT, TRIES_PER_ADDRESS } from "@/lib/auth/throttle";
import { sha256Hex } from "@/lib/canonical-json";
import { askForReset } from "@/lib/people/ask-for-reset";
import { changeOwnPassword, setPasswordWithToken } from "@/lib/people/set-password";
import { givePassword, personRow, signInOf, tokenIn } from "../../helpers/accounts";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import { asInvestigator, asLead } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const OLD = "the old pass phrase";
const NEW = "the new pass phrase";
const AT = "10.0.0.1";

beforeEach(async () => {
  await emptyOutbox();
  await database().delete(throttles);
  await givePassword(await asLead(), OLD);
});

async function aLink() {
  await emptyOutbox();
  await askForReset({ email: (await asLead()).email }, AT);
  return tokenIn((await queuedMails())[0]);
}

describe("asking for a new password", () => {
  it("answers the same for a known, an unknown and a shut-out address, and mails the known alone", async () => {
    const [lead, gone] = [await asLead(), await asInvestigator()];
    await database().update(people).set({ isActive: false }).where(eq(people.id, gone.id));
    const answers = [];
    for (const email of [lead.email, "nobody@example.test", gone.email]) {
      answers.push(await askForReset({ email }, AT));
    }
    expect(answers).toEqual([undefined, undefined, undefined]);
    const mails = await queuedMails();
    expect(mails.map(({ to }) => to)).toEqual([lead.email]);
    expect(mails[0]?.subject).toBe("A new password for Riverline");
  });

  it("goes to the address that is kept, however it was typed", async () => {
    const lead = await asLead();
    await askForReset({ email: lead.email.toUpperCase() }, AT);
    expect((await queuedMails()).map(({ to }) => to)).toEqual([lead.email]);
  });

  it("leaves the old password good, and nothing secret in the log", async () => {
    const token = await aLink();
    expect(await checkPassword((await asLead()).email, OLD, AT)).not.toBeNull();
    const events = JSON.stringify(await database().select().from(auditEvents));
    expect(events).not.toContain(token);
    expect(events).not.toContain(sha256Hex(token));
  });

  it("is counted for each address of mail, known or not, and let go after its time", async () => {
    for (const email of [(await asLead()).email, "nobody@example.test"]) {
      for (let i = 0; i < TRIES_PER_ACCOUNT; i += 1) await askForReset({ email }, `10.0.1.${i}`);
      const found = await refusal(askForReset({ email }, "10.0.1.99"));
      expect([email, found.code]).toEqual([email, "TOO_MANY"]);
    }
    await database()
      .update(throttles)
      .set({ windowStartedAt: new Date(Date.now() - 16 * 60_000) });
    await askForReset({ email: (await asLead()).email }, "10.0.1.99");
  });

  it("is counted for each caller", async () => {
    for (let i = 0; i < TRIES_PER_ADDRESS; i += 1) {
      await askForReset({ email: `nobody.${i}@example.test` }, AT);
    }
    const found = await refusal(askForReset({ email: "somebody@example.test" }, AT));
    expect(found.code).toBe("TOO_MANY");
    await askForReset({ email: "somebody@example.test" }, "10.0.0.2");
  });

  it.each([
    "nobody",
    "",
    "a@b.example, c@d.example",
    "a@b.example\r\nBcc: eve@example.test",
    `${"x".repeat(10_000_000)}@example.test`,
    ["a@b.example"],
    null,
  ])("is refused for what is no address: %.40j", async (email) => {
    const found = await refusal(askForReset({ email }, AT));
    expect(Object.keys(found.fields ?? {})).toEqual(["email"]);
    expect(await queuedMails()).toEqual([]);
  });
});

describe("the link for a new password", () => {
  it("works once, and ends every sign-in of the person", async () => {
    const lead = await asLead();
    const [one, two] = [await signInOf(lead), await signInOf(lead)];
    const token = await aLink();
    await setPasswordWithToken({ token, password: NEW });
    for (const signIn of [one, two]) {
      expect(await findSignIn(signIn, { countsAsUse: true })).toBeNull();
    }
    expect(await checkPassword(lead.email, OLD, AT)).toBeNull();
    expect(await checkPassword(lead.email, NEW, AT)).toMatchObject({ id: lead.id });
    const again = setPasswordWithToken({ token, password: "a third pass phrase" });
    expect((await refusal(again)).code).toBe("NOT_ALLOWED");
  });

  it("leaves the sign-ins of others as they are", async () => {
    const other = await asInvestigator();
    await database().update(people).set({ isActive: true }).where(eq(people.id, other.id));
    const theirs = await signInOf(other);
    await setPasswordWithToken({ token: await aLink(), password: NEW });
    expect(await findSignIn(theirs, { countsAsUse: true })).not.toBeNull();
  });

  it("ends when a newer one is asked for", async () => {
    const [first, second] = [await aLink(), await aLink()];
    const late = setPasswordWithToken({ token: first, password: NEW });
    expect((await refusal(late)).code).toBe("NOT_ALLOWED");
    await setPasswordWithToken({ token: second, password: NEW });
  });

  it("ends after two hours", async () => {
    const token = await aLink();
    const [kept] = await database()
      .select()
      .from(personTokens)
      .where(eq(personTokens.digest, sha256Hex(token)));
    const minutes = ((kept?.expiresAt.getTime() ?? 0) - Date.now()) / 60_000;
    expect(minutes).toBeGreaterThan(119);
    expect(minutes).toBeLessThanOrEqual(120);
    await database()
      .update(personTokens)
      .set({ expiresAt: new Date(Date.now() - 1) });
    const late = setPasswordWithToken({ token, password: NEW });
    expect((await refusal(late)).code).toBe("NOT_ALLOWED");
  });

  it("ends when the password was changed meanwhile", async () => {
    const lead = await asLead();
    const token = await aLink();
    await changeOwnPassword(lead, { current: OLD, password: NEW });
    const late = setPasswordWithToken({ token, password: "of an old message" });
    expect((await refusal(late)).code).toBe("NOT_ALLOWED");
  });

  it("lets an account that is throttled sign in again", async () => {
    const { email } = await asLead();
    const token = await aLink();
    for (let i = 0; i < TRIES_PER_ACCOUNT; i += 1) await checkPassword(email, "wrong", AT);
    await expect(checkPassword(email, OLD, AT)).rejects.toThrow("THROTTLED");
    await setPasswordWithToken({ token, password: NEW });
    expect(await checkPassword(email, NEW, AT)).not.toBeNull();
  });
});

describe("changing one's own password", () => {
  it("asks for the present one, and ends every sign-in", async () => {
    const lead = await asLead();
    const signIn = await signInOf(lead);
    const wrong = await refusal(changeOwnPassword(lead, { current: NEW, password: NEW }));
    expect(wrong.fields).toEqual({ current: "This is not your present password." });
    expect(await findSignIn(signIn, { countsAsUse: true })).not.toBeNull();
    await changeOwnPassword(lead, { current: OLD, password: NEW });
    expect(await findSignIn(signIn, { countsAsUse: true })).toBeNull();
    expect(await checkPassword(lead.email, NEW, AT)).not.toBeNull();
  });

  it("is not possible for someone who never had one", async () => {
    const lead = await asLead();
    await database().update(people).set({ passwordHash: null }).where(eq(people.id, lead.id));
    const found = await refusal(changeOwnPassword(lead, { current: "", password: NEW }));
    expect(found.fields).toHaveProperty("current");
    const guess = await refusal(changeOwnPassword(lead, { current: "guess", password: NEW }));
    expect(guess.fields).toHaveProperty("current");
    expect((await personRow(lead.id)).passwordHash).toBeNull();
  });
});
