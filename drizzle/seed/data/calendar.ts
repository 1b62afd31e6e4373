/** Days as `YYYY-MM-DD`, counted from a given today. */

const DAY = 86_400_000;

/** The day `offset` days after `today`. */
export function dayAfter(today: string, offset: number): string {
  return new Date(Date.parse(`${today}T00:00:00Z`) + offset * DAY).toISOString().slice(0, 10);
}

/** Whole days from one day to another. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / DAY);
}
