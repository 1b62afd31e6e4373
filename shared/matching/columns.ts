/**
 * A run's input as columns of numbers, so that 15 million pairs can be judged without an object each. Positions are those of
 * `input.mentees` and `input.mentors`.
 */
import type { CareerStage, LanguageLevel, MeetingMode, Sector } from '../profiles/profiles-contract';
import { distanceKm } from './distances';
import { normalisedEmployer, type MatchingInput, type MenteeInput, type MentorInput } from './matching-input';
import { slotBits, slotsSeenFrom, translateSlots, zoneOffset } from './weekly-slots';

const LEVELS: readonly LanguageLevel[] = ['A1', 'A2', 'B1', 'B2', 'C1', 'C2', 'first'];
/** 1 for A1 … 7 for a first language; 0 = none. */
export const levelRank = (level: LanguageLevel): number => LEVELS.indexOf(level) + 1;
export const levelOfRank = (rank: number): LanguageLevel | null => LEVELS[rank - 1] ?? null;

const STAGES: readonly CareerStage[] = ['student', 'graduate', 'candidate', 'chartered', 'senior', 'returning'];
export const stageBit = (stage: CareerStage): number => 1 << STAGES.indexOf(stage);
const SECTORS: readonly Sector[] = ['private', 'public', 'academic', 'self-employed'];

export const IN_PERSON = 1;
export const REMOTE = 2;
const MODE_BITS: Record<MeetingMode, number> = { 'in-person': IN_PERSON, remote: REMOTE, both: IN_PERSON | REMOTE };

/** Cover of a sought tag: 1 the same, 0.8 a child of it is offered, 0.6 its parent is offered. */
export const COVER = { same: 1, child: 0.8, parent: 0.6 } as const;

/** What both sides have. −1 or 0 stands for "not given" as noted. */
export interface SideColumns {
  /** Number of each person; the same person has the same number on both sides. */
  person: Int32Array;
  /** Employer's number; −1 unknown. */
  employer: Int32Array;
  /** Years in practice; −1 unknown. */
  years: Int32Array;
  /** Bits IN_PERSON, REMOTE; 0 unknown. */
  modes: Uint8Array;
  /** Row of the distance table; −1 unknown. */
  town: Int32Array;
  /** Kilometres; Infinity where none is named. */
  reach: Float64Array;
  /** Level by person × language, ranks of `levelRank`. */
  levels: Uint8Array;
  hasLanguages: Uint8Array;
  /** Slots in the person's own zone; 0 = not given. */
  slots: Int32Array;
  /** Number of the person's time zone among the offsets that occur. */
  zone: Int32Array;
  /** −1 unknown. */
  sector: Int32Array;
}

export interface SoughtTags {
  /** Positions in the tag list. */
  tags: Int32Array;
  /** 3, 2, 1 for priority 1, 2, 3. */
  weights: Int32Array;
  total: number;
}

export interface Columns {
  menteeCount: number;
  mentorCount: number;
  mentees: SideColumns;
  mentors: SideColumns;
  languageCount: number;
  languages: readonly string[];
  tagCount: number;
  /** Sought practice areas and topics of each mentee. */
  areas: SoughtTags[];
  topics: SoughtTags[];
  /** Cover by mentor × tag. */
  cover: Float64Array;
  hasOffers: Uint8Array;
  /** Kilometres between towns, by town × town. */
  distances: Float64Array;
  townCount: number;
  /** Mentor's slots as seen in each zone, by mentor × zone. */
  seenSlots: Int32Array;
  zoneCount: number;
  /** Bits of `stageBit`; 0 = any. */
  wishedStages: Int32Array;
  /** Bit of the mentee's stage; 0 = unknown. */
  stage: Int32Array;
}

class Numbering {
  private readonly numbers = new Map<string, number>();
  of(key: string): number {
    const known = this.numbers.get(key);
    if (known !== undefined) return known;
    this.numbers.set(key, this.numbers.size);
    return this.numbers.size - 1;
  }
  get size(): number {
    return this.numbers.size;
  }
  get keys(): string[] {
    return [...this.numbers.keys()];
  }
}

/** Turns the input into columns. Time and memory linear in people, tags and towns squared. */
export function toColumns(input: MatchingInput): Columns {
  const { mentees, mentors } = input;
  const employers = new Numbering();
  const groupOf = employerGroups(input.settings.employerGroups);
  const people = new Numbering();
  const languages = new Numbering();
  for (const person of [...mentees, ...mentors]) for (const skill of person.languages) languages.of(skill.code);
  const towns = Object.keys(input.towns);
  const townIndex = new Map(towns.map((town, index) => [town, index]));
  const offsets = new Map<string, number>();
  const offsetOf = (zone: string): number => {
    if (!offsets.has(zone)) offsets.set(zone, zoneOffset(zone, input.day));
    return offsets.get(zone)!;
  };
  const zones = new Numbering();
  const side = (list: readonly (MenteeInput | MentorInput)[]): SideColumns => ({
    person: Int32Array.from(list, (each) => people.of(each.person)),
    employer: Int32Array.from(list, (each) => {
      const name = normalisedEmployer(each.employer);
      return name === '' ? -1 : employers.of(groupOf.get(name) ?? name);
    }),
    years: Int32Array.from(list, (each) => each.yearsInPractice ?? -1),
    modes: Uint8Array.from(list, (each) => (each.meetingMode ? MODE_BITS[each.meetingMode] : 0)),
    town: Int32Array.from(list, (each) => (each.town === null ? -1 : (townIndex.get(each.town) ?? -1))),
    reach: Float64Array.from(list, (each) => each.maxDistanceKm ?? Infinity),
    levels: levelTable(list, languages),
    hasLanguages: Uint8Array.from(list, (each) => (each.languages.length > 0 ? 1 : 0)),
    slots: Int32Array.from(list, (each) => slotBits(each.availability)),
    zone: Int32Array.from(list, (each) => zones.of(String(offsetOf(each.timeZone)))),
    sector: Int32Array.from(list, (each) => (each.sector === null ? -1 : SECTORS.indexOf(each.sector))),
  });
  const menteeSide = side(mentees);
  const mentorSide = side(mentors);
  const zoneOffsets = zones.keys.map(Number);
  return {
    menteeCount: mentees.length,
    mentorCount: mentors.length,
    mentees: menteeSide,
    mentors: mentorSide,
    languageCount: languages.size,
    languages: languages.keys,
    ...tagColumns(input),
    distances: distanceTable(towns.map((town) => input.towns[town]!)),
    townCount: towns.length,
    seenSlots: seenSlots(mentorSide, zoneOffsets),
    zoneCount: zoneOffsets.length,
    wishedStages: Int32Array.from(mentors, (each) =>
      each.wishedStages.reduce((bits, stage) => bits | stageBit(stage), 0),
    ),
    stage: Int32Array.from(mentees, (each) => (each.careerStage === null ? 0 : stageBit(each.careerStage))),
  };
}

/** Every name of a group stands for the group's first. */
function employerGroups(groups: readonly (readonly string[])[]): Map<string, string> {
  return new Map(
    groups.flatMap((group) => {
      const names = group.map(normalisedEmployer).filter(Boolean);
      return names.map((name): [string, string] => [name, names[0]!]);
    }),
  );
}

function levelTable(list: readonly (MenteeInput | MentorInput)[], languages: Numbering): Uint8Array {
  const table = new Uint8Array(list.length * languages.size);
  list.forEach((person, row) => {
    for (const skill of person.languages)
      table[row * languages.size + languages.of(skill.code)] = levelRank(skill.level);
  });
  return table;
}

function distanceTable(towns: readonly { latitude: number; longitude: number }[]): Float64Array {
  const table = new Float64Array(towns.length * towns.length);
  towns.forEach((a, row) => towns.forEach((b, column) => (table[row * towns.length + column] = distanceKm(a, b))));
  return table;
}

function seenSlots(mentors: SideColumns, zoneOffsets: readonly number[]): Int32Array {
  const count = zoneOffsets.length;
  const tables = zoneOffsets.map((theirs) => zoneOffsets.map((mine) => slotsSeenFrom(theirs - mine)));
  const seen = new Int32Array(mentors.slots.length * count);
  mentors.slots.forEach((bits, mentor) => {
    for (let zone = 0; zone < count; zone++)
      seen[mentor * count + zone] = translateSlots(bits, tables[mentors.zone[mentor]!]![zone]!);
  });
  return seen;
}

function tagColumns(input: MatchingInput): Pick<Columns, 'tagCount' | 'areas' | 'topics' | 'cover' | 'hasOffers'> {
  const { tags, mentees, mentors } = input;
  const index = new Map(tags.map((tag, at) => [tag.id, at]));
  const sought = (mentee: MenteeInput, kind: 'practice-area' | 'topic'): SoughtTags => {
    const chosen = mentee.seeks.filter((choice) => tags[index.get(choice.tagId) ?? -1]?.kind === kind);
    const weights = Int32Array.from(chosen, (choice) => 4 - choice.priority);
    return {
      tags: Int32Array.from(chosen, (choice) => index.get(choice.tagId)!),
      weights,
      total: weights.reduce((sum, weight) => sum + weight, 0),
    };
  };
  const cover = new Float64Array(mentors.length * tags.length);
  mentors.forEach((mentor, row) =>
    coverOf(mentor, tags, index, cover.subarray(row * tags.length, (row + 1) * tags.length)),
  );
  return {
    tagCount: tags.length,
    areas: mentees.map((mentee) => sought(mentee, 'practice-area')),
    topics: mentees.map((mentee) => sought(mentee, 'topic')),
    cover,
    hasOffers: Uint8Array.from(mentors, (mentor) => (mentor.offers.length > 0 ? 1 : 0)),
  };
}

function coverOf(
  mentor: MentorInput,
  tags: MatchingInput['tags'],
  index: ReadonlyMap<string, number>,
  row: Float64Array,
): void {
  const raise = (at: number | undefined, to: number): void => {
    if (at !== undefined && row[at]! < to) row[at] = to;
  };
  const offered = new Set(mentor.offers.map((choice) => choice.tagId));
  for (const id of offered) {
    raise(index.get(id), COVER.same);
    const parent = tags[index.get(id) ?? -1]?.parent;
    if (parent) raise(index.get(parent), COVER.child);
  }
  tags.forEach((tag, at) => {
    if (tag.parent && offered.has(tag.parent)) raise(at, COVER.parent);
  });
}
