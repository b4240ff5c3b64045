"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Select } from "@/components/ui/select";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { formatDateTime } from "@/lib/format/dates";
import { DASH } from "@/lib/format/marks";
import { type OrganisationKind, type Role, ROLE_NAMES, ROLES } from "@/lib/people/constants";
import { roleFits } from "@/lib/people/schemas";
import { change } from "../actions";

type Row = {
  id: string;
  name: string;
  email: string;
  role: Role;
  organisationName: string;
  organisationKind: OrganisationKind;
  isActive: boolean;
  hasPassword: boolean;
  lastUsedAt: string | null;
};

export function PeopleTable({ people, ownId }: { people: Row[]; ownId: string }) {
  const form = useActionForm<void>();
  const set = (row: Row, to: Partial<Pick<Row, "role" | "isActive">>) =>
    form.send(
      () => change({ personId: row.id, role: row.role, isActive: row.isActive, ...to }),
      () => undefined,
    );
  return (
    <section className="min-w-0">
      {form.failure && (
        <Notice kind="bad" title="Nothing was changed" live="assertive">
          {form.fields.role ?? form.failure}
        </Notice>
      )}
      <Table caption="People who can sign in">
        <thead>
          <tr>
            <Th>Name</Th>
            <Th>E-mail</Th>
            <Th>Organisation</Th>
            <Th>Role</Th>
            <Th>Last use</Th>
            <Th>Account</Th>
          </tr>
        </thead>
        <tbody>
          {people.map((row) => (
            <Tr key={row.id}>
              <Td>{row.name}</Td>
              <Td>{row.email}</Td>
              <Td>{row.organisationName}</Td>
              <Td>
                {row.id === ownId ? (
                  ROLE_NAMES[row.role]
                ) : (
                  <Select
                    aria-label={`Role of ${row.name}`}
                    value={row.role}
                    disabled={form.isBusy}
                    onChange={(event) => {
                      const role = ROLES.find((known) => known === event.target.value);
                      if (role) set(row, { role });
                    }}
                    options={ROLES.filter((role) => roleFits(role, row.organisationKind)).map(
                      (role) => ({
                        value: role,
                        label: ROLE_NAMES[role],
                      }),
                    )}
                  />
                )}
              </Td>
              <Td>{row.lastUsedAt ? formatDateTime(row.lastUsedAt) : DASH}</Td>
              <Td>
                {row.id === ownId ? (
                  "You"
                ) : (
                  <Button
                    small
                    disabled={form.isBusy}
                    onClick={() => set(row, { isActive: !row.isActive })}
                  >
                    {row.isActive ? `Deactivate ${row.name}` : `Activate ${row.name}`}
                  </Button>
                )}
                {!row.hasPassword && <span className="ml-2 text-12 text-ink-3">invited</span>}
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
