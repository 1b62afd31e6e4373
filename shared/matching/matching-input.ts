/**
 * What a run reads: applicants by pseudonymous keys, with the parts of their profiles that rules and criteria need and no
 * others. Answers to equality-monitoring questions have no field here, and must never get one.
 */
import type {
  CareerStage,
  LanguageSkill,
  MeetingMode,
  Sector,
  SectorWish,
  Slot,
  TagChoice,
} from '../profiles/profiles-contract';
import type { MatchingSettings } from './matching-contract';

interface ApplicantInput {
  /** The application. */
  key: string;
  /** The person behind it: one person may apply on both sides. */
  person: string;
  employer: string;
  town: string | null;
  timeZone: string;
  languages: LanguageSkill[];
  yearsInPractice: number | null;
  sector: Sector | null;
  meetingMode: MeetingMode | null;
  maxDistanceKm: number | null;
  availability: Slot[];
  /** People whom this one asked not to be paired with. */
  exclusions: string[];
  /** People with whom this one has declared an interest. */
  declaredInterests: string[];
}

export interface MenteeInput extends ApplicantInput {
  seeks: TagChoice[];
  careerStage: CareerStage | null;
  wishedYearsMin: number | null;
  wishedYearsMax: number | null;
  wishedSector: SectorWish;
  /** Mentors (people) named in the application, first wish first. */
  preferred: string[];
  leftOutLastTime: boolean;
}

export interface MentorInput extends ApplicantInput {
  offers: TagChoice[];
  wishedStages: CareerStage[];
  /** Places to give in this run. */
  places: number;
  /** Would take one more if asked; changes no plan, but names who to ask first. */
  oneMoreIfAsked: boolean;
  /** Places given away in earlier rounds. */
  taken: number;
}

export interface MatchingInput {
  settings: MatchingSettings;
  /** A day (YYYY-MM-DD) of the cycle: decides between summer and winter time. */
  day: string;
  mentees: MenteeInput[];
  mentors: MentorInput[];
  tags: { id: string; label: string; kind: 'practice-area' | 'topic'; parent: string | null }[];
  /** Degrees, and the region each town lies in. */
  towns: Record<string, { latitude: number; longitude: number; region: string }>;
  /** Pairs of people of earlier cycles, and how many cycles ago (1 = the last one). */
  earlier: { mentee: string; mentor: string; cyclesAgo: number }[];
  /** Pairs of people of which one declined in this cycle. */
  declined: { mentee: string; mentor: string }[];
  /** Pairs of applications that a coordinator locked or barred. */
  decisions: { mentee: string; mentor: string; kind: 'lock' | 'bar'; overridesRules: boolean }[];
}

/** Lower case, without accents, punctuation and legal forms, so that one employer has one name. */
export function normalisedEmployer(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/&/g, ' and ')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .replace(/\b(ltd|limited|llp|plc|inc|gmbh|as|ab|aps|oy|group|holdings?)\b/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}

/** 32-bit FNV-1a (Fowler, Noll, Vo; constants from memory) with a final mix, of the seed and a key. */
function seededHash(seed: number, key: string): number {
  let hash = (2166136261 ^ seed) >>> 0;
  for (let at = 0; at < key.length; at++) hash = Math.imul(hash ^ key.charCodeAt(at), 16777619) >>> 0;
  hash = Math.imul(hash ^ (hash >>> 15), 2246822519) >>> 0;
  return (hash ^ (hash >>> 13)) >>> 0;
}

const textOrder = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/**
 * The same input in its one canonical form: people sorted by hash(seed, key), everything else by text. Row order of the
 * source cannot matter after this, and equal inputs give equal text.
 */
export function canonicalInput(input: MatchingInput): MatchingInput {
  const bySeed = <T extends { key: string }>(items: readonly T[]): T[] =>
    items
      .map((item) => ({ item, hash: seededHash(input.settings.seed, item.key) }))
      .sort((a, b) => a.hash - b.hash || textOrder(a.item.key, b.item.key))
      .map(({ item }) => item);
  const byText = <T>(items: readonly T[]): T[] =>
    items
      .map((item) => ({ item, text: JSON.stringify(item) }))
      .sort((a, b) => textOrder(a.text, b.text))
      .map(({ item }) => item);
  const common = <T extends ApplicantInput>(person: T): T => ({
    ...person,
    languages: byText(person.languages),
    availability: byText(person.availability),
    exclusions: byText(person.exclusions),
    declaredInterests: byText(person.declaredInterests),
  });
  return {
    settings: input.settings,
    day: input.day,
    mentees: bySeed(input.mentees).map((mentee) => ({ ...common(mentee), seeks: byText(mentee.seeks) })),
    mentors: bySeed(input.mentors).map((mentor) => ({
      ...common(mentor),
      offers: byText(mentor.offers),
      wishedStages: byText(mentor.wishedStages),
    })),
    tags: byText(input.tags),
    towns: Object.fromEntries(Object.entries(input.towns).sort(([a], [b]) => textOrder(a, b))),
    earlier: byText(input.earlier),
    declined: byText(input.declined),
    decisions: byText(input.decisions),
  };
}
