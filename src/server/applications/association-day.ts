import { DateTime } from 'luxon';
import { findAssociation } from '../accounts';
import type { Context } from '../platform';

/** The day it is in the association's time zone, `YYYY-MM-DD`; deadlines end with such a day. */
export async function associationDay(ctx: Context): Promise<string> {
  const association = await findAssociation(ctx.db);
  return DateTime.fromJSDate(ctx.now(), { zone: association?.timeZone ?? 'UTC' }).toFormat('yyyy-MM-dd');
}

/** A day as messages write it: “Wednesday, 16 December 2026”. A day has no time zone. */
export const dayInWords = (day: string, locale: string): string =>
  DateTime.fromISO(day, { zone: 'UTC' }).setLocale(locale).toLocaleString({
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    year: 'numeric',
  });
