import { NearestFirst } from './nearest-first';
import {
  AssignmentInputError,
  assertProblem,
  chargeForLoad,
  chargeOf,
  pairBound,
  type PairingPlan,
  type PairingProblem,
  type SolveOptions,
} from './problem';
import { reduceProblem, type ReducedProblem } from './reduction';
import { objectiveOf } from './solve';
import type { Objective } from './spanning-tree';

/** What a choice costs against the plan it changes; below 0 where it gains. */
export interface Price {
  pairsLost: number;
  /** Net fit: fit less charges. */
  fitLost: number;
}

/** The pairs of a problem by mentor: mentor j's are `mentee[start[j] .. start[j + 1])`, with their index in `target` beside them. */
export interface Columns {
  start: Int32Array;
  mentee: Int32Array;
  edge: Int32Array;
}

/** Time and memory O(mentees + mentors + pairs). */
export function columnsOf(problem: PairingProblem): Columns {
  const { menteeCount, mentorCount, rowStart, target } = problem;
  const start = new Int32Array(mentorCount + 1);
  for (let edge = 0; edge < target.length; edge++) start[target[edge]! + 1]!++;
  for (let mentor = 0; mentor < mentorCount; mentor++) start[mentor + 1]! += start[mentor]!;
  const next = start.slice(0, mentorCount);
  const columns = { start, mentee: new Int32Array(target.length), edge: new Int32Array(target.length) };
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
      const at = next[target[edge]!]!++;
      columns.mentee[at] = mentee;
      columns.edge[at] = edge;
    }
  }
  return columns;
}

/**
 * What can still be moved in a plan, and at what price.
 *
 * Nodes are the mentors and one root, which stands for all who are left out and for all free places. An arc leads from where
 * a mentee is to where the mentee might be; arcs between a mentor and the root take one more place or give one up. Arcs cost
 * what the plan's prices say is lost, so none is negative (Edmonds and Karp 1972), and a shortest path from x to y is the
 * least that the others lose when x has one mentee too many and y one too few. Locks are contracted: nothing moves them.
 */
export class Residual {
  readonly reduced: ReducedProblem;
  readonly root: number;
  /** Where each mentee of the reduced problem is: a mentor, or the root. */
  readonly position: Int32Array;
  /** Mentees of the reduced problem at each mentor. */
  readonly load: Int32Array;
  private readonly objective: Objective;
  private readonly value: number;
  private readonly paired: number;
  private readonly netFit: number;
  private readonly greatestCharges: number;
  /** Arcs into each node: from where, and what they cost. */
  private readonly arcStart: Int32Array;
  private readonly arcFrom: Int32Array;
  private readonly arcCost: Float64Array;
  private readonly distance: Float64Array;
  private readonly queue: NearestFirst;
  private cheapestFirst = false;

  /** Throws an AssignmentInputError when the plan's prices do not prove it best under the options. O(pairs). */
  constructor(
    problem: PairingProblem,
    private readonly plan: PairingPlan,
    options: SolveOptions,
  ) {
    assertProblem(problem);
    assertPlan(problem, plan, options);
    this.reduced = reduceProblem(problem, options);
    this.objective = objectiveOf(problem, this.reduced.aim);
    const { menteeOf, problem: inner } = this.reduced;
    this.root = inner.mentorCount;
    this.position = menteeOf.map((mentee) => (plan.mentorOf[mentee]! < 0 ? this.root : plan.mentorOf[mentee]!));
    this.load = new Int32Array(inner.mentorCount);
    for (const mentor of this.position) if (mentor !== this.root) this.load[mentor]!++;
    this.paired = plan.paired - this.reduced.lockedPairs;
    let charges = 0;
    this.load.forEach((load, mentor) => (charges += chargeForLoad(inner, mentor, load)));
    this.netFit = plan.totalFit - this.reduced.lockedFit - charges;
    this.value = this.objective.perPair * this.paired + this.objective.perFit * this.netFit;
    this.greatestCharges = pairBound(problem) * (problem.loadCharge?.at(-1) ?? 0);
    const columns = columnsOf(inner);
    const arcs = inner.target.length + inner.menteeCount + 2 * inner.mentorCount;
    this.arcStart = new Int32Array(this.root + 2);
    this.arcFrom = new Int32Array(arcs);
    this.arcCost = new Float64Array(arcs);
    this.layArcs(columns);
    this.distance = new Float64Array(this.root + 1);
    this.queue = new NearestFirst(this.distance);
  }

  /** What the aim loses when the mentee takes this pair of its row, before anyone makes room. */
  slack(mentee: number, edge: number): number {
    const { target, fit } = this.reduced.problem;
    const { perPair, perFit } = this.objective;
    return this.menteePrice(mentee) + this.plan.mentorPrice[target[edge]!]! - perPair - perFit * fit[edge]!;
  }

  /** What the aim loses when the mentee is left out. */
  menteePrice(mentee: number): number {
    return this.plan.menteePrice[this.reduced.menteeOf[mentee]!]!;
  }

  /**
   * Distance of every node to `goal`; Infinity where nothing leads there. `arrived`, called with each node and its distance,
   * nearest first, may answer with the distance from which on nothing matters: what lies farther keeps distances that may be
   * too great. The array is reused by the next call. Dijkstra's method (1959), O(arcs · log mentors).
   */
  distancesTo(goal: number, arrived: (node: number, distance: number) => number = () => Infinity): Float64Array {
    const { arcStart, arcFrom, arcCost, distance, queue } = this;
    distance.fill(Infinity);
    queue.clear();
    distance[goal] = 0;
    queue.raise(goal);
    while (queue.size > 0) {
      const node = queue.take();
      const here = distance[node]!;
      const limit = arrived(node, here);
      if (here >= limit) break;
      const reach = this.cheapestFirst ? limit : Infinity;
      for (let arc = arcStart[node]!; arc < arcStart[node + 1]!; arc++) {
        const from = arcFrom[arc]!;
        const there = here + arcCost[arc]!;
        if (there >= reach) break;
        if (there >= distance[from]!) continue;
        distance[from] = there;
        queue.raise(from);
      }
    }
    return distance;
  }

  /** Sorts the arcs into each node by cost, so that many short searches need not look at all of them. O(arcs · log arcs). */
  sortArcs(): void {
    const { arcStart, arcFrom, arcCost, root } = this;
    const nodes = root + 1;
    let dearest = 0;
    for (let arc = 0; arc < arcStart[nodes]!; arc++) dearest = Math.max(dearest, arcCost[arc]!);
    // cost and origin are sorted as one number, where float64 holds it exactly
    if (dearest * nodes + nodes >= 2 ** 53) return;
    for (let node = 0; node < nodes; node++) {
      const keys = arcCost.subarray(arcStart[node], arcStart[node + 1]);
      const origins = arcFrom.subarray(arcStart[node], arcStart[node + 1]);
      for (let arc = 0; arc < keys.length; arc++) keys[arc] = keys[arc]! * nodes + origins[arc]!;
      keys.sort();
      for (let arc = 0; arc < keys.length; arc++) {
        const cost = Math.floor(keys[arc]! / nodes);
        origins[arc] = keys[arc]! - cost * nodes;
        keys[arc] = cost;
      }
    }
    this.cheapestFirst = true;
  }

  /** What a loss in the aim's own scale is in pairs and net fit; the scale keeps them apart. */
  priceOf(loss: number): Price {
    const { perPair, perFit } = this.objective;
    const value = this.value - loss;
    const pairsFirst = perFit === 1;
    const pairs = pairsFirst
      ? Math.floor((value + this.greatestCharges) / perPair)
      : value - perFit * Math.floor(value / perFit);
    const netFit = (value - perPair * pairs) / perFit;
    return { pairsLost: this.paired - pairs, fitLost: this.netFit - netFit };
  }

  private layArcs(columns: Columns): void {
    const { arcStart, load, position, reduced, plan, objective, root } = this;
    const { perFit } = objective;
    const inner = reduced.problem;
    let count = 0;
    const lay = (from: number, cost: number, mentee: number | null): void => {
      if (cost < 0)
        throw new AssignmentInputError('plan', mentee, 'its prices do not prove it best under these options');
      this.arcFrom[count] = from;
      this.arcCost[count++] = cost;
    };
    for (let mentor = 0; mentor < root; mentor++) {
      arcStart[mentor] = count;
      for (let at = columns.start[mentor]!; at < columns.start[mentor + 1]!; at++) {
        const mentee = columns.mentee[at]!;
        const from = position[mentee]!;
        if (from !== mentor) lay(from, this.slack(mentee, columns.edge[at]!), reduced.menteeOf[mentee]!);
      }
      if (load[mentor] === 0) continue;
      lay(root, plan.mentorPrice[mentor]! - perFit * chargeOf(inner, mentor, load[mentor]! - 1), null);
    }
    arcStart[root] = count;
    position.forEach((from, mentee) => {
      if (from !== root) lay(from, this.menteePrice(mentee), reduced.menteeOf[mentee]!);
    });
    for (let mentor = 0; mentor < root; mentor++) {
      if (load[mentor]! >= inner.capacity[mentor]!) continue;
      lay(mentor, perFit * chargeOf(inner, mentor, load[mentor]!) - plan.mentorPrice[mentor]!, null);
    }
    arcStart[root + 1] = count;
  }
}

function assertPlan(problem: PairingProblem, plan: PairingPlan, { aim = 'everyone-first' }: SolveOptions): void {
  const lengths = [
    [plan.mentorOf, problem.menteeCount],
    [plan.menteePrice, problem.menteeCount],
    [plan.mentorPrice, problem.mentorCount],
  ] as const;
  if (lengths.some(([values, length]) => values.length !== length)) {
    throw new AssignmentInputError('plan', null, 'belongs to a problem of another size');
  }
  if (plan.aim !== aim) throw new AssignmentInputError('plan', null, `made for ${plan.aim}, not for ${aim}`);
}
