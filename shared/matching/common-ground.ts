/** What a group of mentees has in common, in words. */
import { REGION_LABEL, type Region } from '../profiles/profiles-contract';
import type { Judge } from './build-problem';

/** A trait is named where at least this share of the group has it … */
const SHARE_IN_GROUP = 0.6;
/** … and it is at least this much more frequent than among all mentees. */
const LIFT = 1.2;
/** Two regions are named together where this share lives in them. */
const SHARE_OF_TWO = 0.8;

/** Practice areas by how many of these mentees seek them, most first. */
export function tagsSought(judge: Judge, mentees: readonly number[]): { label: string; mentees: number[] }[] {
  const seekers = new Map<number, number[]>();
  for (const i of mentees)
    for (const tag of judge.columns.areas[i]!.tags) {
      const list = seekers.get(tag);
      if (list) list.push(i);
      else seekers.set(tag, [i]);
    }
  return [...seekers]
    .sort(([a, left], [b, right]) => right.length - left.length || a - b)
    .map(([tag, list]) => ({ label: judge.input.tags[tag]!.label, mentees: list }));
}

const regionOf = (judge: Judge, i: number): string | null => {
  const { town } = judge.input.mentees[i]!;
  return town === null ? null : (judge.input.towns[town]?.region ?? null);
};

/** "Hydrographic · Islands"; empty where nothing stands out. */
export function commonGround(judge: Judge, mentees: readonly number[]): string {
  if (mentees.length === 0) return '';
  const all = judge.input.mentees.map((_, i) => i);
  const usual = new Map(tagsSought(judge, all).map((tag) => [tag.label, tag.mentees.length / all.length]));
  const stands = (share: number, among: number): boolean => share >= SHARE_IN_GROUP && share >= LIFT * among;
  const tags = tagsSought(judge, mentees)
    .filter((tag) => stands(tag.mentees.length / mentees.length, usual.get(tag.label) ?? 0))
    .slice(0, 2)
    .map((tag) => tag.label);
  return [...tags, regionsInCommon(judge, mentees, all)].filter(Boolean).join(' · ');
}

/** The region in which most live, or the two in which nearly all do: "Islands", "Coast and Islands"; empty where none stands out. */
function regionsInCommon(judge: Judge, mentees: readonly number[], all: readonly number[]): string {
  const share = (group: readonly number[], regions: readonly string[]): number =>
    group.filter((i) => regions.includes(regionOf(judge, i) ?? '')).length / group.length;
  const byShare = Object.keys(REGION_LABEL).sort((a, b) => share(mentees, [b]) - share(mentees, [a]));
  const standOut = (regions: readonly string[], least: number): boolean =>
    share(mentees, regions) >= least && share(mentees, regions) >= LIFT * share(all, regions);
  const found = standOut(byShare.slice(0, 1), SHARE_IN_GROUP)
    ? byShare.slice(0, 1)
    : standOut(byShare.slice(0, 2), SHARE_OF_TWO)
      ? byShare.slice(0, 2)
      : [];
  return found
    .map((region) => REGION_LABEL[region as Region])
    .sort()
    .join(' and ');
}
