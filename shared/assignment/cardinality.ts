import type { Cover, PairingProblem } from './problem';

/** As many pairs as possible, whatever their fit. */
export interface LargestPairing {
  size: number;
  /** Mentor of each mentee, −1 when left out. */
  mentorOf: Int32Array;
  /** A smallest set of mentees and places that touches every pair: as large as the pairing (König 1931). */
  cover: Cover;
}

/**
 * The largest pairing among the pairs with at least the given fit.
 *
 * Hopcroft and Karp (1973), with mentors that have several places: phases of shortest alternating paths, each phase a
 * breadth-first layering from the mentees left out and a depth-first search for disjoint paths along the layers.
 * Time O(pairs · √(mentees + places)), memory O(pairs).
 */
export function largestPairing(problem: PairingProblem, leastFit = 0, tick: () => void = () => {}): LargestPairing {
  const search = new LayeredSearch(problem, leastFit);
  search.pairGreedily();
  while (search.layer()) {
    search.augment();
    tick();
  }
  return { size: search.size, mentorOf: search.mentorOf, cover: search.cover() };
}

class LayeredSearch {
  readonly mentorOf: Int32Array;
  size = 0;
  private readonly load: Int32Array;
  /** The mentees of each mentor lie in `seated[seatStart[mentor] ..]`, `load[mentor]` of them. */
  private readonly seatStart: Int32Array;
  private readonly seated: Int32Array;
  private readonly menteeLevel: Int32Array;
  private readonly mentorLevel: Int32Array;
  private readonly nextEdge: Int32Array;
  private readonly nextSeat: Int32Array;

  constructor(
    private readonly problem: PairingProblem,
    private readonly leastFit: number,
  ) {
    const { menteeCount, mentorCount, target, capacity } = problem;
    this.mentorOf = new Int32Array(menteeCount).fill(-1);
    this.load = new Int32Array(mentorCount);
    const wanted = new Int32Array(mentorCount);
    for (let edge = 0; edge < target.length; edge++) wanted[target[edge]!]!++;
    this.seatStart = new Int32Array(mentorCount + 1);
    for (let mentor = 0; mentor < mentorCount; mentor++) {
      this.seatStart[mentor + 1] = this.seatStart[mentor]! + Math.min(wanted[mentor]!, capacity[mentor]!);
    }
    this.seated = new Int32Array(this.seatStart[mentorCount]!);
    this.menteeLevel = new Int32Array(menteeCount);
    this.mentorLevel = new Int32Array(mentorCount);
    this.nextEdge = new Int32Array(menteeCount);
    this.nextSeat = new Int32Array(mentorCount);
  }

  pairGreedily(): void {
    const { rowStart, target, fit, capacity, menteeCount } = this.problem;
    for (let mentee = 0; mentee < menteeCount; mentee++) {
      for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
        const mentor = target[edge]!;
        if (fit[edge]! < this.leastFit || this.load[mentor]! >= capacity[mentor]!) continue;
        this.seat(mentee, mentor, this.load[mentor]!++);
        this.size++;
        break;
      }
    }
  }

  /** Numbers the layers from the mentees left out; says whether a mentor with a free place was reached. */
  layer(): boolean {
    const { rowStart, target, fit, capacity, menteeCount } = this.problem;
    this.menteeLevel.fill(-1);
    this.mentorLevel.fill(-1);
    let frontier: number[] = [];
    for (let mentee = 0; mentee < menteeCount; mentee++) {
      if (this.mentorOf[mentee]! >= 0) continue;
      this.menteeLevel[mentee] = 0;
      frontier.push(mentee);
    }
    let found = false;
    for (let level = 0; frontier.length > 0 && !found; level++) {
      const following: number[] = [];
      for (const mentee of frontier) {
        for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
          const mentor = target[edge]!;
          if (fit[edge]! < this.leastFit || this.mentorLevel[mentor]! >= 0) continue;
          this.mentorLevel[mentor] = level;
          if (this.load[mentor]! < capacity[mentor]!) found = true;
          for (let seat = 0; seat < this.load[mentor]!; seat++) {
            const other = this.seated[this.seatStart[mentor]! + seat]!;
            if (this.menteeLevel[other]! >= 0) continue;
            this.menteeLevel[other] = level + 1;
            following.push(other);
          }
        }
      }
      frontier = following;
    }
    return found;
  }

  /** Augments along a maximal set of disjoint paths through the layers. */
  augment(): void {
    this.nextSeat.fill(0);
    this.nextEdge.set(this.problem.rowStart.subarray(0, this.problem.menteeCount));
    for (let mentee = 0; mentee < this.problem.menteeCount; mentee++) {
      if (this.mentorOf[mentee]! < 0 && this.pairFrom(mentee)) this.size++;
    }
  }

  private pairFrom(start: number): boolean {
    const path = [start];
    while (path.length > 0) {
      const mentee = path.at(-1)!;
      const mentor = this.mentorAhead(mentee);
      if (mentor < 0) {
        path.pop();
        if (path.length > 0) this.nextSeat[this.currentMentor(path.at(-1)!)]!++;
        continue;
      }
      if (this.load[mentor]! < this.problem.capacity[mentor]!) {
        this.shiftAlong(path, mentor);
        return true;
      }
      path.push(this.seated[this.seatStart[mentor]! + this.nextSeat[mentor]!]!);
    }
    return false;
  }

  /** The mentor one layer on that still has a free place or an untried mentee, or −1. */
  private mentorAhead(mentee: number): number {
    const { rowStart, fit, capacity } = this.problem;
    const level = this.menteeLevel[mentee]!;
    for (; this.nextEdge[mentee]! < rowStart[mentee + 1]!; this.nextEdge[mentee]!++) {
      const edge = this.nextEdge[mentee]!;
      const mentor = this.currentMentor(mentee);
      if (fit[edge]! < this.leastFit || this.mentorLevel[mentor] !== level) continue;
      if (this.load[mentor]! < capacity[mentor]!) return mentor;
      for (; this.nextSeat[mentor]! < this.load[mentor]!; this.nextSeat[mentor]!++) {
        const other = this.seated[this.seatStart[mentor]! + this.nextSeat[mentor]!]!;
        if (this.menteeLevel[other] === level + 1) return mentor;
      }
    }
    return -1;
  }

  private currentMentor(mentee: number): number {
    return this.problem.target[this.nextEdge[mentee]!]!;
  }

  private shiftAlong(path: readonly number[], free: number): void {
    this.seat(path.at(-1)!, free, this.load[free]!++);
    for (let step = path.length - 2; step >= 0; step--) {
      const mentor = this.currentMentor(path[step]!);
      this.seat(path[step]!, mentor, this.nextSeat[mentor]!++);
    }
  }

  private seat(mentee: number, mentor: number, seat: number): void {
    this.mentorOf[mentee] = mentor;
    this.seated[this.seatStart[mentor]! + seat] = mentee;
  }

  /** After the last layering: the mentees not reached and the mentors reached. */
  cover(): Cover {
    const mentees: number[] = [];
    const mentors: number[] = [];
    this.menteeLevel.forEach((level, mentee) => level < 0 && mentees.push(mentee));
    this.mentorLevel.forEach((level, mentor) => level >= 0 && mentors.push(mentor));
    return { mentees: Int32Array.from(mentees), mentors: Int32Array.from(mentors) };
  }
}
