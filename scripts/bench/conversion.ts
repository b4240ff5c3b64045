import { converterFor } from "@/lib/hardness/convert";
import { PUBLISHED_TABLES } from "@/lib/hardness/published-tables";
import { type Measured, medianMs } from "./measure";

const COUNT = 10_000;

/** 10 000 Vickers values of quenched and tempered steel to Rockwell C. */
export async function benchConversion(): Promise<Measured> {
  const values = Array.from({ length: COUNT }, (_, i) => 250 + (i % 400));
  const enabledTableIds = new Set(PUBLISHED_TABLES.map(({ id }) => id));
  const converter = converterFor({
    from: "HV",
    to: "HRC",
    materialGroup: "steel-unalloyed-lowalloy",
    enabledTableIds,
  });
  const done = values.map((value) => converter(value)).filter(({ status }) => status === "ok");
  if (done.length !== COUNT) throw new Error(`only ${done.length} of ${COUNT} values converted`);
  const text = JSON.stringify(values);
  return {
    what: "Converting 10 000 hardness values, HV to HRC",
    ms: await medianMs(() => values.map((value) => converter(value))),
    yardstick: "JSON.parse of the same values",
    yardstickMs: await medianMs(() => JSON.parse(text)),
  };
}
