import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, organisations, people, settings } from "@/db/schema";
import { verifyChains } from "@/lib/audit/verify-chain";
import { checkPassword } from "@/lib/auth/check-password";
import { laboratory } from "@/lib/people/laboratory";
import { setUp } from "@/lib/people/set-up";
import { FAILURE, failureOf, whileFailing } from "../../helpers/failing-database";
import { aPerson } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const PASSWORD = "four words in a row";

const given = (change: Record<string, unknown> = {}) => ({
  laboratoryName: "Calder Street",
  addressLine: "",
  name: "Ada Birch",
  email: "ada@example.test",
  password: PASSWORD,
  ...change,
});

/** As on a machine where nobody has been yet. */
beforeEach(async () => {
  await database().delete(people);
  await database().delete(organisations);
  await database().delete(settings);
});

const everybody = () => database().select().from(people);

describe("setting an empty installation up", () => {
  it("makes the laboratory and its first administrator, who can sign in", async () => {
    expect(await laboratory()).toBeNull();
    await setUp(given({ addressLine: "1 Calder Street" }));
    expect(await laboratory()).toMatchObject({
      name: "Calder Street",
      addressLine: "1 Calder Street",
    });
    const [first, ...others] = await everybody();
    expect(others).toEqual([]);
    expect(first).toMatchObject({ role: "administrator", isActive: true, name: "Ada Birch" });
    expect(await checkPassword("ada@example.test", PASSWORD, "10.0.0.1")).not.toBeNull();
    const events = await database().select().from(auditEvents);
    expect(JSON.stringify(events)).not.toContain(PASSWORD);
    expect((await verifyChains("installation")).faults).toEqual([]);
  });

  it("happens once, when people press at once too", async () => {
    for (let round = 1; round <= 6; round += 1) {
      await database().delete(people);
      await database().delete(organisations);
      await database().delete(settings);
      const results = await Promise.allSettled(
        Array.from({ length: 4 }, (_, i) =>
          setUp(given({ laboratoryName: `Laboratory ${round}.${i}`, email: `p${i}@example.test` })),
        ),
      );
      const lost = results.filter((result) => result.status === "rejected");
      expect(lost.map(({ reason }) => reason as unknown)).toEqual(
        Array.from({ length: 3 }, () => expect.objectContaining({ code: "LOCKED" }) as unknown),
      );
      expect(await everybody()).toHaveLength(1);
      expect(await database().select().from(organisations)).toHaveLength(1);
    }
  });

  it("is refused where somebody is, and changes nothing", async () => {
    await aPerson("Lead Person", "lead");
    const before = await everybody();
    const found = await refusal(setUp(given()));
    expect(found.code).toBe("LOCKED");
    expect(found.message).toContain("set up already");
    expect(await everybody()).toEqual(before);
  });

  it("can be tried again after it failed", async () => {
    const failed: unknown = await whileFailing("auditLog", () => setUp(given())).catch(
      (error: unknown) => error,
    );
    expect(failureOf(failed)).toContain(FAILURE);
    expect(await everybody()).toEqual([]);
    expect(await laboratory()).toBeNull();
    await setUp(given());
    expect(await everybody()).toHaveLength(1);
  });

  it("takes names of any letters and of 200", async () => {
    await setUp(given({ laboratoryName: "Ø".repeat(200), name: "Zoë 🪛".padEnd(200, "x") }));
    expect((await laboratory())?.name).toBe("Ø".repeat(200));
    expect((await verifyChains("installation")).faults).toEqual([]);
  });

  it.each([
    ["laboratoryName", { laboratoryName: " x " }],
    ["laboratoryName", { laboratoryName: "x".repeat(201) }],
    ["name", { name: "" }],
    ["email", { email: "ada" }],
    ["password", { password: "x".repeat(11) }],
    ["password", { password: "x".repeat(201) }],
    ["addressLine", { addressLine: ["1 Calder Street"] }],
  ])("names a wrong %s: %.30j", async (field, change) => {
    const found = await refusal(setUp(given(change)));
    expect(Object.keys(found.fields ?? {})).toEqual([field]);
    expect(await everybody()).toEqual([]);
  });
});
