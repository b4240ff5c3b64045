"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { addOrganisation } from "@/lib/people/add-organisation";
import { changePerson } from "@/lib/people/change-person";
import { invitePerson } from "@/lib/people/invite-person";
import { AddOrganisationInput, ChangePersonInput, InvitePersonInput } from "@/lib/people/schemas";
import { routes } from "@/lib/routes";

export const invite = action(
  { permission: "person.invite", input: InvitePersonInput },
  async (actor, input) => {
    await invitePerson(actor, input);
    revalidatePath(routes.people());
  },
);

export const addClient = action(
  { permission: "person.invite", input: AddOrganisationInput },
  async (actor, input) => {
    await addOrganisation(actor, input);
    revalidatePath(routes.people());
  },
);

export const change = action(
  { permission: "person.change", input: ChangePersonInput },
  async (actor, input) => {
    await changePerson(actor, input);
    revalidatePath(routes.people());
  },
);
