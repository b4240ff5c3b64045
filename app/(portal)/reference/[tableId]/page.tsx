import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { MAIN_ID } from "@/components/frame/skip-link";
import { Facts } from "@/components/ui/facts";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { Tag } from "@/components/ui/tag";
import { formatDate } from "@/lib/format/dates";
import { MATERIAL_GROUPS } from "@/lib/hardness/material-groups";
import { getTable, isTableId } from "@/lib/hardness/published-tables";
import { pageActor } from "@/lib/http/page";
import { TIER_NAMES } from "@/lib/reference/constants";
import { listTables } from "@/lib/reference/list-tables";
import { routes } from "@/lib/routes";
import { ConvertForm } from "../_components/convert-form";
import { SwitchButton } from "../_components/switch-button";
import { TableRows } from "../_components/table-rows";

export const metadata: Metadata = { title: "Conversion table" };

export default async function ReferenceTablePage({
  params,
}: {
  params: Promise<{ tableId: string }>;
}) {
  const actor = await pageActor("reference.view");
  const { tableId } = await params;
  if (!isTableId(tableId)) notFound();
  const { tables, maySwitch } = await listTables(actor);
  const isOn = tables.some(({ id, isOn }) => id === tableId && isOn);
  const table = getTable(tableId);
  return (
    <main id={MAIN_ID} tabIndex={-1} className="pb-8">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2 px-4 pt-3.5 pb-2.5">
        <h1 className="text-19 font-head">
          {table.standard}, {table.tableNumber}
        </h1>
        <span className="text-ink-3">
          {MATERIAL_GROUPS[table.materialGroup].name}. Edition {table.edition}.
        </span>
        <span className="ml-auto flex items-center gap-2">
          {isOn ? <Tag kind="met">In use at this laboratory</Tag> : <Tag>Switched off</Tag>}
          {maySwitch ? <SwitchButton tableId={tableId} isOn={isOn} /> : null}
          <Link href={routes.reference()}>All tables</Link>
        </span>
      </div>
      <div className="grid items-start gap-4 px-4 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <Panel className="min-w-0">
          <PanelHead title="Convert one value" />
          <PanelBody>
            {isOn ? (
              <ConvertForm table={table} tableId={tableId} />
            ) : (
              <p className="text-13 text-ink-2">
                Nothing is converted by this table while it is switched off.
              </p>
            )}
          </PanelBody>
          <TableRows table={table} />
        </Panel>
        <div className="grid gap-4">
          <Notice kind="warn">
            A converted value is an estimate. It is always shown second, with ≈ and this table’s
            name, and never decides a requirement stated in another scale.
          </Notice>
          <Panel>
            <PanelHead title="Where it holds" />
            <PanelBody>
              <p className="text-13 text-ink-2">{table.holdsFor}</p>
              <p className="mt-2 text-13 text-ink-2">{table.caution}</p>
            </PanelBody>
          </Panel>
          <Panel>
            <PanelHead title="Where the figures come from" />
            <PanelBody>
              <Facts
                facts={[
                  { name: "Checked", value: `${table.tier}: ${TIER_NAMES[table.tier]}` },
                  { name: "On", value: formatDate(table.checked) },
                ]}
              />
              <p className="mt-2 text-13 text-ink-2">{table.source}</p>
              {table.doubts.length > 0 ? (
                <>
                  <h3 className="mt-3 text-13 font-strong">To look up in the standard</h3>
                  <ul className="list-disc pl-4 text-13 text-ink-2">
                    {table.doubts.map((doubt) => (
                      <li key={doubt}>{doubt}</li>
                    ))}
                  </ul>
                </>
              ) : null}
            </PanelBody>
          </Panel>
        </div>
      </div>
    </main>
  );
}
