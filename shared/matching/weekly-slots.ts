/** Weekly times in bits, and what is left of them in somebody else's time zone. */
import { SLOTS, type Slot } from '../profiles/profiles-contract';

/** Local hours of each part of a day: morning 7–12, midday 12–14, afternoon 14–18, evening 18–22. */
const PART_HOURS = [
  [7, 12],
  [12, 14],
  [14, 18],
  [18, 22],
] as const;
const WEEK_MINUTES = 7 * 24 * 60;
/** A time is common where the other is free for at least this long of it. */
const LEAST_MINUTES = 60;

/** One bit for each slot of the week, in the order of SLOTS. */
export function slotBits(slots: readonly Slot[]): number {
  let bits = 0;
  for (const slot of slots) bits |= 1 << SLOTS.indexOf(slot);
  return bits;
}

/** The slots of a set of bits. */
export const slotsOfBits = (bits: number): Slot[] => SLOTS.filter((_, index) => bits & (1 << index));

/** Number of bits set (Hacker's Delight, Warren 2002, section 5-1). */
export function bitCount(bits: number): number {
  let n = bits - ((bits >>> 1) & 0x55555555);
  n = (n & 0x33333333) + ((n >>> 2) & 0x33333333);
  return Math.imul((n + (n >>> 4)) & 0x0f0f0f0f, 0x01010101) >>> 24;
}

/** Minutes by which a zone is ahead of UTC at noon (UTC) of a day. */
export function zoneOffset(zone: string, day: string): number {
  const noon = new Date(`${day}T12:00:00Z`);
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
  }).formatToParts(noon);
  const value = (type: string): number => Number(parts.find((part) => part.type === type)?.value ?? 0);
  const local = Date.UTC(value('year'), value('month') - 1, value('day'), value('hour'), value('minute'));
  return Math.round((local - noon.getTime()) / 60_000);
}

function minutesOf(index: number): readonly [number, number] {
  const day = Math.floor(index / PART_HOURS.length) * 24 * 60;
  const [from, to] = PART_HOURS[index % PART_HOURS.length]!;
  return [day + from * 60, day + to * 60];
}

/**
 * For each slot of somebody `ahead` minutes ahead of the reader, the reader's slots of which it covers at least an hour.
 * 28 masks of 28 bits.
 */
export function slotsSeenFrom(ahead: number): Int32Array {
  const seen = new Int32Array(SLOTS.length);
  for (let theirs = 0; theirs < SLOTS.length; theirs++) {
    for (let mine = 0; mine < SLOTS.length; mine++) {
      if (sharedMinutes(minutesOf(theirs), minutesOf(mine), ahead) >= LEAST_MINUTES) seen[theirs]! |= 1 << mine;
    }
  }
  return seen;
}

function sharedMinutes(theirs: readonly [number, number], mine: readonly [number, number], ahead: number): number {
  let shared = 0;
  for (const shift of [-WEEK_MINUTES, 0, WEEK_MINUTES]) {
    const from = theirs[0] - ahead + shift;
    const to = theirs[1] - ahead + shift;
    shared += Math.max(0, Math.min(to, mine[1]) - Math.max(from, mine[0]));
  }
  return shared;
}

/** The reader's slots that `bits` of the other cover, by a table of `slotsSeenFrom`. */
export function translateSlots(bits: number, seen: Int32Array): number {
  let translated = 0;
  for (let slot = 0; slot < seen.length; slot++) if (bits & (1 << slot)) translated |= seen[slot]!;
  return translated;
}
