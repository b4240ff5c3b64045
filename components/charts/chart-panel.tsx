"use client";

import { useId, useMemo, useState } from "react";
import { withLegend } from "@/lib/charts/legend";
import type { Chart } from "@/lib/charts/primitives";
import { chartToSvg } from "@/lib/charts/to-svg";
import { Panel, PanelHead } from "@/components/ui/panel";
import { ChartReadout } from "./chart-readout";
import { ChartTable } from "./chart-table";

const ACTION =
  "min-h-6 cursor-pointer px-0.5 text-13 text-action underline underline-offset-[3px] hover:text-action-2";

/**
 * A chart as every station shows it: heading, plot with legend and read-out, the same data as a
 * table, and the drawing as a file. `fileName` is without extension.
 */
export function ChartPanel({ chart, fileName }: { chart: Chart; fileName: string }) {
  const [asTable, setAsTable] = useState(false);
  const complete = useMemo(() => withLegend(chart), [chart]);
  const titleId = useId();

  return (
    <Panel aria-labelledby={titleId}>
      <PanelHead
        id={titleId}
        title={chart.title}
        actions={
          <>
            <button
              type="button"
              className={ACTION}
              aria-pressed={asTable}
              onClick={() => setAsTable(!asTable)}
            >
              Table
            </button>
            <button type="button" className={ACTION} onClick={() => save(complete, fileName)}>
              Save as SVG
            </button>
          </>
        }
      />
      {asTable ? (
        <ChartTable table={chart.table} caption={`${chart.title}. ${chart.description}`} />
      ) : (
        <div className="px-3 py-2">
          <ChartReadout chart={complete} />
        </div>
      )}
    </Panel>
  );
}

function save(chart: Chart, fileName: string) {
  const url = URL.createObjectURL(new Blob([chartToSvg(chart)], { type: "image/svg+xml" }));
  const link = document.createElement("a");
  link.href = url;
  link.download = `${fileName}.svg`;
  link.click();
  URL.revokeObjectURL(url);
}
