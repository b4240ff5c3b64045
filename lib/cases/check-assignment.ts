import "server-only";
import { inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { people } from "@/db/schema";
import { AppError, type FieldErrors } from "@/lib/errors";
import { dayIn } from "@/lib/intake/moment";
import { LABORATORY_TIME_ZONE } from "@/lib/format/dates";
import { SEAT_NAMES, SEAT_ROLES, type Seat } from "@/lib/people/constants";
import type { Assignment } from "./schemas";
import type { CaseRow } from "./subject";

export type Named = { id: string; name: string; email: string };

/**
 * The people of an assignment, checked: active, of a role that can take the seat, and none of the
 * client's own. Second reader, investigator and lead are three people.
 * @throws AppError INVALID with one sentence for each seat
 */
export async function checkAssignment(
  tx: Transaction,
  row: Pick<CaseRow, "organisationId" | "dueOn">,
  chosen: Assignment,
): Promise<Map<string, Named>> {
  const seats: [keyof Assignment, Seat, string][] = [
    ["leadId", "lead", chosen.leadId],
    ["investigatorId", "investigator", chosen.investigatorId],
    ...(chosen.secondReaderId
      ? [
          ["secondReaderId", "secondReader", chosen.secondReaderId] satisfies [
            keyof Assignment,
            Seat,
            string,
          ],
        ]
      : []),
    ...chosen.technicianIds.map(
      (id) => ["technicianIds", "technician", id] satisfies [keyof Assignment, Seat, string],
    ),
  ];
  const found = await tx
    .select()
    .from(people)
    .where(inArray(people.id, [...new Set(seats.map(([, , id]) => id))]));
  const byId = new Map(found.map((person) => [person.id, person]));
  const fields: FieldErrors = {};
  for (const [field, seat, id] of seats) {
    const person = byId.get(id);
    if (person?.organisationId === row.organisationId) {
      fields[field] ??= `${person.name} belongs to the client and cannot take part in the case.`;
    } else if (!person?.isActive || !SEAT_ROLES[seat].includes(person.role)) {
      fields[field] ??=
        `${person?.name ?? "This person"} cannot be ${SEAT_NAMES[seat].toLowerCase()} here. Choose another.`;
    }
  }
  if (chosen.leadId === chosen.investigatorId) {
    fields.leadId ??= "The investigator writes the report, so someone else has to sign it.";
  }
  if (
    chosen.secondReaderId &&
    [chosen.leadId, chosen.investigatorId].includes(chosen.secondReaderId)
  ) {
    fields.secondReaderId ??=
      "The second reader is neither the investigator nor the lead engineer.";
  }
  const isNewDay = chosen.dueOn !== row.dueOn;
  if (isNewDay && chosen.dueOn < dayIn(LABORATORY_TIME_ZONE, new Date())) {
    fields.dueOn ??= "This day has passed.";
  }
  if (Object.keys(fields).length > 0) throw new AppError("INVALID", undefined, { fields });
  return new Map(found.map(({ id, name, email }) => [id, { id, name, email }]));
}
