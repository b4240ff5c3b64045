import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { earlierReturns } from "@/lib/cases/earlier-returns";
import { readFieldReturn } from "@/lib/intake/read-field-return";
import { manyCases } from "../../helpers/case-lists";
import { caseRow } from "../../helpers/case-traces";
import { aDraft, sendableAnswers, value } from "../../helpers/field-returns";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";

const at = (day: number) => new Date(Date.UTC(2026, 9, 1) + day * 86_400_000);

let ids: string[];
beforeAll(async () => {
  const other = await asOtherRequester();
  const theirs = { organisationId: other.organisationId, requesterId: other.id };
  ids = await manyCases([
    { drawingNumber: "HB-2210", submittedAt: at(1), state: "closed" },
    { drawingNumber: "HB-2210", submittedAt: at(2), state: "declined" },
    { drawingNumber: "HB-2210", submittedAt: at(3), ...theirs },
    { drawingNumber: "HB-2210", submittedAt: at(4) },
    { drawingNumber: "HB-2210", submittedAt: at(5) },
    { drawingNumber: "HB-2211", submittedAt: at(1) },
    { drawingNumber: "HB-22", submittedAt: at(1) },
    { drawingNumber: "", submittedAt: at(1) },
    { drawingNumber: "", submittedAt: at(2) },
    { drawingNumber: "HB-2210", submittedAt: at(2.5), isRestricted: true },
    { drawingNumber: "HB-2210", state: "draft" },
  ]);
});

const indexes = async (actor: Actor, of: number) => {
  const row = await caseRow(ids[of] ?? "");
  return (await earlierReturns(actor, row)).map(({ caseId }) => ids.indexOf(caseId));
};

describe("earlier returns of the same drawing", () => {
  it("are those sent before, newest first, ended ones too", async () => {
    expect(await indexes(await asLead(), 3)).toEqual([2, 9, 1, 0]);
  });

  it("hold nothing sent later, no draft and not the case itself", async () => {
    const found = await indexes(await asLead(), 0);
    expect(found).toEqual([]);
  });

  it("are none where no drawing is named", async () => {
    expect(await indexes(await asLead(), 8)).toEqual([]);
  });

  it("are only those that this person may see", async () => {
    expect(await indexes(await asRequester(), 3)).not.toContain(2);
    expect(await indexes(await asOtherRequester(), 3)).toEqual([2]);
    expect(await indexes(await asInvestigator(), 3)).not.toContain(9);
    expect(await indexes(await asTechnician(), 3)).toEqual([]);
    expect(await indexes(await asAdministrator(), 3)).not.toContain(9);
  });

  it("stand beside a draft on the same drawing", async () => {
    const requester = await asRequester();
    const { caseId } = await aDraft(sendableAnswers({ drawingNumber: value(" HB-2210 ") }));
    const page = await readFieldReturn(requester, caseId);
    expect(page.earlier.map((one) => ids.indexOf(one.caseId))).toEqual([4, 3, 9, 1, 0]);
    expect(page.earlier[0]).toMatchObject({ title: "A shaft that broke", state: "submitted" });
  });
});
