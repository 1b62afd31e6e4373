/** The seed's own time: verbs are called as if it were the day on which the demo says they happened. */
import { DateTime } from 'luxon';
import type { Actor, Context } from '../../src/server/platform';

const ZONE = 'Europe/Copenhagen';

/** An instant of a day (YYYY-MM-DD) in the association's zone. */
export const instantOf = (day: string, hour = 10, minute = 0): Date =>
  DateTime.fromISO(day, { zone: ZONE }).set({ hour, minute }).toJSDate();

export const todayThere = (): string => DateTime.now().setZone(ZONE).toISODate()!;

export const daysAfter = (day: string, days: number): string =>
  DateTime.fromISO(day, { zone: ZONE }).plus({ days }).toISODate()!;

/** The context at another time and, if wished, as another person. */
export const at = (ctx: Context, moment: Date, actor: Actor | null = ctx.actor): Context => ({
  ...ctx,
  actor,
  now: () => moment,
});
