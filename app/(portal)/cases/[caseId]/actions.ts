"use server";

import { revalidatePath } from "next/cache";
import { acceptCase } from "@/lib/cases/accept-case";
import { askBack } from "@/lib/cases/ask-back";
import { assignPeople } from "@/lib/cases/assign-people";
import { cancelCase } from "@/lib/cases/cancel-case";
import { clearHold } from "@/lib/cases/clear-hold";
import { declineCase } from "@/lib/cases/decline-case";
import { holdCase } from "@/lib/cases/hold-case";
import {
  AcceptCaseInput,
  AskBackInput,
  AssignPeopleInput,
  CancelCaseInput,
  ClearHoldInput,
  DeclineCaseInput,
  HoldCaseInput,
} from "@/lib/cases/schemas";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";

const refresh = (caseId: string) => revalidatePath(routes.case(caseId), "layout");

export const accept = action(
  { permission: "case.accept", input: AcceptCaseInput },
  async (actor, input) => {
    await acceptCase(actor, input);
    refresh(input.caseId);
  },
);

export const ask = action(
  { permission: "case.askBack", input: AskBackInput },
  async (actor, input) => {
    await askBack(actor, input);
    refresh(input.caseId);
  },
);

export const decline = action(
  { permission: "case.decline", input: DeclineCaseInput },
  async (actor, input) => {
    await declineCase(actor, input);
    refresh(input.caseId);
  },
);

export const cancel = action(
  { permission: "case.cancel", input: CancelCaseInput },
  async (actor, input) => {
    await cancelCase(actor, input);
    refresh(input.caseId);
  },
);

export const assign = action(
  { permission: "case.assign", input: AssignPeopleInput },
  async (actor, input) => {
    await assignPeople(actor, input);
    refresh(input.caseId);
  },
);

export const hold = action(
  { permission: "case.hold", input: HoldCaseInput },
  async (actor, input) => {
    await holdCase(actor, input);
    refresh(input.caseId);
  },
);

export const takeOffHold = action(
  { permission: "case.clearHold", input: ClearHoldInput },
  async (actor, input) => {
    await clearHold(actor, input);
    refresh(input.caseId);
  },
);
