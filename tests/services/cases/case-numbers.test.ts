import { isNotNull } from "drizzle-orm";
import { expect, it } from "vitest";
import { database } from "@/db/client";
import { caseNumbers, cases } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { nextCaseNumber } from "@/lib/cases/case-number";
import { submitCase } from "@/lib/cases/submit-case";
import { aDraft } from "../../helpers/field-returns";
import { asLead, asOtherRequester, asRequester } from "../../helpers/people";

it("numbers field returns that are sent at once one after another, without gap or double", async () => {
  await asLead();
  const [one, other] = [await asRequester(), await asOtherRequester()];
  const drafts = [];
  for (let i = 0; i < 12; i += 1) {
    const by = i % 2 === 0 ? one : other;
    drafts.push({ by, draft: await aDraft(undefined, by) });
  }
  const sent = await Promise.all(drafts.map(({ by, draft }) => submitCase(by, draft)));
  const last = sent.map(({ number }) => Number(number.split("-")[2])).sort((a, b) => a - b);
  expect(last).toEqual(Array.from({ length: 12 }, (_, i) => i + 1));
  const kept = await database()
    .select({ id: cases.id, number: cases.number })
    .from(cases)
    .where(isNotNull(cases.number));
  expect(new Map(kept.map(({ id, number }) => [id, number]))).toEqual(
    new Map(sent.map(({ caseId, number }) => [caseId, number])),
  );
});

it("begins each year of the laboratory's calendar at 0001", async () => {
  const [silvester, newYear] = await transaction(async (tx) => [
    await nextCaseNumber(tx, new Date("2030-12-31T12:00:00Z")),
    await nextCaseNumber(tx, new Date("2031-01-01T12:00:00Z")),
  ]);
  expect([silvester, newYear]).toEqual(["RL-2030-0001", "RL-2031-0001"]);
});

it("goes on past 9999 with five digits", async () => {
  await database().insert(caseNumbers).values({ year: 2040, last: 9999 });
  const number = await transaction((tx) => nextCaseNumber(tx, new Date("2040-06-01T12:00:00Z")));
  expect(number).toBe("RL-2040-10000");
});

it("gives a number back when its transaction does not end well", async () => {
  const at = new Date("2050-06-01T12:00:00Z");
  const undone = transaction(async (tx) => {
    await nextCaseNumber(tx, at);
    throw new Error("undone");
  });
  await expect(undone).rejects.toThrow("undone");
  expect(await transaction((tx) => nextCaseNumber(tx, at))).toBe("RL-2050-0001");
});
