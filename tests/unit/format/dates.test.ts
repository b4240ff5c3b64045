import { describe, expect, test } from "vitest";
import {
  daysUntil,
  formatDate,
  formatDateTime,
  formatDateTimeWithZone,
  formatDay,
  formatRecent,
  formatTime,
  relativeDays,
} from "@/lib/format/dates";
import { initials } from "@/lib/format/initials";

const plain = (text: string) => text.replace(/\u00a0/g, " ");
const now = new Date("2026-12-01T11:40:00Z");

describe("dates", () => {
  test("a moment is shown on the laboratory's clock, summer time included", () => {
    expect(plain(formatDateTime(new Date("2026-12-11T09:40:00Z")))).toBe("11 Dec 2026 09:40");
    expect(plain(formatDateTime(new Date("2026-07-01T23:30:00Z")))).toBe("2 Jul 2026 00:30");
    expect(formatTime("2026-12-11T00:05:00.000Z")).toBe("00:05");
  });

  test("the zone is named where the clock alone could be read in two ways", () => {
    // The hour of 25 October 2026 that comes twice on the laboratory's clock.
    const shown = ["2026-10-25T00:30:00Z", "2026-10-25T01:30:00Z"].map(formatDateTimeWithZone);
    expect(shown.map(plain)).toEqual(["25 Oct 2026 01:30 BST", "25 Oct 2026 01:30 GMT"]);
  });

  test("a calendar day stays that day whatever the time zone", () => {
    expect(plain(formatDate("2026-07-01"))).toBe("1 Jul 2026");
    expect(plain(formatDay("2026-09-30"))).toBe("30 Sep");
  });

  test.each([null, undefined, "", "not a date"])("no date (%s) is a dash", (value) => {
    const shown = [formatDate, formatDay, formatTime, formatDateTime, formatDateTimeWithZone].map(
      (show) => show(value),
    );
    expect(new Set(shown)).toEqual(new Set(["–"]));
    expect(relativeDays(value, now)).toBe("–");
    expect(formatRecent(value, now)).toBe("–");
  });
});

describe("relative days", () => {
  test.each([
    ["2026-12-11", "in 10 days"],
    ["2026-12-02", "tomorrow"],
    ["2026-12-01", "today"],
    ["2026-11-30", "1 day late"],
    ["2026-11-26", "5 days late"],
  ])("%s is %s", (due, text) => {
    expect(plain(relativeDays(due, now))).toBe(text);
  });

  test("days are counted on the calendar, not in blocks of 24 hours", () => {
    expect(daysUntil(new Date("2026-12-02T00:01:00Z"), new Date("2026-12-01T23:59:00Z"))).toBe(1);
    // The clock goes forward on 29 March 2026, so this day has 23 hours.
    expect(daysUntil("2026-03-30", new Date("2026-03-28T12:00:00Z"))).toBe(2);
  });

  test.each([
    ["2026-12-01T11:26:00Z", "Today 11:26"],
    ["2026-11-30T23:59:00Z", "Yesterday"],
    ["2026-11-26T10:00:00Z", "26 Nov"],
    ["2025-11-26T10:00:00Z", "26 Nov 2025"],
  ])("%s happened %s", (moment, text) => {
    expect(plain(formatRecent(moment, now))).toBe(text);
  });
});

test.each([
  ["Idris Vale", "IV"],
  ["Åsa van der Berg", "ÅB"],
  ["Riverline", "R"],
  ["  ", ""],
])("%s has the initials %s", (name, letters) => {
  expect(initials(name)).toBe(letters);
});
