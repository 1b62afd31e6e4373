/** Reads single cells of an applicants' file. Each reader answers with the value or says, in a sentence, what is wrong. */
import {
  CAREER_STAGE_LABEL,
  type CareerStage,
  DAY_PARTS,
  DAYS,
  type DayPart,
  type LanguageLevel,
  type LanguageSkill,
  type MeetingMode,
  MEETING_MODE_LABEL,
  type Region,
  REGION_LABEL,
  type Sector,
  SECTOR_LABEL,
  type Slot,
} from '../profiles/profiles-contract';
import { folded } from '../tags/tag-search';
import type { ApplicationSide } from './applications-contract';
import { languageCode } from './language-names';

export interface CellFault {
  value: string;
  message: string;
}
export type Cell<T> = { value: T } | { faults: CellFault[] };
export type CellReader<T> = (text: string) => Cell<T>;

export const good = <T>(value: T): Cell<T> => ({ value });
export const bad = (value: string, message: string): { faults: CellFault[] } => ({ faults: [{ value, message }] });

const bare = (text: string): string => folded(text).replace(/[^\p{L}\p{N}]+/gu, '');

/** The items of a list inside one cell: separated by semicolons, bars or line breaks. */
export const listItems = (text: string): string[] =>
  text
    .split(/[;|\n]/)
    .map((item) => item.trim())
    .filter((item) => item !== '');

/** Reads a list item by item and collects everything that is wrong with it; repeated items count once. */
export function listOf<T>(read: CellReader<T>, keyOf: (item: T) => string): CellReader<T[]> {
  return (text) => {
    const values = new Map<string, T>();
    const faults: CellFault[] = [];
    for (const item of listItems(text)) {
      const cell = read(item);
      if ('faults' in cell) faults.push(...cell.faults);
      else if (!values.has(keyOf(cell.value))) values.set(keyOf(cell.value), cell.value);
    }
    return faults.length > 0 ? { faults } : good([...values.values()]);
  };
}

function chosenFrom<K extends string>(
  what: string,
  labels: Record<K, string>,
  synonyms: Record<string, K>,
): CellReader<K> {
  const keys = Object.keys(labels) as K[];
  const known = new Map<string, K>(Object.entries(synonyms));
  for (const key of keys) known.set(bare(key), key).set(bare(labels[key]), key);
  return (text) => {
    const key = known.get(bare(text));
    return key ? good(key) : bad(text, `“${text}” is no ${what}; use ${keys.map((each) => labels[each]).join(', ')}`);
  };
}

export const readRegion = chosenFrom<Region>('region', REGION_LABEL, {});
export const readStage = chosenFrom<CareerStage>('career stage', CAREER_STAGE_LABEL, {
  trainee: 'graduate',
  principal: 'senior',
  charteredmember: 'chartered',
  returner: 'returning',
});
export const readSector = chosenFrom<Sector>('sector', SECTOR_LABEL, {
  authority: 'public',
  government: 'public',
  publicsector: 'public',
  privatesector: 'private',
  academia: 'academic',
  university: 'academic',
  research: 'academic',
  freelance: 'self-employed',
});
export const readMode = chosenFrom<MeetingMode>('way of meeting', MEETING_MODE_LABEL, {
  online: 'remote',
  video: 'remote',
  facetoface: 'in-person',
  either: 'both',
  any: 'both',
  remoteorinperson: 'both',
});

const SIDES: Record<string, ApplicationSide[]> = {
  mentor: ['mentor'],
  mentors: ['mentor'],
  mentee: ['mentee'],
  mentees: ['mentee'],
  both: ['mentor', 'mentee'],
  mentorandmentee: ['mentor', 'mentee'],
  mentormentee: ['mentor', 'mentee'],
  menteeandmentor: ['mentor', 'mentee'],
};
export const readSides: CellReader<ApplicationSide[]> = (text) => {
  const sides = SIDES[bare(text)];
  return sides ? good(sides) : bad(text, `“${text}” is no side; use mentor, mentee or both`);
};

const YES = new Set(['yes', 'y', 'true', '1', 'x']);
const NO = new Set(['no', 'n', 'false', '0', '']);
export const readYes: CellReader<boolean> = (text) => {
  const word = bare(text);
  if (YES.has(word)) return good(true);
  return NO.has(word) ? good(false) : bad(text, `“${text}” is neither yes nor no`);
};

/** A whole number in a range; a unit behind it (“12 years”, “80 km”) does no harm. */
export function numberBetween(min: number, max: number, what: string): CellReader<number> {
  return (text) => {
    const digits = /^(-?\d{1,6})(?:[.,]0+)?\s*(?:years?|yrs?|km|places?)?\.?$/i.exec(text)?.[1];
    const value = Number(digits);
    return digits !== undefined && value >= min && value <= max
      ? good(value)
      : bad(text, `${what} must be a whole number from ${min} to ${max}`);
  };
}

export function textUpTo(max: number): CellReader<string> {
  return (text) =>
    text.length <= max ? good(text.normalize('NFC')) : bad(`${text.slice(0, 60)}…`, `At most ${max} characters`);
}

export const readTimeZone: CellReader<string> = (text) => {
  try {
    new Intl.DateTimeFormat('en', { timeZone: text });
    return good(text);
  } catch {
    return bad(text, `“${text}” is no time zone; use a name like Europe/Copenhagen`);
  }
};

const LEVELS: Record<string, LanguageLevel> = {
  a1: 'A1',
  a2: 'A2',
  b1: 'B1',
  b2: 'B2',
  c1: 'C1',
  c2: 'C2',
  first: 'first',
  firstlanguage: 'first',
  native: 'first',
  mothertongue: 'first',
};
const LANGUAGE = /^(\p{L}[\p{L} -]*?)[\s:(,–-]+([ABC][12]|first(?: language)?|native|mother tongue)\)?$/iu;

/** “en:C1”, “English C1”, “Danish (first language)”. */
export const readLanguage: CellReader<LanguageSkill> = (text) => {
  const [, name, level] = LANGUAGE.exec(text) ?? [];
  if (name === undefined || level === undefined)
    return bad(text, `“${text}” needs a language and its level, such as English C1 or da:first`);
  const code = languageCode(name);
  const skill = LEVELS[bare(level)];
  if (code === null || skill === undefined) return bad(text, `“${name}” is no language that is known here`);
  return good({ code, level: skill });
};

const PARTS: Record<string, DayPart> = {
  ...Object.fromEntries(
    DAY_PARTS.flatMap((part) => [
      [part, part],
      [`${part}s`, part],
    ]),
  ),
  am: 'morning',
  noon: 'midday',
  lunch: 'midday',
  pm: 'afternoon',
  eve: 'evening',
};

/** “mon-morning”, “Mon morning”, “Monday mornings”, “Tue a.m.”. */
export const readSlot: CellReader<Slot> = (text) => {
  const [, dayName = '', rest = ''] = /^(\p{L}+)[^\p{L}]*(.*)$/u.exec(folded(text)) ?? [];
  const day = DAYS.find((each) => dayName.startsWith(each));
  const part = PARTS[bare(rest)];
  if (!day || !part)
    return bad(
      text,
      `“${text}” is no time of the week; use a day with morning, midday, afternoon or evening, such as Mon morning`,
    );
  return good<Slot>(`${day}-${part}`);
};
