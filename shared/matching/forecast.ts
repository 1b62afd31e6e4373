/** Where places would be short if applications closed now. */
import { explainShortage, solve } from '../assignment';
import { buildProblem } from './build-problem';
import { commonGround, tagsSought } from './common-ground';
import type { Forecast } from './effects-contract';
import type { MatchingInput } from './matching-input';

/** Areas in the picture; rarer ones are left out of it. */
const MOST_AREAS = 14;

export function forecastOf(input: MatchingInput): Forecast {
  const { problem, options, judge } = buildProblem(input);
  const plan = solve(problem, { ...options, aim: 'everyone-first' });
  return {
    mentees: input.mentees.length,
    mentors: input.mentors.length,
    places: problem.capacity.reduce((sum, count) => sum + count, 0),
    pairable: plan.paired,
    shortages: explainShortage(problem, plan, options).map((group) => ({
      inCommon: commonGround(judge, [...group.mentees]),
      mentees: group.mentees.length,
      mentors: group.mentors.length,
      places: group.places,
      short: group.short,
    })),
    areas: areasOf(input, tagsSought(judge, [...input.mentees.keys()])),
  };
}

/** Seekers of an area by whoever seeks it, places by whoever offers it: one person can stand in several. */
function areasOf(input: MatchingInput, sought: { label: string; mentees: number[] }[]): Forecast['areas'] {
  const placesOf = new Map<string, number>();
  const labels = new Map(input.tags.filter((tag) => tag.kind === 'practice-area').map((tag) => [tag.id, tag.label]));
  for (const mentor of input.mentors)
    for (const choice of mentor.offers) {
      const label = labels.get(choice.tagId);
      if (label) placesOf.set(label, (placesOf.get(label) ?? 0) + mentor.places);
    }
  const seekersOf = new Map(sought.map((area) => [area.label, area.mentees.length]));
  return [...new Set([...seekersOf.keys(), ...placesOf.keys()])]
    .map((label) => ({ label, seekers: seekersOf.get(label) ?? 0, places: placesOf.get(label) ?? 0 }))
    .sort((a, b) => b.seekers - a.seekers || a.label.localeCompare(b.label))
    .slice(0, MOST_AREAS);
}
