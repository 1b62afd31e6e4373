/** Deadlines: the end of a day in the association's time zone. */
import { DateTime } from 'luxon';

/** The last instant of a day (YYYY-MM-DD) in a zone. */
export const endOfDay = (day: string, zone: string): Date => DateTime.fromISO(day, { zone }).endOf('day').toJSDate();

/** Later rounds are answered within a week, even if the cycle's own day has passed. */
const LEAST_DAYS = 7;

/** When answers are due: the cycle's day, or a week from now where that would be sooner. */
export function answersDue(day: string, zone: string, now: Date): Date {
  const soonest = DateTime.fromJSDate(now, { zone }).plus({ days: LEAST_DAYS }).endOf('day').toJSDate();
  const planned = endOfDay(day, zone);
  return planned < soonest ? soonest : planned;
}

/** "Tuesday 15 December 2026, end of the day, Europe/Copenhagen". */
export function dueInWords(due: Date, zone: string, locale: string): string {
  const day = DateTime.fromJSDate(due, { zone }).setLocale(locale).toFormat('cccc d LLLL yyyy');
  return `${day}, end of the day, ${zone}`;
}
