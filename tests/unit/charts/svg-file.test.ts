import { describe, expect, it } from "vitest";
import { hardnessProfile } from "@/lib/charts/hardness-profile";
import { withLegend } from "@/lib/charts/legend";
import { PRINT_COLOURS } from "@/lib/charts/palette";
import { chartToSvg } from "@/lib/charts/to-svg";
import { point, profileInput } from "./profile-input";

describe("a chart saved as SVG", () => {
  it("stands alone: fixed colours, no variables, no outside references", () => {
    const svg = chartToSvg(hardnessProfile(profileInput()));
    expect(svg).toContain(PRINT_COLOURS["ch-1"]);
    expect(svg).not.toMatch(/var\(|href=|url\(|<style|<script/);
    expect(svg).toContain("<title>Hardness against depth</title>");
    expect(svg).toContain("<desc>T2 at fillet: SHD 1.95 ± 0.06 mm.");
  });

  it("carries names as text, whatever they hold", () => {
    const series = [
      { label: '</text><script>alert("1")</script>&\u0000', points: [point(1, 500)] },
    ];
    const svg = chartToSvg(withLegend(hardnessProfile(profileInput({ series }))));
    expect(svg).not.toContain("<script>");
    expect(svg).not.toContain("\u0000");
    expect(svg).toContain("&lt;script&gt;");
  });

  it("writes the legend under the plot without changing the plot", () => {
    const chart = hardnessProfile(profileInput());
    const complete = withLegend(chart);
    expect(complete.heightPx).toBeGreaterThan(chart.heightPx);
    expect(complete.primitives.slice(0, chart.primitives.length)).toEqual(chart.primitives);
    expect(chart.legend.map(({ text }) => text)).toEqual([
      "T2 measured, bars k = 2",
      "T1 measured, bars k = 2",
      "converted from HRC",
      "left out",
    ]);
  });
});
