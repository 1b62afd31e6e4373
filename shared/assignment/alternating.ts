import type { PairingPlan, PairingProblem, SolveOptions } from './problem';
import { reduceProblem, type ReducedProblem } from './reduction';

/** One more mentor than the problem has, for asking what recruiting would bring. */
export interface ExtraMentor {
  /** Reduced indices of those who could have this mentor. */
  mentees: readonly number[];
  places: number;
}

/** What alternating paths reach: from a mentee to any eligible mentor, from a mentor to the mentees who are with them. */
export interface Reached {
  mentees: Uint8Array;
  mentors: Uint8Array;
}

/**
 * Alternating paths on a pairing, for growing it to the largest and for asking what stands in the way (Berge 1957, Two Theorems
 * in Graph Theory). Works on a reduced problem; mentees are its reduced indices.
 */
export class Alternating {
  readonly mentorOf: Int32Array;
  private readonly capacity: Int32Array;
  private readonly seated: number[][];
  private readonly offersExtra: Uint8Array | null;

  constructor(
    readonly problem: PairingProblem,
    start: Int32Array,
    capacity: Int32Array = problem.capacity,
    extra: ExtraMentor | null = null,
  ) {
    this.mentorOf = start.slice();
    const mentors = problem.mentorCount + (extra ? 1 : 0);
    this.capacity = new Int32Array(mentors);
    this.capacity.set(capacity);
    if (extra) this.capacity[mentors - 1] = extra.places;
    this.seated = Array.from({ length: mentors }, () => []);
    this.mentorOf.forEach((mentor, mentee) => mentor >= 0 && this.seated[mentor]!.push(mentee));
    this.offersExtra = extra ? new Uint8Array(problem.menteeCount) : null;
    for (const mentee of extra?.mentees ?? []) this.offersExtra![mentee] = 1;
  }

  /** Adds augmenting paths until there is none; returns how many. O(pairs) for each, and once for all searches that fail. */
  grow(): number {
    let grown = 0;
    const dead = new Uint8Array(this.capacity.length);
    for (let mentee = 0; mentee < this.mentorOf.length; mentee++) {
      if (this.mentorOf[mentee]! < 0 && this.augment(mentee, dead)) grown++;
    }
    return grown;
  }

  /** Everyone and every mentor that can be reached from these mentees. Mentors without places are reached, and lead nowhere. */
  reach(from: Iterable<number>): Reached {
    const reached = { mentees: new Uint8Array(this.mentorOf.length), mentors: new Uint8Array(this.capacity.length) };
    const queue: number[] = [];
    const visit = (mentee: number): void => {
      if (reached.mentees[mentee]) return;
      reached.mentees[mentee] = 1;
      queue.push(mentee);
    };
    for (const mentee of from) visit(mentee);
    for (let at = 0; at < queue.length; at++) {
      this.forEachMentor(queue[at]!, (mentor) => {
        if (reached.mentors[mentor]) return false;
        reached.mentors[mentor] = 1;
        this.seated[mentor]!.forEach(visit);
        return false;
      });
    }
    return reached;
  }

  /** Mentees left out. */
  *free(): Generator<number> {
    for (let mentee = 0; mentee < this.mentorOf.length; mentee++) if (this.mentorOf[mentee]! < 0) yield mentee;
  }

  /** A shortest path from a mentee left out to a free place. Mentors of failed searches are dead for good: no later path uses them. */
  private augment(start: number, dead: Uint8Array): boolean {
    const cameFrom = new Map<number, number>();
    const queue = [start];
    for (let at = 0; at < queue.length; at++) {
      const mentee = queue[at]!;
      const end = this.forEachMentor(mentee, (mentor) => {
        if (dead[mentor] || cameFrom.has(mentor)) return false;
        cameFrom.set(mentor, mentee);
        if (this.seated[mentor]!.length < this.capacity[mentor]!) return true;
        queue.push(...this.seated[mentor]!);
        return false;
      });
      if (end >= 0) {
        this.apply(end, cameFrom);
        return true;
      }
    }
    for (const mentor of cameFrom.keys()) dead[mentor] = 1;
    return false;
  }

  private apply(end: number, cameFrom: ReadonlyMap<number, number>): void {
    let mentor = end;
    while (mentor >= 0) {
      const mentee = cameFrom.get(mentor)!;
      const before = this.mentorOf[mentee]!;
      if (before >= 0) this.seated[before]!.splice(this.seated[before]!.indexOf(mentee), 1);
      this.mentorOf[mentee] = mentor;
      this.seated[mentor]!.push(mentee);
      mentor = before;
    }
  }

  /** Calls back for each eligible mentor until one says true; returns that mentor, or −1. */
  private forEachMentor(mentee: number, stop: (mentor: number) => boolean): number {
    const { rowStart, target, mentorCount } = this.problem;
    for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++)
      if (stop(target[edge]!)) return target[edge]!;
    if (this.offersExtra?.[mentee] && stop(mentorCount)) return mentorCount;
    return -1;
  }
}

/** A plan on its reduced problem, as the start of alternating paths. */
export function startOf(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions = {},
): { reduced: ReducedProblem; start: Int32Array } {
  const reduced = reduceProblem(problem, options);
  return { reduced, start: Int32Array.from(reduced.menteeOf, (mentee) => plan.mentorOf[mentee]!) };
}
