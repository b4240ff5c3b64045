import { beforeAll, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { database } from "@/db/client";
import { settings } from "@/db/schema";
import { POST } from "@/app/api/hardness/convert/route";
import type { Actor } from "@/lib/auth/actor";
import { PUBLISHED_TABLES } from "@/lib/hardness/published-tables";
import { asOtherRequester } from "../../helpers/people";
import { readChecks } from "../../reference/read-checks";

let actor: Actor | null = null;
vi.mock("@/lib/auth/session", () => ({ currentActor: () => Promise.resolve(actor) }));

const answer = z.object({
  results: z.array(
    z.object({
      from: z.string(),
      value: z.number(),
      conversions: z.array(
        z.discriminatedUnion("status", [
          z.strictObject({
            to: z.string(),
            status: z.literal("ok"),
            value: z.number(),
            table: z.string(),
            edition: z.string(),
            warnings: z.array(z.string()),
          }),
          z.strictObject({ to: z.string(), status: z.literal("refused"), reason: z.string() }),
        ]),
      ),
    }),
  ),
});

const send = (body: unknown) =>
  POST(
    new Request("http://portal.test/api/hardness/convert", {
      method: "POST",
      body: typeof body === "string" ? body : JSON.stringify(body),
    }),
    { params: Promise.resolve({}) },
  );
const ask = async (body: unknown) => {
  const response = await send(body);
  expect(response.status).toBe(200);
  return answer.parse(await response.json()).results;
};

const EXAMPLE = { materialGroup: "steel-nonaustenitic", from: "HV", values: [620, 300] };

beforeAll(async () => {
  actor = await asOtherRequester();
});

describe("a conversion request", () => {
  it("is answered by the first table of the group that holds both scales, and names it", async () => {
    const [first, second] = await ask({ ...EXAMPLE, to: ["HRC", "Rm_MPa"] });
    expect(first).toMatchObject({ from: "HV", value: 620 });
    // ASTM E140 Table 1: 56 HRC is 613 HV, 57 HRC is 633 HV; straight line between.
    expect(first?.conversions[0]).toMatchObject({
      to: "HRC",
      status: "ok",
      value: 56.35,
      table: "steel-nonaustenitic-e140-table1",
      warnings: [],
    });
    // E140 holds no strength: ASTM A370 is the next of the group that does.
    expect(first?.conversions[1]).toMatchObject({ to: "Rm_MPa", status: "ok" });
    const strength = second?.conversions[1];
    expect(strength?.status === "ok" && strength.table).toBe("steel-a370-rockwell-c");
  });

  it("keeps the order of values and scales, and rounds nothing", async () => {
    const values = [623.7, 300.1, 451];
    const results = await ask({ ...EXAMPLE, values, to: ["HRC", "HRA"] });
    expect(results.map(({ value }) => value)).toEqual(values);
    expect(results[0]?.conversions.map(({ to }) => to)).toEqual(["HRC", "HRA"]);
    const first = results[0]?.conversions[0];
    // 56 + (623.7 - 613) / 20
    expect(first?.status === "ok" && first.value).toBeCloseTo(56.535, 10);
  });

  it("refuses with a reason and without a value, in an answer that is still 200", async () => {
    const refusal = async (body: object) =>
      (await ask({ ...EXAMPLE, to: ["HRC"], ...body }))[0]?.conversions[0];
    expect(await refusal({ values: [5000] })).toMatchObject({ status: "refused" });
    expect(await refusal({ values: [{ value: 23, status: "converted" }] })).toMatchObject({
      status: "refused",
      reason: expect.stringContaining("nothing converts twice") as string,
    });
    for (const materialGroup of ["titanium", "grey-cast-iron", "steel-cold-worked"])
      expect(await refusal({ materialGroup })).toMatchObject({ status: "refused" });
    expect(await refusal({ table: "steel-unalloyed-lowalloy-iso18265-a1" })).toMatchObject({
      status: "refused",
    });
    expect(
      await refusal({ materialGroup: "nickel-high-nickel", table: "nickel-e140-table3" }),
    ).toMatchObject({ reason: expect.stringContaining("switched off") as string });
  });

  it.each([
    ["not JSON", "{", 400],
    [
      "NaN, which is not JSON",
      '{"materialGroup":"titanium","from":"HV","values":[NaN],"to":["HRC"]}',
      400,
    ],
    ["no values", { ...EXAMPLE, values: [], to: ["HRC"] }, 400],
    ["a word for a value", { ...EXAMPLE, values: ["620"], to: ["HRC"] }, 400],
    ["no scale to convert to", { ...EXAMPLE, to: [] }, 400],
    ["a list", [1, 2], 400],
    ["an unknown group", { ...EXAMPLE, materialGroup: "cheese", to: ["HRC"] }, 422],
    ["an unknown scale", { ...EXAMPLE, to: ["HRX"] }, 422],
    ["an unknown table", { ...EXAMPLE, to: ["HRC"], table: "none" }, 422],
    [
      "the name of an object's own part",
      { ...EXAMPLE, materialGroup: "constructor", to: ["HRC"] },
      422,
    ],
    ["10 001 values", { ...EXAMPLE, values: Array<number>(10_001).fill(300), to: ["HRC"] }, 413],
    ["more than a megabyte", " ".repeat(1024 * 1024 + 1), 413],
  ])("with %s is refused", async (_what, body, status) => {
    const response = await send(body);
    expect(response.status).toBe(status);
    const { error } = z
      .object({ error: z.object({ message: z.string() }) })
      .parse(await response.json());
    expect(error.message).not.toBe("");
  });

  it("of 10 000 values is answered whole", async () => {
    const values = Array.from({ length: 10_000 }, (_, index) => 250 + index / 50);
    const results = await ask({ ...EXAMPLE, values, to: ["HRC", "Rm_MPa"] });
    expect(results).toHaveLength(10_000);
    expect(results.at(-1)?.value).toBe(values.at(-1));
  });

  it("without a sign-in is refused", async () => {
    const known = actor;
    actor = null;
    const response = await send({ ...EXAMPLE, to: ["HRC"] });
    actor = known;
    expect(response.status).toBe(401);
  });
});

/** Published pairs and refusals, through the endpoint; each row carries its source. */
describe("published conversions through the endpoint", () => {
  beforeAll(async () => {
    const value = PUBLISHED_TABLES.map(({ id }) => id);
    await database()
      .insert(settings)
      .values({ name: "hardness.tables", value })
      .onDuplicateKeyUpdate({ set: { value } });
  });

  it.each(
    readChecks("hardness_conversion_checks.csv").map(({ title, row }) => [title, row] as const),
  )("%s", async (_title, row) => {
    const { from_value: value, input_status: status } = row;
    const [result] = await ask({
      materialGroup: row.material_group,
      from: row.from_scale,
      values: [status === "converted" ? { value: Number(value), status } : Number(value)],
      to: [row.to_scale],
      ...(row.table && { table: row.table.replace(".csv", "") }),
    });
    const found = result?.conversions[0];
    if (row.verdict === "refuse") {
      expect(found?.status).toBe("refused");
      return;
    }
    expect(found?.status).toBe("ok");
    if (found?.status !== "ok" || row.expected === "") return;
    expect(Math.abs(found.value - Number(row.expected))).toBeLessThanOrEqual(
      Number(row.tolerance || 0) + 1e-9,
    );
  });
});
