/** Why two people may or may not be paired, and how well they fit: every rule that says no, every criterion with its values. */
import type { Judge } from './build-problem';
import { CRITERIA, RULES, ruleInWords } from './catalogue';
import { levelOfRank } from './columns';
import { fitOf, MISSING } from './criteria';
import {
  bestLanguage,
  bothInPerson,
  bothRemote,
  commonSlotCount,
  commonSlots,
  coveredCount,
  coverInWords,
  kilometres,
} from './facts';
import type { CriterionKey, RuleKey } from './matching-contract';
import type { CriterionPart, PairReasons } from './runs-contract';
import { slotsOfBits } from './weekly-slots';

const LANGUAGE_NAMES = new Intl.DisplayNames('en', { type: 'language' });

/** Everything that can be said of mentee i and mentor j (positions of the input). */
export function explainPair(judge: Judge, i: number, j: number): PairReasons {
  const reasons = judge.rules
    .filter((rule) => !rule.allows(i, j))
    .map((rule) => ({ rule: rule.key, label: labelOf(judge, rule.key), text: sentenceOf(judge, rule.key, i, j) }));
  const fit = fitOf(judge.criteria, i, j);
  if (fit < judge.floor) {
    reasons.push({
      rule: 'minimum-fit',
      label: labelOf(judge, 'minimum-fit'),
      text: `Their fit is ${shown(fit)}, below the minimum of ${shown(judge.floor)}.`,
    });
  }
  return {
    eligible: reasons.length === 0,
    reasons,
    fit,
    criteria: judge.criteria.map((criterion): CriterionPart => {
      const score = criterion.score(i, j);
      return {
        key: criterion.key,
        label: CRITERIA[criterion.key].label,
        score: score === MISSING ? 0.5 : score,
        weight: criterion.weight,
        share: criterion.share,
        missing: score === MISSING,
        text: valuesOf(judge, criterion.key, i, j),
      };
    }),
  };
}

const shown = (fit: number): string => (fit / 100).toFixed(1);

function labelOf(judge: Judge, key: RuleKey): string {
  const setting = judge.input.settings.rules.find((rule) => rule.rule === key);
  return setting ? ruleInWords(setting) : RULES[key].label;
}

const years = (count: number): string => `${count} ${count === 1 ? 'year' : 'years'}`;

function sentenceOf(judge: Judge, key: RuleKey, i: number, j: number): string {
  const { columns, input } = judge;
  const mentee = input.mentees[i]!;
  const mentor = input.mentors[j]!;
  switch (key) {
    case 'not-oneself':
      return 'They are the same person.';
    case 'not-declined':
      return 'One of them declined this pairing in this cycle.';
    case 'no-two-way-swap':
      return 'Both apply on both sides; only the more experienced of the two may be the mentor.';
    case 'different-employer':
      return mentee.employer === mentor.employer
        ? `Both work for ${mentor.employer}.`
        : `${mentee.employer} and ${mentor.employer} count as one employer.`;
    case 'no-declared-interest':
      return 'One of them has declared an interest in the other.';
    case 'no-private-exclusion':
      return 'One of them asked not to be paired with the other.';
    case 'no-earlier-pairing':
      return 'They were a pair in an earlier cycle.';
    case 'years-apart':
      return mentee.yearsInPractice === null || mentor.yearsInPractice === null
        ? 'Years in practice are not known for both.'
        : `The mentor has ${years(mentor.yearsInPractice)}, the mentee ${years(mentee.yearsInPractice)} in practice.`;
    case 'common-language': {
      const best = levelOfRank(bestLanguage(columns, i, j).rank);
      if (!columns.mentees.hasLanguages[i] || !columns.mentors.hasLanguages[j])
        return 'Languages are not known for both.';
      return best ? `Their best common language reaches ${best} only.` : 'They have no common language.';
    }
    case 'meeting':
      return meetingSentence(judge, i, j);
    case 'common-times': {
      if (columns.mentees.slots[i] === 0 || columns.mentors.slots[j] === 0)
        return 'Times of the week are not known for both.';
      const count = commonSlotCount(columns, i, j);
      return count === 0 ? 'No time of the week suits both.' : `Only ${count} of the week’s times suits both.`;
    }
    case 'practice-areas': {
      const sought = columns.areas[i]!.tags.length;
      if (sought === 0) return 'The mentee seeks no practice area.';
      return `The mentor offers ${coveredCount(columns, columns.areas[i]!, j)} of the ${sought} practice areas sought.`;
    }
    case 'wished-stages':
      return 'The mentor wishes for mentees at other career stages.';
    case 'minimum-fit':
      return 'Their fit is below the minimum.';
  }
}

function meetingSentence({ columns, input }: Judge, i: number, j: number): string {
  const mentee = input.mentees[i]!;
  const mentor = input.mentors[j]!;
  if (mentee.meetingMode === null || mentor.meetingMode === null) return 'How they would meet is not known for both.';
  if (!bothInPerson(columns, i, j)) return 'One wants to meet in person only, the other remotely only.';
  const away = kilometres(columns, i, j);
  if (away < 0) return 'They can meet in person only, and a town is not known.';
  return `They can meet in person only, and ${mentee.town} and ${mentor.town} are ${Math.round(away)} km apart.`;
}

/** The values behind a score, in words. */
function valuesOf(judge: Judge, key: CriterionKey, i: number, j: number): string {
  const { columns, input } = judge;
  const mentee = input.mentees[i]!;
  const mentor = input.mentors[j]!;
  switch (key) {
    case 'practice-areas':
      return tagValues(judge, 'areas', i, j) || 'The mentee seeks no practice area';
    case 'topics':
      return tagValues(judge, 'topics', i, j) || 'The mentee seeks no topic';
    case 'weekly-overlap': {
      if (columns.mentees.slots[i] === 0 || columns.mentors.slots[j] === 0)
        return 'Times of the week are not known for both';
      const slots = slotsOfBits(commonSlots(columns, i, j));
      return slots.length === 0 ? 'No common time' : `${slots.length} in common: ${slots.map(slotInWords).join(', ')}`;
    }
    case 'distance': {
      if (bothRemote(columns, i, j)) return 'Both accept to meet remotely';
      const away = kilometres(columns, i, j);
      return away < 0 ? 'A town is not known' : `${mentee.town} to ${mentor.town}: ${Math.round(away)} km`;
    }
    case 'years':
      return mentor.yearsInPractice === null
        ? 'The mentor’s years are not known'
        : `The mentor has ${years(mentor.yearsInPractice)} of practice`;
    case 'language': {
      const { rank, language } = bestLanguage(columns, i, j);
      const level = levelOfRank(rank);
      if (!columns.mentees.hasLanguages[i] || !columns.mentors.hasLanguages[j])
        return 'Languages are not known for both';
      if (!level) return 'No common language';
      return `${LANGUAGE_NAMES.of(columns.languages[language]!)}: ${level === 'first' ? 'first language of both' : level}`;
    }
    case 'sector':
      if (mentee.wishedSector === 'any') return 'The mentee takes any sector';
      return `The mentee wishes for ${mentee.wishedSector === 'same' ? 'the same' : 'a different'} sector`;
    case 'preference': {
      const rank = mentee.preferred.indexOf(mentor.person);
      if (rank >= 0) return `Named by the mentee as ${['first', 'second', 'third'][rank]} wish`;
      return mentee.preferred.length > 0 ? 'The mentee named others' : 'The mentee named nobody';
    }
    case 'stages':
      return mentor.wishedStages.length === 0
        ? 'The mentor takes any career stage'
        : 'Against the stages the mentor wishes for';
  }
}

function tagValues(judge: Judge, kind: 'areas' | 'topics', i: number, j: number): string {
  const { columns, input } = judge;
  return [...columns[kind][i]!.tags]
    .map((tag) => {
      const cover = columns.cover[j * columns.tagCount + tag]!;
      return `${input.tags[tag]!.label}: ${coverInWords(cover)}`;
    })
    .join('; ');
}

const DAY_NAME: Record<string, string> = {
  mon: 'Monday',
  tue: 'Tuesday',
  wed: 'Wednesday',
  thu: 'Thursday',
  fri: 'Friday',
  sat: 'Saturday',
  sun: 'Sunday',
};

/** "Monday morning", in the zone in which the slot was given. */
export function slotInWords(slot: string): string {
  const [day = '', part = ''] = slot.split('-');
  return `${DAY_NAME[day] ?? day} ${part}`;
}
