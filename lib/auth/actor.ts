import type { OrganisationKind, Role } from "@/lib/people/constants";

/** The signed-in person, read from the database at each request. */
export type Actor = {
  id: string;
  name: string;
  email: string;
  role: Role;
  organisationId: string;
  organisationName: string;
  organisationKind: OrganisationKind;
};
