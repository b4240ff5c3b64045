import "server-only";
import { asc, eq, inArray, and } from "drizzle-orm";
import { database } from "@/db/client";
import { people } from "@/db/schema";
import { LAB_ROLES, SEAT_ROLES, type Seat } from "@/lib/people/constants";

export type SeatChoices = Record<Seat, { value: string; label: string }[]>;

/** Who can take each seat of a case. The caller has asked the policy. */
export async function seatChoices(): Promise<SeatChoices> {
  const staff = await database()
    .select({ id: people.id, name: people.name, role: people.role })
    .from(people)
    .where(and(inArray(people.role, LAB_ROLES), eq(people.isActive, true)))
    .orderBy(asc(people.name));
  const of = (seat: Seat) =>
    staff
      .filter((person) => SEAT_ROLES[seat].includes(person.role))
      .map(({ id, name }) => ({ value: id, label: name }));
  return {
    lead: of("lead"),
    investigator: of("investigator"),
    secondReader: of("secondReader"),
    technician: of("technician"),
  };
}
