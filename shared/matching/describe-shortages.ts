/** Shortage groups in words: who, what they have in common, and the smallest changes that would pair one more. */
import {
  explainShortage,
  gainFromNewMentor,
  gainFromPairs,
  gainFromPlaces,
  gainWithoutLock,
  mentorsWhosePlaceHelps,
  type PairingPlan,
  type PairingProblem,
  type ShortageGroup,
  type SolveOptions,
} from '../assignment';
import { mergedRows, RowBuilder, type BuiltProblem, type Rows } from './build-problem';
import { ruleInWords, RULES } from './catalogue';
import { commonGround, tagsSought } from './common-ground';
import type { RuleKey } from './matching-contract';
import type { ShortageView } from './runs-contract';

type Remedy = ShortageView['remedies'][number];

/** Groups with more possible pairs than this are not drawn thread by thread. */
const MOST_LINKS = 400;
/** Remedies are computed for the largest groups; further ones keep their members and counts. */
const GROUPS_WITH_REMEDIES = 12;
const RECRUIT_PLACES = 2;

/** Pairs that one rule alone excludes, by rule. */
export type SoleObjections = ReadonlyMap<RuleKey, Rows>;

export function describeShortages(
  built: BuiltProblem,
  plan: PairingPlan,
  alone: SoleObjections,
  tick: () => void,
): { views: ShortageView[]; groups: ShortageGroup[] } {
  const groups = explainShortage(built.problem, plan, built.options);
  const helps = mentorsWhosePlaceHelps(built.problem, plan, built.options);
  const views = groups.map((group, at) => {
    tick();
    return viewOf(built, group, at < GROUPS_WITH_REMEDIES ? remediesOf(built, plan, group, helps, alone) : []);
  });
  return { views, groups };
}

function viewOf({ judge, problem }: BuiltProblem, group: ShortageGroup, remedies: Remedy[]): ShortageView {
  const { mentees, mentors } = judge.input;
  return {
    mentees: [...group.mentees].map((i) => mentees[i]!.key),
    mentors: [...group.mentors].map((j) => mentors[j]!.key),
    leftOut: [...group.leftOut].map((i) => mentees[i]!.key),
    places: group.places,
    short: group.short,
    links: linksOf(problem, group),
    inCommon: commonGround(judge, [...group.mentees]),
    remedies,
  };
}

function linksOf(problem: PairingProblem, group: ShortageGroup): [number, number][] {
  const at = new Map([...group.mentors].map((mentor, position) => [mentor, position]));
  const links: [number, number][] = [];
  for (const [position, i] of group.mentees.entries()) {
    for (let edge = problem.rowStart[i]!; edge < problem.rowStart[i + 1]!; edge++) {
      const mentor = at.get(problem.target[edge]!);
      if (mentor !== undefined) links.push([position, mentor]);
    }
    if (links.length > MOST_LINKS) return [];
  }
  return links;
}

function remediesOf(
  built: BuiltProblem,
  plan: PairingPlan,
  group: ShortageGroup,
  helps: Uint8Array,
  alone: SoleObjections,
): Remedy[] {
  return [
    ...placeRemedies(built, plan, group, helps),
    ...ruleRemedies(built, plan, group, alone),
    ...lockRemedies(built, plan, group),
    ...recruitRemedies(built, plan, group),
  ];
}

/** Mentors who said "one more if asked" come first; the gain of all of them together is exact. */
function placeRemedies(
  { problem, options, judge }: BuiltProblem,
  plan: PairingPlan,
  group: ShortageGroup,
  helps: Uint8Array,
): Remedy[] {
  const would = (mentor: number): number => Number(judge.input.mentors[mentor]!.oneMoreIfAsked);
  const helpful = [...group.mentors].filter((mentor) => helps[mentor]).sort((a, b) => would(b) - would(a) || a - b);
  if (helpful.length === 0) return [];
  const gain = gainFromPlaces(problem, plan, helpful, options);
  const asked = helpful.filter(would).length;
  const each =
    helpful.length === 1 ? 'It pairs one more' : `One more at any of ${helpful.length} mentors pairs one more`;
  const together = helpful.length === 1 ? '' : `, at all of them ${gain} more`;
  const said = asked === 0 ? '' : `; ${asked} of them said "one more if asked"`;
  return [
    {
      kind: 'more-places',
      label: helpful.length === 1 ? 'One more place at this mentor' : 'One more place',
      detail: `${each}${together}${said}.`,
      gain,
      mentors: helpful.map((mentor) => judge.input.mentors[mentor]!.key),
      rule: null,
    },
  ];
}

function ruleRemedies(
  { problem, options, judge }: BuiltProblem,
  plan: PairingPlan,
  group: ShortageGroup,
  alone: SoleObjections,
): Remedy[] {
  const remedies: Remedy[] = [];
  for (const [rule, rows] of alone) {
    const added = rowsOfMentees(rows, group.mentees, problem.menteeCount);
    if (added.target.length === 0) continue;
    const { gain, pairs } = gainFromPairs(problem, plan, { ...problem, ...mergedRows(problem, added) }, options);
    if (gain === 0) continue;
    const setting = judge.input.settings.rules.find((each) => each.rule === rule);
    const label = setting ? ruleInWords(setting) : RULES[rule].label;
    remedies.push({
      kind: 'without-rule',
      label: `Without the rule "${label}"`,
      detail: `${gain} more ${gain === 1 ? 'mentee' : 'mentees'} of this group could be paired, through ${pairs.length} ${
        pairs.length === 1 ? 'pair' : 'pairs'
      } that this rule alone excludes.`,
      gain,
      mentors: pairs.map(([, mentor]) => judge.input.mentors[mentor]!.key),
      rule: MAY_BE_DROPPED.has(rule) ? rule : null,
    });
  }
  return remedies.filter((remedy) => remedy.rule !== null).sort((a, b) => b.gain - a.gain);
}

/** Rules about conflicts of interest and people's own wishes are no remedy. */
const MAY_BE_DROPPED: ReadonlySet<RuleKey> = new Set([
  'no-earlier-pairing',
  'years-apart',
  'common-language',
  'meeting',
  'common-times',
  'practice-areas',
  'wished-stages',
  'minimum-fit',
]);

function rowsOfMentees(rows: Rows, mentees: Int32Array, menteeCount: number): Rows {
  const wanted = new Set(mentees);
  const builder = new RowBuilder(menteeCount, 256);
  for (let i = 0; i < menteeCount; i++) {
    if (wanted.has(i))
      for (let edge = rows.rowStart[i]!; edge < rows.rowStart[i + 1]!; edge++)
        builder.add(rows.target[edge]!, rows.fit[edge]!);
    builder.endRow();
  }
  return builder.rows();
}

function lockRemedies({ problem, options, judge }: BuiltProblem, plan: PairingPlan, group: ShortageGroup): Remedy[] {
  const nearby = new Set(group.mentors);
  for (const i of group.mentees)
    for (let edge = problem.rowStart[i]!; edge < problem.rowStart[i + 1]!; edge++) nearby.add(problem.target[edge]!);
  const locked: SolveOptions['locked'] = options.locked;
  return (locked ?? [])
    .filter(([, mentor]) => nearby.has(mentor))
    .map((lock) => ({ lock, gain: gainWithoutLock(problem, plan, lock, options) }))
    .filter(({ gain }) => gain > 0)
    .map(({ lock: [, mentor], gain }) => ({
      kind: 'release-lock',
      label: 'Release a lock',
      detail: `Without this lock ${gain} more could be paired.`,
      gain,
      mentors: [judge.input.mentors[mentor]!.key],
      rule: null,
    }));
}

/** For each practice area that the group seeks: what one new mentor with two places would bring. */
function recruitRemedies(built: BuiltProblem, plan: PairingPlan, group: ShortageGroup): Remedy[] {
  const { problem, options, judge } = built;
  return tagsSought(judge, [...group.mentees])
    .slice(0, 6)
    .map(({ label, mentees }) => ({
      label,
      gain: gainFromNewMentor(problem, plan, mentees, RECRUIT_PLACES, options),
      seekers: mentees.length,
    }))
    .filter((each) => each.gain > 0)
    .sort((a, b) => b.gain - a.gain || b.seekers - a.seekers)
    .slice(0, 3)
    .map(({ label, gain, seekers }) => ({
      kind: 'recruit',
      label: `Recruit a mentor for ${label}`,
      detail: `One new mentor with ${RECRUIT_PLACES} places, suitable for the ${seekers} who seek it, pairs ${gain} more.`,
      gain,
      mentors: [],
      rule: null,
    }));
}
