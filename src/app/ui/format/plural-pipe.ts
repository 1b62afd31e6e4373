import { Pipe, PipeTransform } from '@angular/core';

const ENGLISH = new Intl.PluralRules('en');
// A thin space between thousands: readable in every locale, never mistaken for a decimal point.
const GROUPED = new Intl.NumberFormat('en', { maximumFractionDigits: 0 });

/** A whole number with a narrow no-break space between thousands: 2914 → "2 914". */
export function grouped(count: number): string {
  return GROUPED.format(count).replaceAll(',', '\u202f');
}

/** A number with its noun: `(1, 'mentee', 'mentees')` → "1 mentee". */
export function counted(count: number, one: string, many: string): string {
  return `${grouped(count)} ${ENGLISH.select(count) === 'one' ? one : many}`;
}

/** `{{ n | plural: 'mentee' : 'mentees' }}` → "1 mentee", "2 mentees". */
@Pipe({ name: 'plural' })
export class PluralPipe implements PipeTransform {
  transform(count: number, one: string, many: string): string {
    return counted(count, one, many);
  }
}
