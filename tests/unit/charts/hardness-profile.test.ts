import { describe, expect, it } from "vitest";
import { hardnessProfile } from "@/lib/charts/hardness-profile";
import type { Chart, Primitive } from "@/lib/charts/primitives";
import { estimateTextWidthPx } from "@/lib/charts/text-width";
import { point, profileInput } from "./profile-input";

type Kind<K extends Primitive["kind"]> = Extract<Primitive, { kind: K }>;

function all<K extends Primitive["kind"]>(chart: Chart, kind: K): Kind<K>[] {
  return chart.primitives.filter((mark): mark is Kind<K> => mark.kind === kind);
}

function textAt(chart: Chart, text: string): Kind<"text"> {
  const found = all(chart, "text").find((mark) => mark.text === text);
  if (!found) throw new Error(`no label "${text}"`);
  return found;
}

describe("hardness profile", () => {
  const chart = hardnessProfile(profileInput());

  it("joins measured points by depth, without what is left out or converted", () => {
    const [behind, front] = all(chart, "polyline");
    expect(behind?.stroke.token).toBe("ch-2");
    expect(front?.stroke.token).toBe("ch-1");
    expect(front?.points).toHaveLength(5);
    const xs = front?.points.map(([x]) => x) ?? [];
    expect(xs).toEqual([...xs].sort((a, b) => a - b));
  });

  it("joins by depth when readings were entered in another order", () => {
    const input = profileInput({
      series: [{ label: "T", points: [point(2, 400), point(0.5, 600), point(1, 500)] }],
    });
    const xs = all(hardnessProfile(input), "polyline")[0]?.points.map(([x]) => x) ?? [];
    expect(xs).toEqual([...xs].sort((a, b) => a - b));
  });

  it("gives every kind of point its own shape", () => {
    const shapes = all(chart, "marker").map(({ shape }) => shape);
    expect(shapes.filter((shape) => shape === "filled-circle")).toHaveLength(5);
    expect(shapes.filter((shape) => shape === "open-square")).toHaveLength(4);
    expect(shapes.filter((shape) => shape === "open-diamond")).toHaveLength(1);
    expect(shapes.filter((shape) => shape === "cross")).toHaveLength(1);
  });

  it("puts limit, crossing and drop line at the values they stand for", () => {
    const limit = all(chart, "line").find(({ stroke }) => stroke.token === "ch-limit");
    const tick500 = textAt(chart, "500").y - 4;
    const tick400 = textAt(chart, "400").y - 4;
    const expected = tick400 + ((tick500 - tick400) * 48) / 100;
    expect(limit?.y1).toBeCloseTo(expected, 6);
    const crossing = all(chart, "circle").find(({ r }) => r === 4.2);
    const x1 = textAt(chart, "1.0").x;
    const x2 = textAt(chart, "2.0").x;
    expect(crossing?.x).toBeCloseTo(x1 + (x2 - x1) * 0.95, 6);
    expect(crossing?.y).toBeCloseTo(expected, 6);
  });

  it.each([0.04, 0.5, 4, 35, 3000, 250_000])(
    "keeps the labels of the depth axis apart over %s mm",
    (deepestMm) => {
      for (const widthPx of [320, 640, 1300]) {
        const drawn = hardnessProfile(
          profileInput({
            size: { widthPx, heightPx: 344 },
            requiredDepth: undefined,
            series: [{ label: "T", points: [point(0, 600), point(deepestMm, 400)] }],
          }),
        );
        const labels = all(drawn, "text")
          .filter((mark) => mark.anchor === "middle" && /^[\d.]+$/.test(mark.text))
          .sort((a, b) => a.x - b.x);
        expect(labels.length).toBeGreaterThan(1);
        for (const [i, label] of labels.entries()) {
          const next = labels[i + 1];
          if (!next) continue;
          const halves =
            (estimateTextWidthPx(label.text, 12) + estimateTextWidthPx(next.text, 12)) / 2;
          expect(next.x - label.x).toBeGreaterThan(halves);
        }
      }
    },
  );

  it("draws the grey bar as wide as the uncertainty on both sides", () => {
    const bar = all(chart, "rect").find(({ opacity }) => opacity === 0.28);
    const perMm = textAt(chart, "2.0").x - textAt(chart, "1.0").x;
    expect(bar?.width).toBeCloseTo(0.12 * perMm, 6);
  });

  it("places converted ticks where the table puts them and drops those outside the scale", () => {
    const y = (hv: number) => {
      const at400 = textAt(chart, "400").y;
      return at400 + ((textAt(chart, "500").y - at400) * (hv - 400)) / 100;
    };
    expect(textAt(chart, "50").y).toBeCloseTo(y(513), 6);
    expect(textAt(chart, "30").y).toBeCloseTo(y(302), 6);
    expect(all(chart, "text").map(({ text }) => text)).not.toContain("67");
    expect(textAt(chart, "≈ HRC, converted").rotateDeg).toBe(-90);
  });

  it("draws bars with caps from value minus to value plus uncertainty", () => {
    const input = profileInput({
      series: [{ label: "T", points: [point(1, 500), point(2, 400)] }],
    });
    const bar = all(hardnessProfile(input), "path").find(({ stroke }) => stroke?.widthPx === 1.1);
    const [low, high] = [...(bar?.d.matchAll(/[MV](?:[\d.]+ )?([\d.]+)/g) ?? [])].map((m) =>
      Number(m[1]),
    );
    const drawn = hardnessProfile(input);
    const perHv = (textAt(drawn, "400").y - textAt(drawn, "500").y) / 100;
    expect(Math.abs((low ?? 0) - (high ?? 0))).toBeCloseTo(24 * perHv, 6);
  });

  it("keeps labels inside the frame and off one another", () => {
    const words = ["limit 448 HV1 = 80 % of 560", "required 2.5 to 4.0 mm", "T1 3.12 ± 0.07"];
    const boxes = [...words, "SHD 1.95 ± 0.06"].map((word) => {
      const { x, y, anchor, weight } = textAt(chart, word);
      const width = estimateTextWidthPx(word, 12, weight);
      const left = anchor === "middle" ? x - width / 2 : x;
      return { left, right: left + width, top: y - 11, bottom: y + 3 };
    });
    for (const [i, a] of boxes.entries()) {
      expect(a.left).toBeGreaterThanOrEqual(0);
      expect(a.right).toBeLessThanOrEqual(640);
      for (const b of boxes.slice(i + 1)) {
        const apart = a.right < b.left || b.right < a.left || a.bottom < b.top || b.bottom < a.top;
        expect(apart).toBe(true);
      }
    }
  });

  it("states the result and shows the readings in the order given", () => {
    expect(chart.description).toBe(
      "T2 at fillet: SHD 1.95 ± 0.06 mm. T1: SHD 3.12 ± 0.07 mm. " +
        "Limit 448 HV1 = 80 % of 560. Required 2.5 to 4.0 mm.",
    );
    expect(chart.table.rows).toHaveLength(11);
    expect(chart.table.rows[0]).toEqual(["T2", "0.00", "617", "–", "converted from HRC"]);
    expect(chart.table.rows[1]).toEqual(["T2", "0.10", "598", "12", "left out"]);
    expect(chart.table.rows[4]?.[4]).toBe("to settle");
  });

  it("uses the paper's own frame colours on paper", () => {
    const paper = hardnessProfile(profileInput({ theme: "paper" }));
    const tokens = new Set(all(paper, "rect").map(({ fill }) => fill));
    expect(tokens).toContain("paper-band");
    expect(tokens).not.toContain("ch-band");
  });
});

describe("hardness profile with odd readings", () => {
  const finite = (chart: Chart) => JSON.stringify(chart).match(/null|NaN|Infinity/) === null;

  it.each([
    ["no series", []],
    ["no points", [{ label: "T", points: [] }]],
    ["one point", [{ label: "T", points: [point(0.5, 500)] }]],
    ["equal readings", [{ label: "T", points: [point(1, 448), point(1, 448), point(1, 448)] }]],
    ["all at the surface", [{ label: "T", points: [point(0, 500), point(0, 510)] }]],
    ["only left out", [{ label: "T", points: [point(1, 448, { leftOut: true })] }]],
  ])("draws %s with finite coordinates", (_, series) => {
    const bare = { convertedScale: undefined, limit: undefined, requiredDepth: undefined };
    const chart = hardnessProfile(profileInput({ series, ...bare }));
    expect(finite(chart)).toBe(true);
    expect(chart.primitives.length).toBeGreaterThan(5);
  });

  it("leaves points without a number out of the drawing and keeps them in the table", () => {
    const series = [
      { label: "T", points: [point(Number.NaN, 500), point(1, Infinity), point(2, 400)] },
    ];
    const chart = hardnessProfile(profileInput({ series }));
    expect(finite(chart)).toBe(true);
    expect(chart.readouts).toHaveLength(1);
    expect(chart.table.rows[0]?.[1]).toBe("–");
    expect(chart.table.rows[1]?.[2]).toBe("–");
  });

  it("thins the markers of 10 000 readings and keeps the whole line", () => {
    const points = Array.from({ length: 10_000 }, (_, i) =>
      point(i / 2500, 650 - 350 / (1 + Math.exp(-(i / 2500 - 2) * 5))),
    );
    const chart = hardnessProfile(profileInput({ series: [{ label: "T", points }] }));
    expect(all(chart, "polyline")[0]?.points).toHaveLength(10_000);
    expect(all(chart, "marker").length).toBeLessThan(300);
    expect(chart.table.rows).toHaveLength(10_000);
  });
});
