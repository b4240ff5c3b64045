import { Fragment } from "react";
import Link from "next/link";
import { Dash } from "@/components/ui/dash";
import { DueFlag } from "@/components/ui/due-flag";
import { GateMark } from "@/components/ui/gate-mark";
import { GroupRow, SortTh, Table, Td, Th, Tr } from "@/components/ui/table";
import { TemperStrip } from "@/components/ui/temper-strip";
import { GATE_COUNT, STAGE_OF_STATE } from "@/lib/cases/constants";
import { dueGroup } from "@/lib/cases/due-group";
import { type ListParams, listQuery, type Sort } from "@/lib/cases/list-params";
import type { CaseListRow } from "@/lib/cases/list-row";
import { formatDay, formatRecent } from "@/lib/format/dates";
import { routes } from "@/lib/routes";

type Props = {
  list: { rows: CaseListRow[]; next: string | null };
  params: ListParams;
  showsClient: boolean;
  now: Date;
};

const HEADS: { sort: Sort | null; label: string; numeric?: boolean; hidden?: string }[] = [
  { sort: "number", label: "Case" },
  { sort: "title", label: "Part and failure" },
  { sort: null, label: "Client" },
  { sort: null, label: "Material", hidden: "max-lg:hidden" },
  { sort: "stage", label: "Stage" },
  { sort: null, label: "Investigator" },
  { sort: null, label: "Items", numeric: true, hidden: "max-2xl:hidden" },
  { sort: null, label: "Gates", hidden: "max-lg:hidden" },
  { sort: "due", label: "Due" },
  { sort: "changed", label: "Changed", hidden: "max-2xl:hidden" },
];

function Gates({ row }: { row: CaseListRow }) {
  if (STAGE_OF_STATE[row.state] === 0) return <Dash words="no gates" />;
  const isMet = row.openGateCount === 0;
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <GateMark met={isMet} />
      <span className={isMet ? "text-ink-3" : undefined}>
        {isMet ? "all met" : `${Math.min(row.openGateCount, GATE_COUNT)} open`}
      </span>
    </span>
  );
}

function Due({ row, now }: { row: CaseListRow; now: Date }) {
  if (row.dueOn === null) return <Dash words="no due date" />;
  if (row.signedAt === null) return <DueFlag due={row.dueOn} now={now} />;
  const onTime = row.signedAt.slice(0, 10) <= row.dueOn;
  return (
    <span className="tn whitespace-nowrap">
      {formatDay(row.dueOn)}{" "}
      <span className="text-ink-3">{onTime ? "signed on time" : "signed late"}</span>
    </span>
  );
}

/** Cases in one table; sorted by due date they stand in groups. */
export function CaseTable({ list, params, showsClient, now }: Props) {
  const heads = HEADS.filter((head) => showsClient || head.label !== "Client");
  const isGrouped = params.sort === "due" && params.dir === "asc" && params.q === "";
  const groups = list.rows.map((row) => (isGrouped ? dueGroup(row, now) : null));
  const sizes = new Map<string, number>();
  for (const group of groups) if (group) sizes.set(group, (sizes.get(group) ?? 0) + 1);
  return (
    <>
      <Table caption="Cases" headSticks>
        <thead className="sticky top-topbar z-10">
          <tr>
            {heads.map(({ sort, label, numeric, hidden }) =>
              sort === null ? (
                <Th key={label} numeric={numeric} className={hidden}>
                  {label}
                </Th>
              ) : (
                <SortTh
                  key={label}
                  className={hidden}
                  href={routes.cases(
                    listQuery(params, {
                      sort,
                      dir: params.sort === sort && params.dir === "asc" ? "desc" : "asc",
                    }),
                  )}
                  sorted={
                    params.sort === sort
                      ? params.dir === "asc"
                        ? "ascending"
                        : "descending"
                      : null
                  }
                >
                  {label}
                </SortTh>
              ),
            )}
          </tr>
        </thead>
        <tbody>
          {list.rows.map((row, i) => (
            <Fragment key={row.id}>
              {groups[i] && groups[i] !== groups[i - 1] && (
                <GroupRow columns={heads.length} count={sizes.get(groups[i] ?? "")}>
                  {groups[i]}
                </GroupRow>
              )}
              <Tr>
                <Td>
                  <Link
                    href={row.state === "draft" ? routes.fieldReturn(row.id) : routes.case(row.id)}
                    className="font-mono font-medium whitespace-nowrap"
                  >
                    {row.number ?? "Draft"}
                  </Link>
                </Td>
                <Td className="w-full max-w-0 min-w-56 truncate font-strong" title={row.title}>
                  {row.title}
                </Td>
                {showsClient && <Td className="whitespace-nowrap text-ink-2">{row.client}</Td>}
                <Td className="whitespace-nowrap text-ink-2 max-lg:hidden">
                  {row.material || <Dash words="not stated" />}
                </Td>
                <Td>
                  <TemperStrip state={row.state} onHold={row.isOnHold} />
                </Td>
                <Td className="whitespace-nowrap">
                  {row.investigator ?? <span className="text-ink-3">Unassigned</span>}
                </Td>
                <Td numeric className="max-2xl:hidden">
                  {row.itemCount}
                </Td>
                <Td className="max-lg:hidden">
                  <Gates row={row} />
                </Td>
                <Td>
                  <Due row={row} now={now} />
                </Td>
                <Td className="tn whitespace-nowrap text-ink-3 max-2xl:hidden">
                  {formatRecent(row.changedAt, now)}
                </Td>
              </Tr>
            </Fragment>
          ))}
        </tbody>
      </Table>
      {(list.next !== null || params.after !== "") && (
        <nav aria-label="Further cases" className="flex gap-4 px-4 py-3 text-13">
          {params.after !== "" && (
            <Link href={routes.cases(listQuery(params))}>Back to the first page</Link>
          )}
          {list.next !== null && (
            <Link href={routes.cases(listQuery(params, { after: list.next }))}>Further cases</Link>
          )}
        </nav>
      )}
    </>
  );
}
