import { describe, expect, it } from "vitest";
import { POLICY } from "@/lib/auth/policy";
import { CASE_STATES, STAGE_OF_STATE } from "@/lib/cases/constants";
import {
  canMove,
  ENDED_STATES,
  LOCKED_STATES,
  MOVES,
  stageName,
  WORK_STATES,
} from "@/lib/cases/lifecycle";

describe("the life of a case", () => {
  it("names a rule of the policy for every move", () => {
    for (const move of Object.values(MOVES)) expect(Object.keys(POLICY)).toContain(move.action);
  });
  it("never works on and locks a case at once", () => {
    expect(
      WORK_STATES.filter((state) => LOCKED_STATES.includes(state) || ENDED_STATES.includes(state)),
    ).toEqual([]);
  });
  it("lets a released report change only through a new issue", () => {
    const leaving = Object.entries(MOVES).filter(([name]) =>
      canMove(name as keyof typeof MOVES, "released"),
    );
    expect(leaving.map(([name]) => name)).toEqual(["reopen"]);
  });
  it("lets nothing leave declined or cancelled", () => {
    for (const name of Object.keys(MOVES) as (keyof typeof MOVES)[]) {
      expect(canMove(name, "declined")).toBe(false);
      expect(canMove(name, "cancelled")).toBe(false);
    }
  });
  it("has a stage for every state but drafts and grey ends", () => {
    const without = CASE_STATES.filter((state) => stageName(state) === null);
    expect(without).toEqual(["draft", "declined", "cancelled"]);
    expect(STAGE_OF_STATE.in_review).toBe(5);
  });
});
