import { Table, Td, Th, Tr } from "@/components/ui/table";
import { formatNumber } from "@/lib/format/numbers";
import type { HardnessTable } from "@/lib/hardness/hardness-table";
import { SCALE_NAMES, SCALES } from "@/lib/hardness/scales";

/** The rows of a table as published; an empty cell stays empty of a number. */
export function TableRows({ table }: { table: HardnessTable }) {
  const keys = table.columns[table.keyScale] ?? [];
  const scales = [
    table.keyScale,
    ...SCALE_NAMES.filter((scale) => scale !== table.keyScale && table.columns[scale]),
  ];
  return (
    <Table caption={table.title} boxClassName="border-t border-rule">
      <thead>
        <tr>
          {scales.map((scale) => (
            <Th key={scale} numeric className="text-right!" title={SCALES[scale].name}>
              {scale.replace("_MPa", ", MPa").replace("_ksi", ", ksi").replace("_", " ")}
            </Th>
          ))}
        </tr>
      </thead>
      <tbody>
        {keys.map((key, row) => (
          <Tr key={row}>
            {scales.map((scale) => {
              const value = table.columns[scale]?.[row] ?? null;
              const isBracketed = key !== null && table.parentheses[scale]?.includes(key) === true;
              return (
                <Td key={scale} numeric className={scale === table.keyScale ? "font-strong" : ""}>
                  {value === null ? (
                    <span className="text-12 text-ink-3">no value</span>
                  ) : isBracketed ? (
                    `(${formatNumber(value)})`
                  ) : (
                    formatNumber(value)
                  )}
                </Td>
              );
            })}
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
