import { DASH, NO_BREAK_SPACE } from "@/lib/format/marks";

/** The laboratory's wall clock. Server and browser must agree, or a page changes as it loads. */
export const LABORATORY_TIME_ZONE = "Europe/London";

/** A moment, or a calendar day as "2026-12-11", which belongs to no time zone. */
export type DateLike = Date | string | null | undefined;

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];
const CALENDAR_DAY = /^\d{4}-\d{2}-\d{2}$/;
const DAY_MS = 86_400_000;

interface WallClock {
  year: number;
  month: number;
  day: number;
  time: string;
}

const formatters = new Map<string, Intl.DateTimeFormat>();

function formatter(timeZone: string): Intl.DateTimeFormat {
  const known = formatters.get(timeZone);
  if (known) return known;
  const made = new Intl.DateTimeFormat("en-GB", {
    timeZone,
    year: "numeric",
    month: "numeric",
    day: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
  });
  formatters.set(timeZone, made);
  return made;
}

function wallClock(value: DateLike): WallClock | null {
  if (value === null || value === undefined || value === "") return null;
  const isDay = typeof value === "string" && CALENDAR_DAY.test(value);
  const moment = new Date(value);
  if (Number.isNaN(moment.getTime())) return null;
  const parts = formatter(isDay ? "UTC" : LABORATORY_TIME_ZONE).formatToParts(moment);
  const part = (type: Intl.DateTimeFormatPartTypes) =>
    parts.find((candidate) => candidate.type === type)?.value ?? "";
  return {
    year: Number(part("year")),
    month: Number(part("month")),
    day: Number(part("day")),
    time: `${part("hour")}:${part("minute")}`,
  };
}

function dayText({ day, month }: WallClock): string {
  return `${day}${NO_BREAK_SPACE}${MONTHS[month - 1] ?? ""}`;
}

/** "11 Dec 2026" */
export function formatDate(value: DateLike): string {
  const clock = wallClock(value);
  return clock ? `${dayText(clock)}${NO_BREAK_SPACE}${clock.year}` : DASH;
}

/** "11 Dec", for lists whose year is plain from the rest. */
export function formatDay(value: DateLike): string {
  const clock = wallClock(value);
  return clock ? dayText(clock) : DASH;
}

/** "09:40" */
export function formatTime(value: DateLike): string {
  return wallClock(value)?.time ?? DASH;
}

/** "11 Dec 2026 09:40" */
export function formatDateTime(value: DateLike): string {
  const clock = wallClock(value);
  return clock ? `${formatDate(value)}${NO_BREAK_SPACE}${clock.time}` : DASH;
}

/** "11 Dec 2026 09:40 GMT", for what is read far from the laboratory or long after. */
export function formatDateTimeWithZone(value: DateLike): string {
  const clock = wallClock(value);
  if (!clock || !value) return DASH;
  const zone = new Intl.DateTimeFormat("en-GB", {
    timeZone: LABORATORY_TIME_ZONE,
    timeZoneName: "short",
  })
    .formatToParts(new Date(value))
    .find((part) => part.type === "timeZoneName");
  return `${formatDateTime(value)}${NO_BREAK_SPACE}${zone?.value ?? LABORATORY_TIME_ZONE}`;
}

/** Calendar days from now until a date on the laboratory's calendar: 0 today, negative when past. */
export function daysUntil(value: DateLike, now: Date): number | null {
  const then = wallClock(value);
  const today = wallClock(now);
  if (!then || !today) return null;
  const dayNumber = ({ year, month, day }: WallClock) => Date.UTC(year, month - 1, day) / DAY_MS;
  return dayNumber(then) - dayNumber(today);
}

/** How far a due date is: "in 10 days", "tomorrow", "today", "5 days late". */
export function relativeDays(due: DateLike, now: Date): string {
  const days = daysUntil(due, now);
  if (days === null) return DASH;
  if (days === 0) return "today";
  if (days === 1) return "tomorrow";
  if (days > 1) return `in${NO_BREAK_SPACE}${days}${NO_BREAK_SPACE}days`;
  return `${-days}${NO_BREAK_SPACE}${days === -1 ? "day" : "days"}${NO_BREAK_SPACE}late`;
}

/** When something happened, short: "Today 11:26", "Yesterday", "30 Nov", "30 Nov 2025". */
export function formatRecent(value: DateLike, now: Date): string {
  const days = daysUntil(value, now);
  const clock = wallClock(value);
  if (days === null || !clock) return DASH;
  if (days === 0) return `Today${NO_BREAK_SPACE}${clock.time}`;
  if (days === -1) return "Yesterday";
  return clock.year === wallClock(now)?.year ? formatDay(value) : formatDate(value);
}
