/** The criteria (soft): each gives a score from 0 to 1; −1 where data are missing, which counts as 0.5. */
import { activeCriteria } from './catalogue';
import type { Columns } from './columns';
import { bothRemote, commonSlotCount, coverage, kilometres, languageRank } from './facts';
import type { CriterionKey, CriterionSetting } from './matching-contract';
import type { MatchingInput } from './matching-input';

export interface CompiledCriterion {
  key: CriterionKey;
  weight: number;
  /** Share of the whole weight, 0..1. */
  share: number;
  /** 0..1, or MISSING. */
  score(i: number, j: number): number;
}

export const MISSING = -1;
const MISSING_COUNTS_AS = 0.5;
/** Distance at which the score has halved. */
const HALF_DISTANCE_KM = 40;
/** Years outside the wished range at which the score reaches 0. */
const YEARS_TO_ZERO = 10;
/** Score by rank of the lower level: none, A1, A2, B1, B2, C1, C2, first. */
const LANGUAGE_SCORE = [0, 0, 0, 0.4, 0.7, 0.9, 1, 1] as const;
const PREFERENCE_SCORE = [1, 0.8, 0.6] as const;
const OTHER_THAN_NAMED = 0.3;
const NONE_NAMED = 0.5;

type Score = CompiledCriterion['score'];
type ByCriterion = { [K in CriterionKey]: Extract<CriterionSetting, { criterion: K }> };

/** The criteria that count, in their fixed order. */
export function compileCriteria(input: MatchingInput, columns: Columns): CompiledCriterion[] {
  return activeCriteria(input.settings.criteria).map((setting) => ({
    key: setting.criterion,
    weight: setting.weight,
    share: setting.share,
    score: scoreOf(setting, input, columns),
  }));
}

function scoreOf<K extends CriterionKey>(setting: CriterionSetting, input: MatchingInput, columns: Columns): Score {
  return MAKERS[setting.criterion as K](setting as ByCriterion[K], columns, input);
}

const MAKERS: { [K in CriterionKey]: (setting: ByCriterion[K], columns: Columns, input: MatchingInput) => Score } = {
  'practice-areas': (_setting, columns) => (i, j) => tagScore(columns, 'areas', i, j),
  topics: (_setting, columns) => (i, j) => tagScore(columns, 'topics', i, j),
  'weekly-overlap':
    ({ wanted }, columns) =>
    (i, j) =>
      columns.mentees.slots[i] === 0 || columns.mentors.slots[j] === 0
        ? MISSING
        : Math.min(1, commonSlotCount(columns, i, j) / wanted),
  distance: (_setting, columns) => (i, j) => {
    if (bothRemote(columns, i, j)) return 1;
    const away = kilometres(columns, i, j);
    return away < 0 ? MISSING : 2 ** (-away / HALF_DISTANCE_KM);
  },
  years: ({ from, to }, columns, input) => {
    const lowest = Float64Array.from(input.mentees, (mentee) => mentee.wishedYearsMin ?? from);
    const highest = Float64Array.from(
      input.mentees,
      (mentee) => mentee.wishedYearsMax ?? Math.max(to, mentee.wishedYearsMin ?? 0),
    );
    return (i, j) => {
      const years = columns.mentors.years[j]!;
      if (years < 0) return MISSING;
      const outside = Math.max(0, lowest[i]! - years, years - highest[i]!);
      return Math.max(0, 1 - outside / YEARS_TO_ZERO);
    };
  },
  language: (_setting, columns) => (i, j) =>
    columns.mentees.hasLanguages[i] && columns.mentors.hasLanguages[j]
      ? LANGUAGE_SCORE[languageRank(columns, i, j)]!
      : MISSING,
  sector: (_setting, { mentees, mentors }, input) => {
    const wishes = input.mentees.map((mentee) => mentee.wishedSector);
    return (i, j) => {
      if (wishes[i] === 'any') return 1;
      if (mentees.sector[i]! < 0 || mentors.sector[j]! < 0) return MISSING;
      return (mentees.sector[i] === mentors.sector[j]) === (wishes[i] === 'same') ? 1 : 0;
    };
  },
  preference: (_setting, { mentors }, input) => {
    const numbers = new Map(input.mentors.map((mentor, j) => [mentor.person, mentors.person[j]!]));
    const named = input.mentees.map((mentee) => mentee.preferred.map((person) => numbers.get(person) ?? -1));
    return (i, j) => {
      const wishes = named[i]!;
      if (wishes.length === 0) return NONE_NAMED;
      const rank = wishes.indexOf(mentors.person[j]!);
      return rank < 0 ? OTHER_THAN_NAMED : (PREFERENCE_SCORE[rank] ?? OTHER_THAN_NAMED);
    };
  },
  stages:
    (_setting, { stage, wishedStages }) =>
    (i, j) => {
      if (wishedStages[j] === 0) return 1;
      if (stage[i] === 0) return MISSING;
      return (wishedStages[j]! & stage[i]!) !== 0 ? 1 : 0;
    },
};

function tagScore(columns: Columns, kind: 'areas' | 'topics', i: number, j: number): number {
  const sought = columns[kind][i]!;
  return sought.total === 0 || !columns.hasOffers[j] ? MISSING : coverage(columns, sought, j);
}

/** Fit of two people: round(10000 · Σ w s / Σ w), missing data counted as a half. */
export function fitOf(criteria: readonly CompiledCriterion[], i: number, j: number): number {
  let sum = 0;
  for (let k = 0; k < criteria.length; k++) {
    const criterion = criteria[k]!;
    const score = criterion.score(i, j);
    sum += criterion.share * (score === MISSING ? MISSING_COUNTS_AS : score);
  }
  return Math.round(10_000 * sum);
}

/** Scores by criterion in 0..10000; −1 = missing, counted as half. */
export const scoresOf = (criteria: readonly CompiledCriterion[], i: number, j: number): number[] =>
  criteria.map((criterion) => {
    const score = criterion.score(i, j);
    return score === MISSING ? MISSING : Math.round(10_000 * score);
  });
