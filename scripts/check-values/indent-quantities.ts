import { z } from "zod";
import {
  brinellForceIndex,
  brinellIndexVerdict,
  BRINELL_MATERIALS,
  type BrinellMaterial,
} from "@/lib/hardness/brinell-force-index";
import {
  brinellDiameterVerdict,
  brinellHardness,
  brinellIndentDepthMm,
  brinellMinimumThicknessMm,
} from "@/lib/hardness/brinell";
import { testForceN } from "@/lib/hardness/forces";
import { knoopHardness, knoopIndentDepthMm } from "@/lib/hardness/knoop";
import { reportedHardness } from "@/lib/hardness/report-rounding";
import {
  SPACING_CLASSES,
  vickersMinimumEdgeMm,
  vickersMinimumSpacingMm,
  vickersSpacingRule,
  type SpacingClass,
} from "@/lib/hardness/spacing";
import {
  vickersHardness,
  vickersIndentDepthMm,
  vickersMinimumThicknessMm,
} from "@/lib/hardness/vickers";
import type { Refusal } from "@/lib/numerics/verdict";
import { newtonsFromGf } from "@/lib/units/force";
import { mmFromUm } from "@/lib/units/length";
import { UnsupportedRow, type Computed } from "./check-row";
import { quantity, wordOf, type Quantity } from "./quantity";

const number = z.number();
const force = {
  F_N: number.optional(),
  F_gf: number.optional(),
  F_kgf: number.optional(),
  scale: z.string().optional(),
};
const indent = {
  ...force,
  d_mm: number.optional(),
  d_um: number.optional(),
  d1_mm: number.optional(),
  d2_mm: number.optional(),
  d1_um: number.optional(),
  d2_um: number.optional(),
};

type Force = { F_N?: number; F_gf?: number; F_kgf?: number };
type Indent = Force &
  Partial<Record<"d_mm" | "d_um" | "d1_mm" | "d2_mm" | "d1_um" | "d2_um", number>>;

function forceN({ F_N, F_gf, F_kgf }: Force): number {
  if (F_N !== undefined) return F_N;
  if (F_gf !== undefined) return newtonsFromGf(F_gf);
  if (F_kgf !== undefined) return testForceN(F_kgf);
  throw new UnsupportedRow("no force is given");
}

function diagonalsMm(inputs: Indent): readonly [number] | readonly [number, number] {
  const mm = (inMm?: number, inUm?: number) =>
    inMm ?? (inUm === undefined ? undefined : mmFromUm(inUm));
  const mean = mm(inputs.d_mm, inputs.d_um);
  const first = mm(inputs.d1_mm, inputs.d1_um);
  const second = mm(inputs.d2_mm, inputs.d2_um);
  if (mean !== undefined) return [mean];
  if (first !== undefined && second !== undefined) return [first, second];
  throw new UnsupportedRow("no diagonal is given");
}

const vickersOf = (inputs: Indent) => {
  const result = vickersHardness({ forceN: forceN(inputs), diagonalsMm: diagonalsMm(inputs) });
  return result.verdict === "refuse" ? result : result.hv;
};
const orWord = (value: number | Refusal): Computed =>
  typeof value === "number" ? value : value.verdict;

const ball = { D_mm: number, d_mm: number };

function spacingClass(name: string): SpacingClass {
  if (/steel|copper/i.test(name)) return "steel_copper";
  if (/light metals|lead|tin/i.test(name)) return "light_metals";
  throw new UnsupportedRow(`no class "${name}" among ${Object.keys(SPACING_CLASSES).join(", ")}`);
}

const spacingRule = (inputs: { class: string; use?: string }) =>
  vickersSpacingRule(
    spacingClass(inputs.class),
    inputs.use?.includes("traverse") ? "case_depth" : "general",
  );

function brinellMaterial(name: string): BrinellMaterial {
  const ids = Object.keys(BRINELL_MATERIALS) as BrinellMaterial[];
  const found = ids.find((id) => BRINELL_MATERIALS[id].name === name);
  if (!found) throw new UnsupportedRow(`no Brinell material "${name}"`);
  return found;
}

const reportScale = z.enum(["HV", "HK", "HBW"]);

/** Hardness of single indents, their validity and spacing. */
export const INDENT_QUANTITIES: Readonly<Record<string, Quantity>> = {
  vickers_hv: quantity(indent, (inputs) => orWord(vickersOf(inputs))),
  vickers_hv_rounded: quantity(indent, (inputs) => {
    const hv = vickersOf(inputs);
    return typeof hv === "number" ? Number(reportedHardness(hv, "HV")) : hv.verdict;
  }),
  vickers_depth_h: quantity({ d_mm: number }, ({ d_mm }) => vickersIndentDepthMm(d_mm)),
  vickers_min_thickness: quantity({ ...force, HV: number, rule: z.string().optional() }, (inputs) =>
    vickersMinimumThicknessMm(inputs.HV, forceN(inputs)),
  ),
  knoop_hk: quantity(indent, (inputs) => {
    const [longDiagonalMm] = diagonalsMm(inputs);
    const result = knoopHardness({ forceN: forceN(inputs), longDiagonalMm });
    return result.verdict === "refuse" ? result.verdict : result.hk;
  }),
  knoop_depth_h: quantity({ d_mm: number }, ({ d_mm }) => knoopIndentDepthMm(d_mm)),
  brinell_hbw: quantity({ ...force, ...ball }, (inputs) => {
    const { D_mm: ballDiameterMm, d_mm: indentDiameterMm } = inputs;
    const result = brinellHardness({ forceN: forceN(inputs), ballDiameterMm, indentDiameterMm });
    return result.verdict === "refuse" ? result.verdict : result.hbw;
  }),
  brinell_depth_h: quantity(ball, ({ D_mm, d_mm }) => orWord(brinellIndentDepthMm(D_mm, d_mm))),
  brinell_min_thickness_iso: quantity(ball, ({ D_mm, d_mm }) =>
    orWord(brinellMinimumThicknessMm(D_mm, d_mm, "iso")),
  ),
  brinell_min_thickness_astm: quantity(ball, ({ D_mm, d_mm }) =>
    orWord(brinellMinimumThicknessMm(D_mm, d_mm, "astm")),
  ),
  brinell_force_index: quantity({ ...force, D_mm: number }, (inputs) =>
    brinellForceIndex(forceN(inputs), inputs.D_mm),
  ),
  brinell_index_check: quantity(
    { ...force, D_mm: number, material: z.string(), HBW: number.optional() },
    (inputs) =>
      wordOf(
        brinellIndexVerdict({
          forceN: forceN(inputs),
          ballDiameterMm: inputs.D_mm,
          material: brinellMaterial(inputs.material),
          hbw: inputs.HBW,
        }),
      ),
  ),
  validity: quantity(
    {
      method: z.enum(["vickers", "knoop", "brinell"]),
      ...indent,
      D_mm: number.optional(),
      curved_surface: z.boolean().optional(),
    },
    (inputs) => {
      // A row that asks about the size alone names no force; any nominal one gives the same word.
      const f = inputs.F_N ?? inputs.F_gf ?? inputs.F_kgf ?? testForceN(1);
      if (inputs.method === "brinell") {
        const [d] = diagonalsMm(inputs);
        if (inputs.D_mm === undefined) throw new UnsupportedRow("no ball diameter is given");
        if (!(f > 0)) return "refuse";
        return wordOf(brinellDiameterVerdict(inputs.D_mm, d));
      }
      if (inputs.method === "knoop")
        return wordOf(knoopHardness({ forceN: f, longDiagonalMm: diagonalsMm(inputs)[0] }));
      return wordOf(
        vickersHardness({
          forceN: f,
          diagonalsMm: diagonalsMm(inputs),
          isCurvedSurface: inputs.curved_surface,
        }),
      );
    },
  ),
  vickers_min_spacing: quantity(
    { class: z.string(), use: z.string().optional(), d_mm: number },
    (inputs) => vickersMinimumSpacingMm(spacingRule(inputs), inputs.d_mm),
  ),
  vickers_spacing_unequal: quantity(
    { class: z.string(), use: z.string().optional(), d_a_mm: number, d_b_mm: number },
    (inputs) => vickersMinimumSpacingMm(spacingRule(inputs), inputs.d_a_mm, inputs.d_b_mm),
  ),
  vickers_min_edge: quantity(
    { class: z.string(), use: z.string().optional(), d_mm: number },
    (inputs) =>
      vickersMinimumEdgeMm(vickersSpacingRule(spacingClass(inputs.class), "general"), inputs.d_mm),
  ),
  report_rounding: quantity(
    { value: number, scale: reportScale },
    ({ value, scale }) => reportedHardness(value, scale) ?? "refuse",
  ),
};
