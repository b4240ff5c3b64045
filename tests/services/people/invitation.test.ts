import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, people, personTokens } from "@/db/schema";
import { verifyChains } from "@/lib/audit/verify-chain";
import { checkPassword } from "@/lib/auth/check-password";
import { sha256Hex } from "@/lib/canonical-json";
import { addOrganisation } from "@/lib/people/add-organisation";
import { askForReset } from "@/lib/people/ask-for-reset";
import { CLIENT_ROLES, INVITATION_VALID_HOURS, ROLES } from "@/lib/people/constants";
import { invitePerson } from "@/lib/people/invite-person";
import { findToken } from "@/lib/people/person-token";
import { setPasswordWithToken } from "@/lib/people/set-password";
import { personByEmail, personRow, tokenIn } from "../../helpers/accounts";
import { whileFailing } from "../../helpers/failing-database";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import { asAdministrator, asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const PASSWORD = "four words in a row";
let made = 0;

async function anInvitation(change: Record<string, unknown> = {}) {
  const administrator = await asAdministrator();
  made += 1;
  return {
    name: "Nell Carrow",
    email: `nell.${made}@example.test`,
    role: "technician",
    organisationId: administrator.organisationId,
    ...change,
  };
}

async function anInvited(change: Record<string, unknown> = {}) {
  const invitation = await anInvitation(change);
  await emptyOutbox();
  const { personId } = await invitePerson(await asAdministrator(), invitation);
  const [mail] = await queuedMails();
  return { ...invitation, personId, mail, token: tokenIn(mail) };
}

const later = (token: string, expiresAt: Date) =>
  database()
    .update(personTokens)
    .set({ expiresAt })
    .where(eq(personTokens.digest, sha256Hex(token)));

beforeEach(emptyOutbox);

describe("an invitation", () => {
  it("goes to the one address, once, and keeps no more than a digest of its link", async () => {
    const { email, mail, token, personId } = await anInvited();
    expect(await queuedMails()).toHaveLength(1);
    expect(mail).toMatchObject({ to: email, subject: "Your invitation to Riverline" });
    expect(token.length).toBeGreaterThanOrEqual(43);
    const [kept] = await database()
      .select()
      .from(personTokens)
      .where(eq(personTokens.personId, personId));
    expect(kept).toMatchObject({ digest: sha256Hex(token), usedAt: null, kind: "invitation" });
    const hours = ((kept?.expiresAt.getTime() ?? 0) - Date.now()) / 3_600_000;
    expect(hours).toBeGreaterThan(INVITATION_VALID_HOURS - 0.1);
    expect(hours).toBeLessThanOrEqual(INVITATION_VALID_HOURS);
    const events = await database().select().from(auditEvents);
    expect(JSON.stringify(events)).not.toContain(token);
  });

  it("lets the person choose a password once, and then sign in", async () => {
    const { email, token, personId } = await anInvited();
    expect(await checkPassword(email, PASSWORD, "10.0.0.1")).toBeNull();
    expect(await findToken(token)).toMatchObject({ personId, email, kind: "invitation" });
    expect(await setPasswordWithToken({ token, password: PASSWORD })).toEqual({ email });
    expect(await checkPassword(email, PASSWORD, "10.0.0.1")).toMatchObject({ id: personId });
    expect(await findToken(token)).toBeNull();
    const again = await refusal(setPasswordWithToken({ token, password: "another one entirely" }));
    expect(again.code).toBe("NOT_ALLOWED");
    expect(again.message).toContain("has been used or is too old");
    expect(await checkPassword(email, PASSWORD, "10.0.0.1")).not.toBeNull();
  });

  it("used twice at once sets one password", async () => {
    const { email, token } = await anInvited();
    const passwords = ["the first of the two", "the second of the two"];
    const results = await Promise.allSettled(
      passwords.map((password) => setPasswordWithToken({ token, password })),
    );
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const won = results.findIndex(({ status }) => status === "fulfilled");
    expect(await checkPassword(email, passwords[won] ?? "", "10.0.0.1")).not.toBeNull();
    expect(await checkPassword(email, passwords[1 - won] ?? "", "10.0.0.1")).toBeNull();
  });

  it("ends after its time", async () => {
    const { email, token } = await anInvited();
    await later(token, new Date(Date.now() - 1000));
    expect(await findToken(token)).toBeNull();
    const found = await refusal(setPasswordWithToken({ token, password: PASSWORD }));
    expect(found.code).toBe("NOT_ALLOWED");
    expect((await personByEmail(email))?.passwordHash).toBeNull();
  });

  it("ends when the person is shut out before", async () => {
    const { token, personId } = await anInvited();
    await database().update(people).set({ isActive: false }).where(eq(people.id, personId));
    const found = await refusal(setPasswordWithToken({ token, password: PASSWORD }));
    expect(found.code).toBe("NOT_ALLOWED");
    expect((await personRow(personId)).passwordHash).toBeNull();
  });

  it("ends when the person has chosen a password by another link", async () => {
    const { email, token } = await anInvited();
    await emptyOutbox();
    await askForReset({ email }, "10.0.0.2");
    const [mail] = await queuedMails();
    await setPasswordWithToken({ token: tokenIn(mail), password: PASSWORD });
    const late = setPasswordWithToken({ token, password: "chosen with an old message" });
    expect((await refusal(late)).code).toBe("NOT_ALLOWED");
  });

  it.each([
    ["another one", "x".repeat(43), "NOT_ALLOWED"],
    ["database words", "' or 1=1 -- ' or 1=1 -- ", "NOT_ALLOWED"],
    ["foreign letters", "日".repeat(43), "NOT_ALLOWED"],
    ["one that is too short", "x", "INVALID"],
    ["one that is too long", "x".repeat(101), "INVALID"],
    ["a list", ["x".repeat(43)], "INVALID"],
    ["none", undefined, "INVALID"],
  ])("is not opened by %s", async (_name, token, code) => {
    const found = await refusal(setPasswordWithToken({ token, password: PASSWORD }));
    expect(found.code).toBe(code);
  });

  it("is not opened by its digest, nor by its link in other letters", async () => {
    const { token } = await anInvited();
    for (const wrong of [
      sha256Hex(token),
      token.toUpperCase(),
      token.toLowerCase(),
      `${token} `,
      `${token}=`,
    ]) {
      expect(await findToken(wrong)).toBeNull();
    }
  });

  it.each(["short", "x".repeat(11), "x".repeat(201), "", ["a list of words"]])(
    "takes no password like %.12j, and stays good",
    async (password) => {
      const { token } = await anInvited();
      const found = await refusal(setPasswordWithToken({ token, password }));
      expect(Object.keys(found.fields ?? {})).toEqual(["password"]);
      await setPasswordWithToken({ token, password: PASSWORD });
    },
  );
});

describe("whom an administrator can invite", () => {
  it("nobody whose e-mail is here already, in capitals either", async () => {
    const { email } = await anInvited();
    const administrator = await asAdministrator();
    for (const same of [email, email.toUpperCase()]) {
      const found = await refusal(invitePerson(administrator, await anInvitation({ email: same })));
      expect(found.fields).toEqual({ email: "Someone with this e-mail is here already." });
    }
    expect(await queuedMails()).toHaveLength(1);
  });

  it("one of two invitations to the same e-mail at once", async () => {
    const [administrator, invitation] = [await asAdministrator(), await anInvitation()];
    const results = await Promise.allSettled([
      invitePerson(administrator, invitation),
      invitePerson(administrator, invitation),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = results.find((result) => result.status === "rejected");
    expect(lost?.reason).toMatchObject({ code: "INVALID" });
    expect(await queuedMails()).toHaveLength(1);
  });

  it("into no organisation that is not there", async () => {
    for (const organisationId of ["org_nobody", "日本", "", undefined]) {
      const found = await refusal(
        invitePerson(await asAdministrator(), await anInvitation({ organisationId })),
      );
      expect(Object.keys(found.fields ?? {})).toEqual(["organisationId"]);
    }
  });

  it("into a client's organisation as requester alone", async () => {
    const { organisationId } = await asRequester();
    for (const role of ROLES) {
      const inviting = invitePerson(
        await asAdministrator(),
        await anInvitation({ organisationId, role }),
      );
      if (CLIENT_ROLES.includes(role)) await inviting;
      else {
        expect((await refusal(inviting)).fields).toEqual({
          role: "A client's people can only be requesters.",
        });
      }
    }
  });

  it.each([
    ["name", { name: "N" }],
    ["name", { name: "x".repeat(201) }],
    ["email", { email: "nell" }],
    ["email", { email: "nell@example.test, eve@example.test" }],
    ["email", { email: "nell@example.test\r\nBcc: eve@example.test" }],
    ["email", { email: "Nell <nell@example.test>" }],
    ["email", { email: `${"x".repeat(250)}@example.test` }],
    ["role", { role: "owner" }],
    ["role", { role: undefined }],
  ])("nobody with a wrong %s: %.60j", async (field, change) => {
    const found = await refusal(invitePerson(await asAdministrator(), await anInvitation(change)));
    expect(Object.keys(found.fields ?? {})).toEqual([field]);
    expect(await queuedMails()).toEqual([]);
  });

  it.each(["x".repeat(200), "Zoë 🪛 Ötvös", "<b>Nell</b>", "Nell\r\nBcc: eve@example.test"])(
    "people whose name is %.40j, and the log stays whole",
    async (name) => {
      const { personId } = await anInvited({ name });
      expect((await personRow(personId)).name).toBe(name);
      expect((await verifyChains("installation")).faults).toEqual([]);
    },
  );

  it("nobody at all when the mail cannot be put into the outbox", async () => {
    const [administrator, invitation] = [await asAdministrator(), await anInvitation()];
    await expect(
      whileFailing("outbox", () => invitePerson(administrator, invitation)),
    ).rejects.toThrow();
    expect(await personByEmail(invitation.email)).toBeNull();
  });

  it("people of clients whose name is long, and each client once", async () => {
    const administrator = await asAdministrator();
    const name = `Works of ${"x".repeat(180)}`;
    await addOrganisation(administrator, { name });
    const found = await refusal(addOrganisation(administrator, { name: name.toUpperCase() }));
    expect(found.fields).toHaveProperty("name");
  });
});
