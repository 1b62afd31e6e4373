/** What is true of two people: the facts that rules judge, criteria score and sentences name. */
import { COVER, IN_PERSON, REMOTE, type Columns, type SoughtTags } from './columns';
import { bitCount } from './weekly-slots';

/** The best common language at the lower of both levels: its rank (0 = none) and its number. */
export function bestLanguage(columns: Columns, i: number, j: number): { rank: number; language: number } {
  let rank = 0;
  let language = -1;
  for (let each = 0; each < columns.languageCount; each++) {
    const lower = commonRank(columns, i, j, each);
    if (lower > rank) {
      rank = lower;
      language = each;
    }
  }
  return { rank, language };
}

function commonRank({ mentees, mentors, languageCount }: Columns, i: number, j: number, language: number): number {
  const mine = mentees.levels[i * languageCount + language]!;
  const theirs = mentors.levels[j * languageCount + language]!;
  return mine < theirs ? mine : theirs;
}

/** The rank alone; the quick way for millions of pairs. */
export function languageRank(columns: Columns, i: number, j: number): number {
  let best = 0;
  for (let each = 0; each < columns.languageCount; each++) {
    const lower = commonRank(columns, i, j, each);
    if (lower > best) best = lower;
  }
  return best;
}

export const bothRemote = ({ mentees, mentors }: Columns, i: number, j: number): boolean =>
  (mentees.modes[i]! & mentors.modes[j]! & REMOTE) !== 0;
export const bothInPerson = ({ mentees, mentors }: Columns, i: number, j: number): boolean =>
  (mentees.modes[i]! & mentors.modes[j]! & IN_PERSON) !== 0;

/** Kilometres between their towns; −1 where one is unknown. */
export function kilometres({ mentees, mentors, distances, townCount }: Columns, i: number, j: number): number {
  const a = mentees.town[i]!;
  const b = mentors.town[j]!;
  return a < 0 || b < 0 ? -1 : distances[a * townCount + b]!;
}

/** Common times of the week, as bits in the mentee's own zone. */
export const commonSlots = ({ mentees, seenSlots, zoneCount }: Columns, i: number, j: number): number =>
  mentees.slots[i]! & seenSlots[j * zoneCount + mentees.zone[i]!]!;
export const commonSlotCount = (columns: Columns, i: number, j: number): number => bitCount(commonSlots(columns, i, j));

/** Sought tags that the mentor covers, at any grade. */
export function coveredCount(columns: Columns, sought: SoughtTags, j: number): number {
  let covered = 0;
  for (const tag of sought.tags) if (columns.cover[j * columns.tagCount + tag]! > 0) covered++;
  return covered;
}

/** Weighted coverage, 0..1. Tversky's index (1977) with α = 1, β = 0: what a mentor offers besides costs nothing. */
export function coverage(columns: Columns, sought: SoughtTags, j: number): number {
  let sum = 0;
  const row = j * columns.tagCount;
  for (let at = 0; at < sought.tags.length; at++) sum += sought.weights[at]! * columns.cover[row + sought.tags[at]!]!;
  return sum / sought.total;
}

/** How a covered tag is covered, in words. */
export function coverInWords(cover: number): string {
  if (cover === COVER.same) return 'offered';
  if (cover === COVER.child) return 'a part of it offered';
  return cover === COVER.parent ? 'the area it belongs to offered' : 'not offered';
}
