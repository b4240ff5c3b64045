/**
 * The groups a conversion table holds for. Titanium, grey cast iron and cold-worked steel are named
 * so that they can be refused with their reason: no table of this set may be used for them.
 * Source: scope clauses of ASTM E140 and ISO 18265; refusing cold-worked steel is this product's
 * own rule, since ISO 18265 Table A.1 warns of large deviations for it.
 */
export const MATERIAL_GROUPS = {
  "steel-nonaustenitic": { name: "Non-austenitic carbon, alloy or tool steel" },
  "steel-unalloyed-lowalloy": { name: "Unalloyed or low-alloy steel, cast steel" },
  "steel-austenitic-stainless": { name: "Austenitic stainless steel" },
  "nickel-high-nickel": { name: "Nickel, high-nickel alloy" },
  "cartridge-brass": { name: "Cartridge brass (70/30)" },
  "aluminium-wrought": { name: "Wrought aluminium" },
  "steel-cold-worked": {
    name: "Cold-worked steel",
    noTable:
      "Cold-worked steel can lie far from the tables. Measure in the scale that is wanted, or override with a reason.",
  },
  titanium: { name: "Titanium", noTable: "No published table here holds for titanium." },
  "grey-cast-iron": {
    name: "Grey cast iron",
    noTable: "No published table here holds for grey cast iron.",
  },
} as const satisfies Record<string, { name: string; noTable?: string }>;

export type MaterialGroup = keyof typeof MATERIAL_GROUPS;

export const MATERIAL_GROUP_NAMES = Object.keys(MATERIAL_GROUPS) as readonly MaterialGroup[];

export function isMaterialGroup(name: string): name is MaterialGroup {
  return Object.hasOwn(MATERIAL_GROUPS, name);
}
