import type { HardnessProfileInput, ProfilePoint } from "@/lib/charts/hardness-profile-input";

export function point(
  depthMm: number,
  hardnessHv: number,
  more: Partial<ProfilePoint> = {},
): ProfilePoint {
  return {
    depthMm,
    hardnessHv,
    expandedUncertaintyHv: 12,
    leftOut: false,
    flagged: false,
    ...more,
  };
}

export function profileInput(change: Partial<HardnessProfileInput> = {}): HardnessProfileInput {
  return {
    scaleLabel: "HV1",
    theme: "screen",
    size: { widthPx: 640, heightPx: 344 },
    series: [
      {
        label: "T2",
        place: "at fillet",
        crossing: { kind: "SHD", depthMm: 1.95, uncertaintyMm: 0.06, text: "1.95 ± 0.06" },
        points: [
          point(0, 617, { convertedFrom: "HRC", expandedUncertaintyHv: null }),
          point(0.1, 598, { leftOut: true }),
          point(0.3, 627),
          point(1.1, 609),
          point(1.9, 464, { flagged: true }),
          point(2.3, 352),
          point(4, 301),
        ],
      },
      {
        label: "T1",
        crossing: { kind: "SHD", depthMm: 3.12, uncertaintyMm: 0.07, text: "3.12 ± 0.07" },
        points: [point(0.15, 618), point(2.1, 598), point(3.05, 467), point(4.5, 300)],
      },
    ],
    limit: { hv: 448, text: "limit 448 HV1 = 80 % of 560" },
    requiredDepth: { minMm: 2.5, maxMm: 4, text: "required 2.5 to 4.0 mm" },
    convertedScale: {
      name: "HRC",
      tableLabel: "A.1",
      ticks: [
        { hv: 302, label: "30" },
        { hv: 392, label: "40" },
        { hv: 513, label: "50" },
        { hv: 900, label: "67" },
      ],
    },
    ...change,
  };
}
