import { formatHardness } from "@/lib/format/hardness";
import { formatQuantity, formatWithUncertainty } from "@/lib/format/numbers";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import { reportedStrengthMpa } from "@/lib/hardness/report-rounding";
import { SCALES } from "@/lib/hardness/scales";
import type { CitableValue, CitableValues } from "@/lib/records/constants";
import type { ConvertedHardness, ResultContent } from "./schemas";

/** "≈ 56.9 HRC", "≈ 965 MPa"; null where the table gives no value. */
export function convertedText({ to, value }: ConvertedHardness): string | null {
  if (value === null) return null;
  if (to === "Rm_MPa") {
    const shown = formatQuantity(reportedStrengthMpa(value), "MPa", { decimals: 0 });
    return `≈${NO_BREAK_SPACE}${shown}`;
  }
  return formatHardness({ value, scale: SCALES[to].symbol, converted: true });
}

function convertedQuotes(
  what: "surface" | "core",
  conversions: readonly ConvertedHardness[],
  where: string,
  title: string,
): CitableValues {
  const quotes: CitableValues = {};
  for (const conversion of conversions) {
    const text = convertedText(conversion);
    if (text === null) continue;
    const isStrength = conversion.to === "Rm_MPa";
    const name = what === "surface" ? "Surface" : "Core";
    quotes[`${what}${isStrength ? "Strength" : "Converted"}`] = {
      label: isStrength
        ? `${name} strength of ${where}, estimated from hardness`
        : `${name} hardness of ${where}, converted`,
      text: `${text} (${title.replaceAll(" ", NO_BREAK_SPACE)})`,
      value: conversion.value,
      unit: SCALES[conversion.to].symbol,
      expandedUncertainty: null,
      source: isStrength ? "estimated" : "converted",
    };
  }
  return quotes;
}

/** The values of a result that findings can cite. */
export function resultQuotes(result: ResultContent, name: string): CitableValues {
  const where = `${result.traverseLabel} ${name}`.trim();
  const { depth, surface, core, symbol } = result;
  const [title = ""] = result.tableTitles;
  const quotes: CitableValues = {};
  const measured = (label: string, of: ResultContent["surface"]): CitableValue => ({
    label,
    text: formatHardness({ value: of.value, scale: symbol, uncertainty: of.expandedUncertainty }),
    value: of.value,
    unit: symbol,
    expandedUncertainty: of.expandedUncertainty,
    source: "measured",
  });
  if (depth && depth.depthMm !== null)
    quotes.caseDepth = {
      label: `${depth.kind} of ${where}`,
      text: formatWithUncertainty(depth.depthMm, depth.expandedUncertaintyMm, "mm", {
        decimals: 2,
      }),
      value: depth.depthMm,
      unit: "mm",
      expandedUncertainty: depth.expandedUncertaintyMm,
      source: "measured",
    };
  if (depth && depth.limit !== null)
    quotes.limitHardness = {
      label: `Limit hardness of ${where}`,
      text: formatHardness({ value: depth.limit, scale: symbol }),
      value: depth.limit,
      unit: symbol,
      expandedUncertainty: null,
      source: "stated",
    };
  if (surface.value !== null)
    quotes.surfaceHardness = measured(`Surface hardness of ${where}`, surface);
  if (core.value !== null) quotes.coreHardness = measured(`Core hardness of ${where}`, core);
  return {
    ...quotes,
    ...convertedQuotes("surface", surface.conversions, where, title),
    ...convertedQuotes("core", core.conversions, where, title),
  };
}
