import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, people } from "@/db/schema";
import { checkPassword } from "@/lib/auth/check-password";
import { findSignIn } from "@/lib/auth/sign-ins";
import { changePerson } from "@/lib/people/change-person";
import { ROLES } from "@/lib/people/constants";
import { givePassword, personRow, signInOf } from "../../helpers/accounts";
import { whileFailing } from "../../helpers/failing-database";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const asNextRequest = (signInId: string) => findSignIn(signInId, { countsAsUse: true });

/** Everyone as they were, and one administrator. */
beforeEach(async () => {
  for (const actor of [
    await asAdministrator(),
    await asTechnician(),
    await asInvestigator(),
    await asRequester(),
  ]) {
    await database()
      .update(people)
      .set({ role: actor.role, isActive: true })
      .where(eq(people.id, actor.id));
  }
});

const aSecondAdministrator = async () => {
  const second = await aPerson("Second Administrator", "administrator");
  await database()
    .update(people)
    .set({ role: "administrator", isActive: true })
    .where(eq(people.id, second.id));
  return second;
};

describe("changing a person", () => {
  it("gives another role at that person's next request", async () => {
    const technician = await asTechnician();
    const before = await signInOf(technician);
    expect((await asNextRequest(before))?.actor.role).toBe("technician");
    await changePerson(await asAdministrator(), {
      personId: technician.id,
      role: "investigator",
      isActive: true,
    });
    expect(await asNextRequest(before)).toBeNull();
    const after = await signInOf(technician);
    expect((await asNextRequest(after))?.actor.role).toBe("investigator");
  });

  it("shuts a person out at the next request, and lets nobody sign in as them", async () => {
    const technician = await asTechnician();
    await givePassword(technician, "a long pass phrase");
    const signIn = await signInOf(technician);
    const out = { personId: technician.id, role: "technician", isActive: false };
    await changePerson(await asAdministrator(), out);
    expect(await asNextRequest(signIn)).toBeNull();
    expect(await checkPassword(technician.email, "a long pass phrase", "10.0.0.1")).toBeNull();
    await changePerson(await asAdministrator(), { ...out, isActive: true });
    expect(await asNextRequest(signIn)).toBeNull();
    expect(await checkPassword(technician.email, "a long pass phrase", "10.0.0.1")).not.toBeNull();
  });

  it("leaves what it was and what it is in the log", async () => {
    const technician = await asTechnician();
    const change = { personId: technician.id, role: "lead", isActive: true };
    await changePerson(await asAdministrator(), change);
    const events = await database()
      .select()
      .from(auditEvents)
      .where(eq(auditEvents.subjectId, technician.id));
    expect(events.at(-1)).toMatchObject({
      action: "person.change",
      actorId: (await asAdministrator()).id,
      before: { role: "technician", isActive: true },
      after: { role: "lead", isActive: true },
    });
  });

  it("is undone when it cannot be written to the log", async () => {
    const [administrator, technician] = [await asAdministrator(), await asTechnician()];
    const signIn = await signInOf(technician);
    const change = { personId: technician.id, role: "lead", isActive: false };
    await expect(
      whileFailing("auditLog", () => changePerson(administrator, change)),
    ).rejects.toThrow();
    expect(await personRow(technician.id)).toMatchObject({ role: "technician", isActive: true });
    expect(await asNextRequest(signIn)).not.toBeNull();
  });

  it.each(ROLES.filter((role) => role !== "requester"))(
    "gives nobody of a client the role %s",
    async (role) => {
      const requester = await asRequester();
      const found = await refusal(
        changePerson(await asAdministrator(), { personId: requester.id, role, isActive: true }),
      );
      expect(found.fields).toEqual({ role: "A client's people can only be requesters." });
      expect((await personRow(requester.id)).role).toBe("requester");
    },
  );

  it.each([
    ["nobody", { personId: "per_nobody" }, "NOT_FOUND"],
    ["foreign letters", { personId: "日本" }, "NOT_FOUND"],
    ["a role that is none", { role: "owner" }, "INVALID"],
    ["a role from a prototype", { role: "constructor" }, "INVALID"],
    ["activity as a word", { isActive: "yes" }, "INVALID"],
    ["a list of people", { personId: ["per_1", "per_2"] }, "INVALID"],
  ])("refuses %s", async (_name, change, code) => {
    const technician = await asTechnician();
    const input = { personId: technician.id, role: "lead", isActive: true, ...change };
    expect((await refusal(changePerson(await asAdministrator(), input))).code).toBe(code);
  });
});

describe("the last administrator", () => {
  it("cannot change themselves", async () => {
    const administrator = await asAdministrator();
    for (const change of [
      { role: "lead", isActive: true },
      { role: "administrator", isActive: false },
    ]) {
      const found = await refusal(
        changePerson(administrator, { personId: administrator.id, ...change }),
      );
      expect(found.code).toBe("NOT_ALLOWED");
    }
    expect(await personRow(administrator.id)).toMatchObject({
      role: "administrator",
      isActive: true,
    });
  });

  it.each([
    { role: "technician", isActive: true },
    { role: "administrator", isActive: false },
  ])("is not removed by one who was an administrator a moment ago: %j", async (change) => {
    const [administrator, former] = [await asAdministrator(), await aSecondAdministrator()];
    await changePerson(administrator, { personId: former.id, role: "technician", isActive: true });
    const found = await refusal(changePerson(former, { personId: administrator.id, ...change }));
    expect(found.code).toBe("NOT_ALLOWED");
    expect(await personRow(administrator.id)).toMatchObject({
      role: "administrator",
      isActive: true,
    });
  });

  it("remains when two remove one another at once", async () => {
    for (let round = 1; round <= 5; round += 1) {
      const [one, two] = [await asAdministrator(), await aSecondAdministrator()];
      await database().update(people).set({ isActive: true }).where(eq(people.id, one.id));
      const results = await Promise.allSettled([
        changePerson(one, { personId: two.id, role: "administrator", isActive: false }),
        changePerson(two, { personId: one.id, role: "administrator", isActive: false }),
      ]);
      const lost = results.filter((result) => result.status === "rejected");
      expect(lost.map(({ reason }) => reason as unknown)).toEqual([
        expect.objectContaining({ code: "NOT_ALLOWED" }),
      ]);
      const left = await database().select().from(people).where(eq(people.role, "administrator"));
      expect(left.filter(({ isActive }) => isActive)).toHaveLength(1);
    }
  });

  it("who is not the last can be changed", async () => {
    const second = await aSecondAdministrator();
    const change = { personId: second.id, role: "technician", isActive: true };
    await changePerson(await asAdministrator(), change);
    expect((await personRow(second.id)).role).toBe("technician");
  });
});
