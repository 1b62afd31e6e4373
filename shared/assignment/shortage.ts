import { Alternating, startOf, type Reached } from './alternating';
import type { PairingPlan, PairingProblem, SolveOptions } from './problem';
import type { ReducedProblem } from './reduction';

/** A group of mentees who compete for too few places; indices of the problem as given, ascending. */
export interface ShortageGroup {
  /** All who compete, those paired included. */
  mentees: Int32Array;
  /** Every mentor with a place whom any of them may have; empty for those without any eligible mentor. */
  mentors: Int32Array;
  /** Those of the group who are left out: as many as places are too few. */
  leftOut: Int32Array;
  /** Places of these mentors that locks leave. */
  places: number;
  short: number;
}

/**
 * Why mentees are left out: groups S of mentees with fewer places c(N(S)) among all mentors who could serve any of them. The
 * groups are the connected components of the over-demanded part of the problem (Dulmage and Mendelsohn 1958), mentors without
 * places not connecting; those without any eligible mentor form a group of their own. Over all groups Σ short is the number
 * that no plan can pair (König 1931, Ore 1955: max |S| − c(N(S))), on the problem with locks contracted. Under `best-total`,
 * those whom a larger plan would pair are not in `leftOut`; see leftOutByChoice. Largest shortage first. Time O(pairs).
 */
export function explainShortage(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions = {},
): ShortageGroup[] {
  const { reduced, start } = startOf(problem, plan, options);
  const paths = new Alternating(reduced.problem, start);
  paths.grow();
  const reached = paths.reach(paths.free());
  return groupsOf(reduced, paths, reached).sort((a, b) => b.short - a.short || a.mentees[0]! - b.mentees[0]!);
}

/** Mentees whom the plan leaves out though a plan with more pairs would not: only `best-total` does that. Ascending. */
export function leftOutByChoice(problem: PairingProblem, plan: PairingPlan, options: SolveOptions = {}): Int32Array {
  const { reduced, start } = startOf(problem, plan, options);
  const paths = new Alternating(reduced.problem, start);
  paths.grow();
  return reduced.menteeOf.filter((_, index) => start[index]! < 0 && paths.mentorOf[index]! >= 0);
}

/** The smaller set that is reached from one mentee left out: the reason that concerns them alone. Indices as given. */
export function smallestReason(
  problem: PairingProblem,
  plan: PairingPlan,
  mentee: number,
  options: SolveOptions = {},
): { mentees: Int32Array; mentors: Int32Array; places: number } {
  const { reduced, start } = startOf(problem, plan, options);
  const reached = new Alternating(reduced.problem, start).reach([reduced.reducedMenteeOf[mentee]!]);
  const { capacity } = reduced.problem;
  const mentors = Int32Array.from(indicesOf(reached.mentors).filter((mentor) => capacity[mentor]! > 0));
  return {
    mentees: Int32Array.from(indicesOf(reached.mentees), (index) => reduced.menteeOf[index]!),
    mentors,
    places: mentors.reduce((sum, mentor) => sum + capacity[mentor]!, 0),
  };
}

/** Every mentee is paired and every place filled (Frobenius 1917: the case of a perfect pairing). */
export function isPerfectOnBothSides(problem: PairingProblem, plan: PairingPlan): boolean {
  const places = problem.capacity.reduce((sum, count) => sum + count, 0);
  return plan.paired === problem.menteeCount && plan.paired === places;
}

const indicesOf = (marks: Uint8Array): number[] => [...marks.keys()].filter((index) => marks[index]);

function groupsOf(reduced: ReducedProblem, paths: Alternating, reached: Reached): ShortageGroup[] {
  const { capacity, rowStart, target } = reduced.problem;
  const leader = new Leaders(reduced.problem.mentorCount);
  const firstMentor = new Map<number, number>();
  for (const mentee of indicesOf(reached.mentees)) {
    for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
      const mentor = target[edge]!;
      if (capacity[mentor] === 0) continue;
      const first = firstMentor.get(mentee);
      if (first === undefined) firstMentor.set(mentee, mentor);
      else leader.join(first, mentor);
    }
  }
  const members = new Map<number, number[]>();
  for (const mentee of indicesOf(reached.mentees)) {
    const mentor = firstMentor.get(mentee);
    const key = mentor === undefined ? NO_MENTOR : leader.of(mentor);
    members.set(key, [...(members.get(key) ?? []), mentee]);
  }
  const mentorsOf = new Map<number, number[]>();
  for (const mentor of indicesOf(reached.mentors)) {
    if (capacity[mentor] === 0) continue;
    const key = leader.of(mentor);
    mentorsOf.set(key, [...(mentorsOf.get(key) ?? []), mentor]);
  }
  return [...members].map(([key, mentees]) => {
    const mentors = mentorsOf.get(key) ?? [];
    const places = mentors.reduce((sum, mentor) => sum + capacity[mentor]!, 0);
    const original = (index: number): number => reduced.menteeOf[index]!;
    return {
      mentees: Int32Array.from(mentees, original),
      mentors: Int32Array.from(mentors),
      leftOut: Int32Array.from(
        mentees.filter((index) => paths.mentorOf[index]! < 0),
        original,
      ),
      places,
      short: mentees.length - places,
    };
  });
}

const NO_MENTOR = -1;

/** Disjoint sets with path halving (Tarjan and van Leeuwen 1984). */
class Leaders {
  private readonly parent: Int32Array;

  constructor(count: number) {
    this.parent = Int32Array.from({ length: count }, (_, index) => index);
  }

  of(index: number): number {
    let at = index;
    while (this.parent[at] !== at) {
      this.parent[at] = this.parent[this.parent[at]!]!;
      at = this.parent[at]!;
    }
    return at;
  }

  join(a: number, b: number): void {
    this.parent[this.of(a)] = this.of(b);
  }
}
