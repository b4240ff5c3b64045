import { TZDate } from "@date-fns/tz";

const DAY = /^(\d{4})-(\d{2})-(\d{2})$/;
const TIME = /^([01]\d|2[0-3]):([0-5]\d)$/;

/** Whether a text is a day of the calendar as "2026-11-17". */
export function isDay(text: string): boolean {
  const parts = DAY.exec(text);
  if (!parts) return false;
  const date = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(date.getTime()) && date.toISOString().startsWith(text);
}

export function isTimeOfDay(text: string): boolean {
  return TIME.test(text);
}

export function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat("en", { timeZone: name }).resolvedOptions().timeZone !== "";
  } catch (error) {
    if (error instanceof RangeError) return false;
    throw error;
  }
}

/** The instant of a day and time in a zone; without a time, the start of that day. */
export function instantOf(day: string, time: string, zone: string): Date {
  const [year = 0, month = 1, date = 1] = day.split("-").map(Number);
  const [hour = 0, minute = 0] = time === "" ? [] : time.split(":").map(Number);
  return new Date(new TZDate(year, month - 1, date, hour, minute, zone).getTime());
}

/** Calendar day of an instant in a zone, "2026-11-17". */
export function dayIn(zone: string, at: Date): string {
  const there = new TZDate(at.getTime(), zone);
  const two = (n: number) => String(n).padStart(2, "0");
  return `${there.getFullYear()}-${two(there.getMonth() + 1)}-${two(there.getDate())}`;
}
