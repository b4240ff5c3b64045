import { describe, expect, it } from "vitest";
import { stagePeriods } from "@/lib/cases/stage-periods";

const now = new Date("2026-12-01T12:00:00Z");

describe("stagePeriods", () => {
  it("leaves out the draft and runs moves within a stage together", () => {
    const periods = stagePeriods(
      [
        { to: "draft", at: "2026-11-01T08:00:00Z" },
        { to: "submitted", at: "2026-11-02T08:00:00Z" },
        { to: "info_needed", at: "2026-11-03T08:00:00Z" },
        { to: "submitted", at: "2026-11-04T08:00:00Z" },
        { to: "accepted", at: "2026-11-05T08:00:00Z" },
      ],
      now,
    );
    expect(periods).toEqual([
      { stage: "Received", step: 1, from: "2026-11-02T08:00:00Z", to: "2026-11-05T08:00:00Z" },
      { stage: "Accepted", step: 2, from: "2026-11-05T08:00:00Z", to: now.toISOString() },
    ]);
  });

  it("ends where a case is declined", () => {
    const periods = stagePeriods(
      [
        { to: "submitted", at: "2026-11-02T08:00:00Z" },
        { to: "declined", at: "2026-11-03T08:00:00Z" },
      ],
      now,
    );
    expect(periods).toEqual([
      { stage: "Received", step: 1, from: "2026-11-02T08:00:00Z", to: "2026-11-03T08:00:00Z" },
    ]);
  });

  it("is empty before a case is sent", () => {
    expect(stagePeriods([{ to: "draft", at: "2026-11-01T08:00:00Z" }], now)).toEqual([]);
  });
});
