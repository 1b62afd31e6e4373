/** For each person left out, why: in a sentence that can be said to a committee, and the shortage they belong to. */
import type { ShortageGroup } from '../assignment';
import type { BuiltProblem, Judge } from './build-problem';
import { ruleInWords, RULES } from './catalogue';
import type { PlanReport, ShortageView } from './runs-contract';

interface Shortages {
  views: ShortageView[];
  groups: ShortageGroup[];
}

export function reasonsForLeftOut(
  { judge }: BuiltProblem,
  leftOut: readonly number[],
  byChoice: ReadonlySet<number>,
  { views, groups }: Shortages,
): PlanReport['leftOutBecause'] {
  const shortageOf = new Map<number, number>();
  groups.forEach((group, at) => group.mentees.forEach((i) => shortageOf.set(i, at)));
  return Object.fromEntries(
    leftOut.map((i) => {
      const at = shortageOf.get(i) ?? null;
      const text = byChoice.has(i)
        ? 'A mentor could be found, but with this aim others fit better.'
        : at === null
          ? 'No place is left that could be theirs.'
          : sentenceOf(judge, i, views[at]!);
      return [judge.input.mentees[i]!.key, { text, shortage: at }];
    }),
  );
}

const people = (count: number): string => (count === 1 ? '1 mentee' : `${count} mentees`);

function sentenceOf(judge: Judge, i: number, view: ShortageView): string {
  if (view.mentors.length === 0) return noMentorSentence(judge, i);
  const where = view.inCommon ? ` (${view.inCommon})` : '';
  const places = view.places === 1 ? '1 place' : `${view.places} places`;
  return `${people(view.mentees.length)}${where} could be served by ${
    view.mentors.length === 1 ? '1 mentor' : `${view.mentors.length} mentors`
  } with ${places} in all: ${view.short} too few.`;
}

/** No mentor at all is eligible: which rules exclude most of them. */
function noMentorSentence(judge: Judge, i: number): string {
  const { mentorCount } = judge.columns;
  const counts = judge.rules
    .map((rule) => {
      let excluded = 0;
      for (let j = 0; j < mentorCount; j++) if (!rule.allows(i, j)) excluded++;
      return { key: rule.key, excluded };
    })
    .filter((each) => each.excluded > 0)
    .sort((a, b) => b.excluded - a.excluded)
    .slice(0, 2);
  if (counts.length === 0) return 'No mentor who would be eligible has a place.';
  const words = counts.map(({ key, excluded }) => {
    const setting = judge.input.settings.rules.find((rule) => rule.rule === key);
    return `${setting ? ruleInWords(setting) : RULES[key].label} (${excluded} of ${mentorCount})`;
  });
  return `No mentor with a place is eligible. Rules that exclude most of them: ${words.join('; ')}.`;
}
