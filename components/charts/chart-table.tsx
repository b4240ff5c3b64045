import type { ChartTable as ChartData } from "@/lib/charts/primitives";
import { Table, Td, Th, Tr } from "@/components/ui/table";

/** The readings behind a chart, in the chart's order. */
export function ChartTable({ table, caption }: { table: ChartData; caption: string }) {
  return (
    <div className="max-h-96 overflow-auto" tabIndex={0} role="region" aria-label={caption}>
      <Table caption={caption} boxClassName="overflow-x-visible">
        <thead>
          <tr>
            {table.columns.map(({ label, align }) => (
              <Th key={label} numeric={align === "right"} className="sticky top-0">
                {label}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, index) => (
            <Tr key={index}>
              {row.map((cell, column) => (
                <Td key={column} numeric={table.columns[column]?.align === "right"}>
                  {cell}
                </Td>
              ))}
            </Tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
