import "server-only";
import type { Conversion } from "@/lib/hardness/convert";
import type { ConvertedValue } from "@/lib/hardness/convert-request";

/** Results written into one chunk of the answer. */
const RESULTS_AT_ONCE = 500;

/** One conversion as the answer gives it: warnings as sentences, no value on a refusal. */
function shown(conversion: Conversion) {
  const { to, status } = conversion;
  return conversion.status === "ok"
    ? {
        to,
        status,
        value: conversion.value,
        table: conversion.table,
        edition: conversion.edition,
        warnings: conversion.warnings.map(({ text }) => text),
      }
    : { to, status, reason: conversion.reason };
}

const resultText = ({ from, value, conversions }: ConvertedValue) =>
  JSON.stringify({ from, value, conversions: conversions.map(shown) });

/** The answer as JSON, made as it is read, so that a large one is never held whole. */
export function conversionChunks(
  results: readonly ConvertedValue[],
): ReadableStream<Uint8Array<ArrayBuffer>> {
  const encoder = new TextEncoder();
  let next = 0;
  return new ReadableStream({
    pull(controller) {
      const part = results.slice(next, next + RESULTS_AT_ONCE).map(resultText);
      const isFirst = next === 0;
      next += part.length;
      const isLast = next >= results.length;
      const text = `${isFirst ? '{"results":[' : ","}${part.join(",")}${isLast ? "]}" : ""}`;
      controller.enqueue(encoder.encode(text));
      if (isLast) controller.close();
    },
  });
}
