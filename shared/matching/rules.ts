/** The rules (hard): each compiled into a quick test of two positions. */
import { levelRank, type Columns } from './columns';
import { bothInPerson, bothRemote, commonSlotCount, coveredCount, kilometres, languageRank } from './facts';
import type { MatchingInput } from './matching-input';
import type { RuleKey, RuleSetting } from './matching-contract';

export interface CompiledRule {
  key: RuleKey;
  /** May mentee i be paired with mentor j, as far as this rule goes? */
  allows(i: number, j: number): boolean;
}

type ByRule = { [K in RuleSetting['rule']]: Extract<RuleSetting, { rule: K }> };
type Test = CompiledRule['allows'];

/** Cheapest first, so that most excluded pairs fall early. `minimum-fit` is applied where fits are known. */
const COST_ORDER: readonly RuleKey[] = [
  'not-oneself',
  'different-employer',
  'years-apart',
  'wished-stages',
  'meeting',
  'common-times',
  'common-language',
  'practice-areas',
  'no-two-way-swap',
  'no-declared-interest',
  'no-private-exclusion',
  'no-earlier-pairing',
  'not-declined',
];

/** The rules that are on, without `minimum-fit`, in the order in which they are cheapest to ask. */
export function compileRules(input: MatchingInput, columns: Columns): CompiledRule[] {
  const on = input.settings.rules.filter((rule) => rule.on && rule.rule !== 'minimum-fit');
  const compiled: CompiledRule[] = [
    { key: 'not-oneself', allows: (i, j) => columns.mentees.person[i] !== columns.mentors.person[j] },
    { key: 'not-declined', allows: pairsAbsent(input, columns, input.declined) },
    ...on.map((rule) => ({ key: rule.rule, allows: testOf(rule, input, columns) })),
  ];
  return compiled.sort((a, b) => COST_ORDER.indexOf(a.key) - COST_ORDER.indexOf(b.key));
}

/** The floor in fit units; 0 where the rule is off. */
export function floorOf(input: MatchingInput): number {
  const rule = input.settings.rules.find((each) => each.rule === 'minimum-fit');
  return rule?.rule === 'minimum-fit' && rule.on ? rule.fit : 0;
}

const MAKERS: {
  [K in Exclude<RuleSetting['rule'], 'minimum-fit'>]: (rule: ByRule[K], input: MatchingInput, columns: Columns) => Test;
} = {
  'no-two-way-swap': (_rule, _input, columns) => noSwap(columns),
  'different-employer':
    (_rule, _input, { mentees, mentors }) =>
    (i, j) =>
      mentees.employer[i]! < 0 || mentees.employer[i] !== mentors.employer[j],
  'no-declared-interest': (_rule, input, columns) => mutualAbsent(input, columns, 'declaredInterests'),
  'no-private-exclusion': (_rule, input, columns) => mutualAbsent(input, columns, 'exclusions'),
  'no-earlier-pairing': (rule, input, columns) =>
    pairsAbsent(
      input,
      columns,
      input.earlier.filter((pair) => pair.cyclesAgo <= rule.cycles),
    ),
  'years-apart': (rule, _input, { mentees, mentors }) => {
    const max = rule.max ?? Infinity;
    return (i, j) => {
      const mine = mentees.years[i]!;
      const theirs = mentors.years[j]!;
      return mine >= 0 && theirs >= 0 && theirs - mine >= rule.min && theirs - mine <= max;
    };
  },
  'common-language': (rule, _input, columns) => {
    const least = levelRank(rule.level);
    return (i, j) => languageRank(columns, i, j) >= least;
  },
  meeting: (rule, _input, columns) => (i, j) => {
    if (bothRemote(columns, i, j)) return true;
    if (!bothInPerson(columns, i, j)) return false;
    const away = kilometres(columns, i, j);
    return away >= 0 && away <= Math.min(rule.maxKm, columns.mentees.reach[i]!, columns.mentors.reach[j]!);
  },
  'common-times': (rule, _input, columns) => (i, j) => commonSlotCount(columns, i, j) >= rule.slots,
  'practice-areas': (rule, _input, columns) => (i, j) => coveredCount(columns, columns.areas[i]!, j) >= rule.areas,
  'wished-stages':
    (_rule, _input, { stage, wishedStages }) =>
    (i, j) =>
      wishedStages[j] === 0 || (wishedStages[j]! & stage[i]!) !== 0,
};

function testOf<K extends Exclude<RuleSetting['rule'], 'minimum-fit'>>(
  rule: RuleSetting,
  input: MatchingInput,
  columns: Columns,
): Test {
  return MAKERS[rule.rule as K](rule as ByRule[K], input, columns);
}

/** Nobody mentors the person who mentors them: of two people on both sides, only the more experienced may be the mentor. */
function noSwap({ mentees, mentors, menteeCount, mentorCount }: Columns): Test {
  const yearsAsMentor = new Map<number, number>();
  for (let j = 0; j < mentorCount; j++) yearsAsMentor.set(mentors.person[j]!, mentors.years[j]!);
  const seeks = new Set<number>();
  for (let i = 0; i < menteeCount; i++) seeks.add(mentees.person[i]!);
  return (i, j) => {
    const mentee = mentees.person[i]!;
    const mentor = mentors.person[j]!;
    if (mentee === mentor || !seeks.has(mentor) || !yearsAsMentor.has(mentee)) return true;
    const less = yearsAsMentor.get(mentee)!;
    const more = mentors.years[j]!;
    return more > less || (more === less && mentor < mentee);
  };
}

/** Neither names the other in the given list. */
function mutualAbsent(input: MatchingInput, columns: Columns, field: 'exclusions' | 'declaredInterests'): Test {
  const numbers = personNumbers(input, columns);
  const named = new Set<number>();
  const people = numbers.size;
  for (const person of [...input.mentees, ...input.mentors])
    for (const other of person[field]) {
      const from = numbers.get(person.person)!;
      const to = numbers.get(other);
      if (to !== undefined) named.add(from * people + to).add(to * people + from);
    }
  if (named.size === 0) return () => true;
  return (i, j) => !named.has(columns.mentees.person[i]! * people + columns.mentors.person[j]!);
}

/** The pair (in these roles) is not in the list. */
function pairsAbsent(
  input: MatchingInput,
  columns: Columns,
  pairs: readonly { mentee: string; mentor: string }[],
): Test {
  if (pairs.length === 0) return () => true;
  const numbers = personNumbers(input, columns);
  const people = numbers.size;
  const listed = new Set(
    pairs.flatMap((pair) => {
      const mentee = numbers.get(pair.mentee);
      const mentor = numbers.get(pair.mentor);
      return mentee === undefined || mentor === undefined ? [] : [mentee * people + mentor];
    }),
  );
  return (i, j) => !listed.has(columns.mentees.person[i]! * people + columns.mentors.person[j]!);
}

function personNumbers(input: MatchingInput, columns: Columns): Map<string, number> {
  const numbers = new Map<string, number>();
  input.mentees.forEach((mentee, i) => numbers.set(mentee.person, columns.mentees.person[i]!));
  input.mentors.forEach((mentor, j) => numbers.set(mentor.person, columns.mentors.person[j]!));
  return numbers;
}
