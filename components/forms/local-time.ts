/** Value of a datetime-local field for a moment, in the browser's zone. */
export function toLocalInput(moment: Date): string {
  const shifted = new Date(moment.getTime() - moment.getTimezoneOffset() * 60_000);
  return shifted.toISOString().slice(0, 16);
}

/** ISO time of a datetime-local field; empty stays empty, so that the schema can say so. */
export function fromLocalInput(text: string): string {
  const time = Date.parse(text);
  return Number.isNaN(time) ? "" : new Date(time).toISOString();
}
