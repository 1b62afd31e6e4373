/** The words of the rules and criteria: names, plain explanations, and how parameters read in a sentence. */
import type { CriterionKey, CriterionSetting, RuleKey, RuleSetting } from './matching-contract';

export interface CatalogueEntry {
  label: string;
  /** Fits a column head. */
  short: string;
  explanation: string;
}

export const RULES: Record<RuleKey, CatalogueEntry> = {
  'not-oneself': {
    label: 'Not oneself',
    short: 'oneself',
    explanation: 'Somebody who applies on both sides is never paired with themselves. This rule is always on.',
  },
  'not-declined': {
    label: 'No pairing declined in this cycle',
    short: 'declined',
    explanation: 'A pairing that one side declined is not proposed again in the same cycle. This rule is always on.',
  },
  'no-two-way-swap': {
    label: 'No two-way swap',
    short: 'swap',
    explanation:
      'Two people who apply on both sides do not mentor each other: the more experienced of the two may be the mentor.',
  },
  'different-employer': {
    label: 'Different employer',
    short: 'employer',
    explanation:
      'People of the same employer, or of one group of companies, are not paired. An unknown employer passes, with a flag.',
  },
  'no-declared-interest': {
    label: 'No declared interest',
    short: 'interest',
    explanation: 'No reporting line, family tie, assessor or other interest that either side has declared.',
  },
  'no-private-exclusion': {
    label: 'No private exclusion',
    short: 'exclusion',
    explanation: 'Neither side has asked, in private, not to be paired with the other.',
  },
  'no-earlier-pairing': {
    label: 'No earlier pairing',
    short: 'earlier',
    explanation: 'The two were not a pair in one of the last cycles.',
  },
  'years-apart': {
    label: 'Years in practice apart',
    short: 'years',
    explanation: 'The mentor has some years of practice more than the mentee. Unknown years count as not met.',
  },
  'common-language': {
    label: 'Common language',
    short: 'language',
    explanation: 'At least one language that both have at this level (CEFR). No languages given counts as not met.',
  },
  meeting: {
    label: 'A way to meet',
    short: 'meeting',
    explanation:
      'Both accept to meet remotely, or both in person and within reach of each other. A distance that one of them named counts too. An unknown way to meet, or an unknown town where only meeting in person is left, counts as not met.',
  },
  'common-times': {
    label: 'Common times of the week',
    short: 'times',
    explanation:
      'Enough times of the week suit both, each in their own time zone. A time is common where the mentor is free for at least an hour of it. No times given counts as not met.',
  },
  'practice-areas': {
    label: 'Sought practice areas offered',
    short: 'areas',
    explanation:
      'The mentor offers enough of the practice areas that the mentee seeks: the same, a part of it, or the area it belongs to.',
  },
  'wished-stages': {
    label: 'Mentor’s wished career stages',
    short: 'stages',
    explanation: 'The mentee is at a career stage that the mentor wishes for; mentors who named none take any.',
  },
  'minimum-fit': {
    label: 'Minimum fit',
    short: 'floor',
    explanation: 'Pairings below this fit are not proposed, even if somebody is left out for it.',
  },
};

/** Not even a coordinator's note makes a pairing right that one of these excludes. */
export const NEVER_OVERRIDDEN: ReadonlySet<string> = new Set<RuleKey>([
  'not-oneself',
  'not-declined',
  'no-private-exclusion',
]);

export const CRITERIA: Record<CriterionKey, CatalogueEntry & { side: 'mentee' | 'mentor' | 'both' }> = {
  'practice-areas': {
    label: 'Practice areas',
    short: 'areas',
    side: 'mentee',
    explanation:
      'How much of what the mentee seeks the mentor offers, first priorities counting three times, second twice. The same area counts 1, a part of it 0.8, the area it belongs to 0.6.',
  },
  topics: {
    label: 'Topics',
    short: 'topics',
    side: 'mentee',
    explanation: 'The same for the topics that the mentee wants to talk about.',
  },
  'weekly-overlap': {
    label: 'Weekly overlap',
    short: 'times',
    side: 'both',
    explanation: 'Common times of the week, after time zones, up to the number that is wanted.',
  },
  distance: {
    label: 'Distance',
    short: 'distance',
    side: 'both',
    explanation: '1 where both accept to meet remotely; otherwise it halves with every 40 km between their towns.',
  },
  years: {
    label: 'Years of practice',
    short: 'years',
    side: 'mentee',
    explanation:
      '1 where the mentor’s years of practice lie in the range that the mentee wishes, or else the cycle’s; falling to 0 ten years outside it.',
  },
  language: {
    label: 'Language',
    short: 'language',
    side: 'both',
    explanation:
      'Their best common language at the lower of both levels: B1 0.4, B2 0.7, C1 0.9, C2 or first language 1.',
  },
  sector: {
    label: 'Sector',
    short: 'sector',
    side: 'mentee',
    explanation: '1 where the mentor works in the same or a different sector, as the mentee wishes; otherwise 0.',
  },
  preference: {
    label: 'Mentee’s stated preference',
    short: 'wish',
    side: 'mentee',
    explanation: 'First named mentor 1, second 0.8, third 0.6; others 0.3 if any was named, 0.5 if none.',
  },
  stages: {
    label: 'Mentor’s wished stages',
    short: 'stages',
    side: 'mentor',
    explanation: '1 where the mentee’s career stage is one that the mentor wishes for, or the mentor takes any.',
  },
};

/** A rule with its parameters, in words: "At least 3 years apart". */
export function ruleInWords(setting: RuleSetting): string {
  switch (setting.rule) {
    case 'no-earlier-pairing':
      return `No earlier pairing in ${setting.cycles} ${setting.cycles === 1 ? 'cycle' : 'cycles'}`;
    case 'years-apart':
      return setting.max === null
        ? `At least ${setting.min} years apart`
        : `${setting.min} to ${setting.max} years apart`;
    case 'common-language':
      return `A common language at ${setting.level === 'first' ? 'first-language level' : setting.level}`;
    case 'meeting':
      return `A way to meet that both accept; in person only within ${setting.maxKm} km`;
    case 'common-times':
      return `At least ${setting.slots} common ${setting.slots === 1 ? 'time' : 'times'} a week`;
    case 'practice-areas':
      return `At least ${setting.areas} sought practice ${setting.areas === 1 ? 'area' : 'areas'} offered`;
    case 'minimum-fit':
      return `A fit of at least ${(setting.fit / 100).toFixed(1)}`;
    default:
      return RULES[setting.rule].label;
  }
}

/** Criteria that count, in their fixed order, with each one's share of the whole weight (0..1). */
export function activeCriteria(criteria: readonly CriterionSetting[]): (CriterionSetting & { share: number })[] {
  const active = criteria.filter((each) => each.weight > 0);
  const total = active.reduce((sum, each) => sum + each.weight, 0);
  return active.map((each) => ({ ...each, share: each.weight / total }));
}
