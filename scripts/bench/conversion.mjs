import { askWell } from "./http-client.mjs";
import { inPairs, timeOf } from "./measure.mjs";

const COUNT = 10_000;

/** A request to convert 10 000 hardness values against a route that echoes the same JSON. */
export async function measureConversion(portal, yardstickBase) {
  const body = JSON.stringify({
    materialGroup: "steel-nonaustenitic",
    from: "HV",
    values: Array.from({ length: COUNT }, (_, i) => 250 + (i % 400)),
    to: ["HRC"],
  });
  const send = (url, cookie) =>
    askWell(url, {
      method: "POST",
      headers: { "content-type": "application/json", ...(cookie && { cookie }) },
      body,
    });
  const convert = () => send(`${portal.base}/api/hardness/convert`, portal.cookie);
  const echo = () => send(`${yardstickBase}/api/echo`);
  const { results } = JSON.parse((await convert()).bytes.toString("utf8"));
  const done = results.filter(({ conversions }) => conversions[0]?.status === "ok").length;
  if (done !== COUNT) throw new Error(`only ${done} of ${COUNT} values were converted`);
  const found = await inPairs(
    { product: () => timeOf(convert), yardstick: () => timeOf(echo) },
    { pairs: 25, warmUps: 8 },
  );
  const what = "converting 10 000 hardness values, HV to HRC, by one request";
  return { letter: "e", what, against: "a route that parses and echoes the same JSON", ...found };
}
