import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { changeMark } from "@/lib/images/change-mark";
import { deleteMark } from "@/lib/images/delete-mark";
import { getBench, getBenchState } from "@/lib/images/marks-queries";
import { placeMark } from "@/lib/images/place-mark";
import { restoreMark } from "@/lib/images/restore-mark";
import { aCase, setState } from "../../helpers/cases";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asSecondLead,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";
import { aPicture, aScale, eventsOf, LENGTH, marksOf } from "./a-picture";

let technician: Actor;
let caseId: string;
let imageId: string;
let markId: string;
let deletedId: string;
beforeAll(async () => {
  technician = await asTechnician();
  ({ caseId, imageId } = await aPicture());
  ({ recordId: markId } = await placeMark(technician, { imageId, geometry: LENGTH }));
  ({ recordId: deletedId } = await placeMark(technician, { imageId, geometry: LENGTH }));
  await deleteMark(technician, { markId: deletedId, seenVersion: 1 });
});

const verbs: Record<string, (actor: Actor) => Promise<unknown>> = {
  place: (actor) => placeMark(actor, { imageId, geometry: LENGTH }),
  change: (actor) => changeMark(actor, { markId, seenVersion: 1, geometry: LENGTH }),
  delete: (actor) => deleteMark(actor, { markId, seenVersion: 1 }),
  restore: (actor) => restoreMark(actor, { markId: deletedId }),
  calibrate: (actor) => calibrateImage(actor, aScale(imageId)),
};

async function refusedToAll(actor: Actor, code: string): Promise<void> {
  const before = [await marksOf(technician, imageId), await eventsOf(caseId)];
  for (const [name, verb] of Object.entries(verbs)) {
    expect((await refusal(verb(actor))).code, name).toBe(code);
  }
  expect([await marksOf(technician, imageId), await eventsOf(caseId)]).toEqual(before);
}

describe("who may mark a picture", () => {
  it.each([
    ["the requester of the case", asRequester, "NOT_ALLOWED"],
    ["an administrator", asAdministrator, "NOT_ALLOWED"],
    ["a requester of another client", asOtherRequester, "NOT_FOUND"],
    [
      "a technician who is not on the case",
      () => aPerson("Spare Technician", "technician"),
      "NOT_FOUND",
    ],
  ])("not %s", async (_who, person, code) => {
    await refusedToAll(await person(), code);
  });

  it("not an investigator who is on another case, who may look", async () => {
    const other = await aPerson("Spare Investigator", "investigator");
    await refusedToAll(other, "NOT_ALLOWED");
    const state = await getBenchState(other, imageId);
    expect(state.mayNotMark).not.toBeNull();
    expect(state.mayNotCalibrate).not.toBeNull();
  });

  it.each([
    ["technician", asTechnician],
    ["investigator", asInvestigator],
    ["lead engineer", asLead],
    ["lead engineer of another case", asSecondLead],
  ])("the %s", async (_who, person) => {
    const actor = await person();
    const { imageId: image } = await aPicture();
    const { recordId } = await placeMark(actor, { imageId: image, geometry: LENGTH });
    await calibrateImage(actor, aScale(image));
    await deleteMark(actor, { markId: recordId, seenVersion: 2 });
    await restoreMark(actor, { markId: recordId });
    expect((await getBenchState(actor, image)).mayNotMark).toBeNull();
  });

  it.each(["signed", "released", "closed", "in_approval"] as const)(
    "nobody when the case is %s, and each verb says that it is locked",
    async (state) => {
      await setState(caseId, state);
      for (const person of [asTechnician, asInvestigator, asLead]) {
        await refusedToAll(await person(), "LOCKED");
      }
      expect((await getBenchState(technician, imageId)).mayNotMark).not.toBeNull();
      await setState(caseId, "examining");
    },
  );
});

describe("who may look at the bench", () => {
  it("not the requester of the case, who knows that there is work, nor an administrator", async () => {
    for (const person of [asRequester, asAdministrator]) {
      const error = await refusal(getBenchState(await person(), imageId));
      expect(error.code).toBe("NOT_ALLOWED");
    }
  });

  it("not a requester of another client: it answers as if it were not there", async () => {
    const stranger = await asOtherRequester();
    const error = await refusal(getBenchState(stranger, imageId));
    const nowhere = await refusal(getBenchState(stranger, "rec_none"));
    expect([error.code, error.message]).toEqual([nowhere.code, nowhere.message]);
  });

  it("shows no picture under another case", async () => {
    const elsewhere = await aCase();
    expect(await refusal(getBench(technician, elsewhere, imageId))).toMatchObject({
      code: "NOT_FOUND",
    });
  });

  it("has no mark by an id that is no mark", async () => {
    for (const id of [imageId, caseId, "rec_none", "' or 1=1 --"]) {
      expect(
        await refusal(changeMark(technician, { markId: id, seenVersion: 1, geometry: LENGTH })),
      ).toMatchObject({ code: "NOT_FOUND" });
      expect(await refusal(restoreMark(technician, { markId: id }))).toMatchObject({
        code: "NOT_FOUND",
      });
    }
  });
});
