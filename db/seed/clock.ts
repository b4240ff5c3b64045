import type { Pool } from "mysql2/promise";

const RealDate = Date;
let offsetMs = 0;

/** The demonstration happened over the past weeks, so its clock is set back while it is written. */
class StoryDate extends RealDate {
  constructor(...args: [] | ConstructorParameters<typeof Date>) {
    if (args.length === 0) super(RealDate.now() + offsetMs);
    else super(...(args as ConstructorParameters<typeof Date>));
  }
  static override now(): number {
    return RealDate.now() + offsetMs;
  }
}

/** Makes both this process and its database sessions tell the time of the story. */
export function installStoryClock(pool: Pool): void {
  globalThis.Date = StoryDate as DateConstructor;
  pool.pool.on("acquire", (connection) => {
    connection.query(`SET timestamp = ${(RealDate.now() + offsetMs) / 1000}`);
  });
}

/** Sets the clock to `time` on the day `days` before today; a story never runs into the future. */
export function setStoryTime(daysAgo: number, time: `${number}:${number}`): void {
  const [hours, minutes] = time.split(":").map(Number);
  const day = new RealDate(RealDate.now() - daysAgo * 86_400_000);
  day.setUTCHours(hours ?? 0, minutes ?? 0, 0, 0);
  offsetMs = Math.min(day.getTime() - RealDate.now(), 0);
}

export function setRealTime(): void {
  offsetMs = 0;
}

/** Calendar day so many days from today, YYYY-MM-DD. */
export function storyDay(daysFromToday: number): string {
  return new RealDate(RealDate.now() + daysFromToday * 86_400_000).toISOString().slice(0, 10);
}
