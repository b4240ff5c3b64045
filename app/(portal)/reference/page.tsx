import type { Metadata } from "next";
import Link from "next/link";
import { PageHeader } from "@/components/frame/page-header";
import { MAIN_ID } from "@/components/frame/skip-link";
import { Panel } from "@/components/ui/panel";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { Tag } from "@/components/ui/tag";
import { MATERIAL_GROUPS } from "@/lib/hardness/material-groups";
import { getTable } from "@/lib/hardness/published-tables";
import { pageActor } from "@/lib/http/page";
import { TIER_NAMES } from "@/lib/reference/constants";
import { listTables } from "@/lib/reference/list-tables";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Reference" };

export default async function ReferencePage() {
  const actor = await pageActor("reference.view");
  const { tables } = await listTables(actor);
  return (
    <main id={MAIN_ID} tabIndex={-1} className="pb-8">
      <PageHeader title="Reference" note="Published tables for hardness conversion" />
      <Panel className="mx-4">
        <Table caption="Published conversion tables">
          <thead>
            <tr>
              <Th>Table</Th>
              <Th>Edition</Th>
              <Th>Holds for</Th>
              <Th>How far the figures are checked</Th>
              <Th>At this laboratory</Th>
            </tr>
          </thead>
          <tbody>
            {tables.map(({ id, isOn }) => {
              const table = getTable(id);
              return (
                <Tr key={id}>
                  <Td>
                    <Link href={routes.referenceTable(id)} className="font-strong">
                      {table.standard}, {table.tableNumber}
                    </Link>
                  </Td>
                  <Td>{table.edition}</Td>
                  <Td>{MATERIAL_GROUPS[table.materialGroup].name}</Td>
                  <Td className="text-ink-2">
                    {table.tier}: {TIER_NAMES[table.tier]}
                  </Td>
                  <Td>{isOn ? <Tag kind="met">In use</Tag> : <Tag>Switched off</Tag>}</Td>
                </Tr>
              );
            })}
          </tbody>
        </Table>
      </Panel>
      <p className="max-w-text px-4 pt-3 text-13 text-ink-2">
        A table that is switched off is neither offered nor used, whoever asks. Figures from memory
        are shipped switched off until someone has compared them with a copy of the standard.
      </p>
    </main>
  );
}
