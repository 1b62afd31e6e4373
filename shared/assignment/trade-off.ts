import { NearestFirst } from './nearest-first';
import { assertProblem, chargeOf, lexicographicScale, type PairingProblem, type SolveOptions } from './problem';
import { reduceProblem } from './reduction';
import { columnsOf, type Columns } from './residual';

/** The best plan of a given number of pairs, locked ones included. */
export interface TradeOffPoint {
  pairs: number;
  /** Greatest fit less charges that so many pairs can have. */
  netFit: number;
  /** Fit without charges, and least fit, of one plan that has it; 0 when nobody is paired. */
  totalFit: number;
  weakestFit: number;
}

/**
 * For each number of pairs from the locks up to the most there can be: the greatest net fit of exactly so many. The gain from
 * one pair more never rises. Locks, bars and floor hold; the aim plays no part.
 *
 * By successive best augmenting paths: the best plan of one pair more differs from the best plan by one such path. Prices
 * fall into place as in the Hungarian method, with a forest of alternating trees that is kept from one path to the next, and
 * of which only the tree that was used is taken down. Exact; O(k · pairs · log mentors) at worst, near linear as a rule.
 */
export function tradeOff(problem: PairingProblem, options: SolveOptions = {}): TradeOffPoint[] {
  assertProblem(problem);
  // refuses what exact arithmetic cannot hold
  lexicographicScale(problem);
  const reduced = reduceProblem(problem, options);
  const { lockedPairs, lockedFit, lockedCharge, lockedWeakest } = reduced;
  const forest = new Forest(reduced.problem);
  const points: TradeOffPoint[] = [];
  const report = options.onProgress ?? (() => {});
  let netFit = lockedFit - lockedCharge;
  let totalFit = lockedFit;
  for (let pairs = lockedPairs; ; pairs++) {
    const weakest = Math.min(lockedWeakest, forest.weakestFit());
    points.push({ pairs, netFit, totalFit, weakestFit: weakest === Infinity ? 0 : weakest });
    report(pairs / problem.menteeCount);
    const path = forest.augment();
    if (!path) break;
    netFit += path.netFit;
    totalFit += path.fit;
  }
  report(1);
  return points;
}

/**
 * Alternating trees over tight pairs, one from each mentee left out, that grow as the worth of a pair rises.
 *
 * Let a pair be worth `level` more than its fit. As the level rises, the prices of the mentors in the trees rise with it and
 * all others stand still, until a pair that leads out of a tree is tight, and its mentor joins with its mentees, or until a
 * mentor in a tree is worth its next place's charge, and one more mentee is paired: the best augmenting path.
 * Each mentor waits in one queue for the level at which either happens.
 */
class Forest {
  private level = -Infinity;
  private readonly columns: Columns;
  /** Mentor of each mentee and the index of that pair; −1 when left out. */
  private readonly mentorOf: Int32Array;
  private readonly edgeOf: Int32Array;
  private readonly menteesAt: number[][];
  /** Price of a mentor outside the trees; inside, its price less the level. */
  private readonly price: Float64Array;
  private readonly inTree: Uint8Array;
  /** Root (a mentee left out) of each mentor's tree, the pair that leads to the mentor, and that pair's mentee. */
  private readonly rootOf: Int32Array;
  private readonly entryEdge: Int32Array;
  private readonly entryMentee: Int32Array;
  private readonly mentorsOfRoot = new Map<number, number[]>();
  private readonly nextLevel: Float64Array;
  private readonly queue: NearestFirst;

  constructor(private readonly problem: PairingProblem) {
    const { menteeCount, mentorCount } = problem;
    this.columns = columnsOf(problem);
    this.mentorOf = new Int32Array(menteeCount).fill(-1);
    this.edgeOf = new Int32Array(menteeCount).fill(-1);
    this.menteesAt = Array.from({ length: mentorCount }, () => []);
    this.price = Float64Array.from({ length: mentorCount }, (_, mentor) => this.nextCharge(mentor));
    this.inTree = new Uint8Array(mentorCount);
    this.rootOf = new Int32Array(mentorCount).fill(-1);
    this.entryEdge = new Int32Array(mentorCount).fill(-1);
    this.entryMentee = new Int32Array(mentorCount).fill(-1);
    this.nextLevel = new Float64Array(mentorCount).fill(Infinity);
    this.queue = new NearestFirst(this.nextLevel);
    for (let mentor = 0; mentor < mentorCount; mentor++) this.schedule(mentor);
  }

  /** Pairs one more along the best path and says what that adds; null when no more can be paired. */
  augment(): { netFit: number; fit: number } | null {
    const { queue, nextLevel } = this;
    while (queue.size > 0 && nextLevel[queue.first()]! < Infinity) {
      const mentor = queue.first();
      if (this.inTree[mentor]) {
        this.level = nextLevel[mentor]!;
        return this.pairAlong(mentor);
      }
      if (!this.isCurrent(mentor)) this.schedule(mentor);
      else {
        this.level = nextLevel[mentor]!;
        this.join(mentor);
      }
    }
    return null;
  }

  /** Least fit among the pairs; Infinity when there is none. */
  weakestFit(): number {
    let weakest = Infinity;
    for (const edge of this.edgeOf)
      if (edge >= 0 && this.problem.fit[edge]! < weakest) weakest = this.problem.fit[edge]!;
    return weakest;
  }

  private nextCharge(mentor: number): number {
    const load = this.menteesAt[mentor]!.length;
    return load < this.problem.capacity[mentor]! ? chargeOf(this.problem, mentor, load) : Infinity;
  }

  private isFree(mentee: number): boolean {
    return this.mentorOf[mentee]! < 0;
  }

  /** What a mentee of a tree has, in fit, plus the level; this does not change while it is in the tree. */
  private hold(mentee: number): number {
    return this.isFree(mentee) ? 0 : this.problem.fit[this.edgeOf[mentee]!]! - this.price[this.mentorOf[mentee]!]!;
  }

  private isReached(mentee: number): boolean {
    return this.isFree(mentee) || this.inTree[this.mentorOf[mentee]!] === 1;
  }

  /** Finds the level at which a mentor outside the trees will join one: a look at all its pairs. */
  private schedule(mentor: number): void {
    const { columns, problem } = this;
    let least = Infinity;
    for (let at = columns.start[mentor]!; at < columns.start[mentor + 1]!; at++) {
      const mentee = columns.mentee[at]!;
      if (!this.isReached(mentee)) continue;
      const needed = this.hold(mentee) - problem.fit[columns.edge[at]!]!;
      if (needed >= least) continue;
      least = needed;
      this.entryMentee[mentor] = mentee;
      this.entryEdge[mentor] = columns.edge[at]!;
    }
    this.nextLevel[mentor] = least + this.price[mentor]!;
    this.queue.renew(mentor);
  }

  /** Whether what a mentor waits for is still to come: its mentee may have left the trees, which only makes it come later. */
  private isCurrent(mentor: number): boolean {
    const mentee = this.entryMentee[mentor]!;
    if (!this.isReached(mentee)) return false;
    const needed = this.hold(mentee) - this.problem.fit[this.entryEdge[mentor]!]!;
    return needed + this.price[mentor]! === this.nextLevel[mentor];
  }

  /** Takes the mentor and its mentees into the tree of the mentee it waited for. */
  private join(mentor: number): void {
    const { price, nextLevel, queue, problem } = this;
    const mentee = this.entryMentee[mentor]!;
    const root = this.isFree(mentee) ? mentee : this.rootOf[this.mentorOf[mentee]!]!;
    this.inTree[mentor] = 1;
    this.rootOf[mentor] = root;
    const tree = this.mentorsOfRoot.get(root);
    if (tree) tree.push(mentor);
    else this.mentorsOfRoot.set(root, [mentor]);
    price[mentor]! -= this.level;
    nextLevel[mentor] = this.nextCharge(mentor) - price[mentor]!;
    queue.renew(mentor);
    for (const other of this.menteesAt[mentor]!) {
      const hold = this.hold(other);
      for (let edge = problem.rowStart[other]!; edge < problem.rowStart[other + 1]!; edge++) {
        const next = problem.target[edge]!;
        const level = hold - problem.fit[edge]! + price[next]!;
        if (this.inTree[next] || level >= nextLevel[next]!) continue;
        nextLevel[next] = level;
        this.entryMentee[next] = other;
        this.entryEdge[next] = edge;
        queue.raise(next);
      }
    }
  }

  /** Moves the mentees on the path from the mentor to its root, and takes the tree down. */
  private pairAlong(mentor: number): { netFit: number; fit: number } {
    const { fit } = this.problem;
    const root = this.rootOf[mentor]!;
    const charge = this.nextCharge(mentor);
    let gained = 0;
    let to = mentor;
    for (;;) {
      const mentee = this.entryMentee[to]!;
      const edge = this.entryEdge[to]!;
      const from = this.mentorOf[mentee]!;
      gained += fit[edge]! - (from < 0 ? 0 : fit[this.edgeOf[mentee]!]!);
      this.mentorOf[mentee] = to;
      this.edgeOf[mentee] = edge;
      this.menteesAt[to]!.push(mentee);
      if (from < 0) break;
      const others = this.menteesAt[from]!;
      others[others.indexOf(mentee)] = others.at(-1)!;
      others.pop();
      to = from;
    }
    const tree = this.mentorsOfRoot.get(root)!;
    this.mentorsOfRoot.delete(root);
    for (const left of tree) {
      this.inTree[left] = 0;
      this.price[left]! += this.level;
    }
    for (const left of tree) this.schedule(left);
    return { netFit: gained - charge, fit: gained };
  }
}
