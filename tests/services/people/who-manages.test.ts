import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { organisations, people } from "@/db/schema";
import { addOrganisation } from "@/lib/people/add-organisation";
import { changePerson } from "@/lib/people/change-person";
import { invitePerson } from "@/lib/people/invite-person";
import { listOrganisations, listPeople } from "@/lib/people/list-people";
import { personRow } from "../../helpers/accounts";
import { queuedMails } from "../../helpers/mails";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

describe("managing people is for administrators alone", () => {
  it.each([
    ["a requester", asRequester],
    ["a technician", asTechnician],
    ["an investigator", asInvestigator],
    ["a lead engineer", asLead],
  ])("%s sees, invites, adds and changes nobody", async (_who, person) => {
    const [actor, other] = [await person(), await asAdministrator()];
    const deeds: Record<string, () => Promise<unknown>> = {
      list: () => listPeople(actor),
      organisations: () => listOrganisations(actor),
      invite: () =>
        invitePerson(actor, {
          name: "Eve Ring",
          email: "eve@example.test",
          role: "administrator",
          organisationId: other.organisationId,
        }),
      addClient: () => addOrganisation(actor, { name: "Eve's works" }),
      demote: () => changePerson(actor, { personId: other.id, role: "requester", isActive: false }),
      promote: () =>
        changePerson(actor, { personId: actor.id, role: "administrator", isActive: true }),
    };
    for (const [deed, does] of Object.entries(deeds)) {
      expect([deed, (await refusal(does())).code]).toEqual([deed, "NOT_ALLOWED"]);
    }
    expect(await queuedMails()).toEqual([]);
    expect((await personRow(other.id)).role).toBe("administrator");
    expect((await personRow(actor.id)).role).toBe(actor.role);
    const eve = await database().select().from(people).where(eq(people.email, "eve@example.test"));
    const works = await database()
      .select()
      .from(organisations)
      .where(eq(organisations.name, "Eve's works"));
    expect([eve, works]).toEqual([[], []]);
  });

  it("shows an administrator everyone, without a word of their passwords", async () => {
    await asRequester();
    const rows = await listPeople(await asAdministrator());
    expect(rows.length).toBeGreaterThanOrEqual(2);
    for (const row of rows) {
      expect(Object.keys(row)).not.toContain("passwordHash");
      expect(typeof row.hasPassword).toBe("boolean");
    }
  });
});
