/** What the rules do to a set of applicants: computed in one pass over all pairs. */
import { largestPairing } from '../assignment';
import { judgeOf, mergedRows, RowBuilder, sidesOf, type Judge, type Rows } from './build-problem';
import { ruleInWords, RULES } from './catalogue';
import { fitOf } from './criteria';
import { FIT_BINS, type RuleEffects } from './effects-contract';
import type { RuleKey } from './matching-contract';
import type { MatchingInput } from './matching-input';

const BIN_WIDTH = 10_000 / FIT_BINS;

interface Survey {
  /** Keys in the order of their bits. */
  keys: RuleKey[];
  eligible: RowBuilder;
  /** Per rule: pairs that it alone excludes. */
  alone: RowBuilder[];
  excludesAlone: Int32Array;
  eligiblePairs: number;
  menteesWithNone: number;
  distribution: Int32Array;
}

/** Time O(mentees × mentors × rules) at worst; memory O(pairs that at most one rule excludes). */
export function ruleEffects(input: MatchingInput): RuleEffects {
  const judge = judgeOf(input);
  const survey = surveyPairs(judge);
  const eligible = survey.eligible.rows();
  const size = (rows: Rows): number => largestPairing(sidesOf(input, rows)).size;
  const pairable = size(eligible);
  return {
    mentees: input.mentees.length,
    mentors: input.mentors.length,
    places: input.mentors.reduce((sum, mentor) => sum + mentor.places, 0),
    eligiblePairs: survey.eligiblePairs,
    menteesWithNone: survey.menteesWithNone,
    pairable,
    rules: survey.keys.map((key, bit) => ({
      rule: key,
      label: labelOf(input, key),
      excludesAlone: survey.excludesAlone[bit]!,
      gainWithout:
        survey.excludesAlone[bit] === 0 ? 0 : size(mergedRows(eligible, survey.alone[bit]!.rows())) - pairable,
    })),
    distribution: [...survey.distribution],
  };
}

/** Pairs that one rule alone excludes, by rule; fits included. */
export function soleObjections(judge: Judge): Map<RuleKey, Rows> {
  const survey = surveyPairs(judge);
  return new Map(survey.keys.map((key, bit) => [key, survey.alone[bit]!.rows()]));
}

function labelOf(input: MatchingInput, key: RuleKey): string {
  const setting = input.settings.rules.find((rule) => rule.rule === key);
  return setting ? ruleInWords(setting) : RULES[key].label;
}

function surveyPairs(judge: Judge): Survey {
  const { menteeCount, mentorCount } = judge.columns;
  const keys: RuleKey[] = [
    ...judge.rules.map((rule) => rule.key),
    ...(judge.floor > 0 ? (['minimum-fit'] as const) : []),
  ];
  const survey: Survey = {
    keys,
    eligible: new RowBuilder(menteeCount),
    alone: keys.map(() => new RowBuilder(menteeCount, 256)),
    excludesAlone: new Int32Array(keys.length),
    eligiblePairs: 0,
    menteesWithNone: 0,
    distribution: new Int32Array(FIT_BINS),
  };
  for (let i = 0; i < menteeCount; i++) {
    const before = survey.eligiblePairs;
    for (let j = 0; j < mentorCount; j++) place(survey, judge, i, j);
    if (survey.eligiblePairs === before) survey.menteesWithNone++;
    survey.eligible.endRow();
    for (const builder of survey.alone) builder.endRow();
  }
  return survey;
}

/** Puts a pair where it belongs: eligible, excluded by one rule alone, or by several. */
function place(survey: Survey, judge: Judge, i: number, j: number): void {
  const only = soleObjection(judge, i, j);
  if (only === SEVERAL) return;
  if (only !== NONE) {
    survey.excludesAlone[only]!++;
    survey.alone[only]!.add(j, fitOf(judge.criteria, i, j));
    return;
  }
  const fit = fitOf(judge.criteria, i, j);
  survey.eligiblePairs++;
  survey.eligible.add(j, fit);
  survey.distribution[Math.min(FIT_BINS - 1, Math.floor(fit / BIN_WIDTH))]!++;
}

const NONE = -1;
const SEVERAL = -2;

/** Position of the one rule that excludes the pair; NONE or SEVERAL. */
function soleObjection({ rules, criteria, floor }: Judge, i: number, j: number): number {
  let only = NONE;
  for (let k = 0; k < rules.length; k++) {
    if (rules[k]!.allows(i, j)) continue;
    if (only !== NONE) return SEVERAL;
    only = k;
  }
  if (floor === 0 || fitOf(criteria, i, j) >= floor) return only;
  return only === NONE ? rules.length : SEVERAL;
}
