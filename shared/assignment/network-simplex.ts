import { coreOf, restOf, type Core } from './core';
import type { PairingProblem } from './problem';
import { SpanningTree, type Objective } from './spanning-tree';

/** Steps in which the worth of a pair rises from less than nothing to M; more cost time in pricing, fewer make more pivots. */
const WORTH_STEPS = 8;
/** Pairs looked at before the best of them enters the tree, as a share of √pairs. */
const BLOCK_SHARE = 0.5;
const PIVOTS_PER_TICK = 256;

/**
 * The plan of greatest objective, as a tree whose prices prove it.
 *
 * The primal network simplex method in whole numbers, with block pricing over mentees in permuted order. Two things make it
 * fast. The worth of a pair is raised in steps, each starting from the tree of the step before: few mentees are contested at
 * first, and contests are settled a few at a time. And of long rows only a core of the best pairs at the current prices is
 * priced (Volgenant 1996); when the core has nothing left to gain, one pass over all pairs renews it or ends the work.
 * Typically about linear in the pairs; no polynomial bound is claimed. Memory O(mentees + mentors), and the core.
 */
export function maximize(
  problem: PairingProblem,
  objective: Objective,
  onProgress: (share: number) => void = () => {},
): SpanningTree {
  const tree = new SpanningTree(problem, objective);
  if (problem.menteeCount === 0 || problem.mentorCount === 0) return tree;
  let share = 0;
  const tick = (): void => onProgress(share);
  let core = coreOf(problem, tree, tick);
  const pricing = new Pricing(tree, problem, tick);
  const largest = objective.perFit * largestFit(problem);
  for (let step = 1; step <= WORTH_STEPS; step++) {
    const worth = Math.floor((largest * step) / WORTH_STEPS) - largest;
    if (worth >= objective.perPair) break;
    tree.setPairWorth(worth);
    pricing.exhaust(core);
    share = step / (WORTH_STEPS + 2);
  }
  tree.setPairWorth(objective.perPair);
  pricing.exhaust(core);
  while (core !== problem) {
    share = (1 + share) / 2;
    const next = restOf(problem, tree, core, tick);
    if (!next) break;
    core = next;
    pricing.exhaust(core);
  }
  onProgress(1);
  return tree;
}

function largestFit(problem: PairingProblem): number {
  let largest = 0;
  for (let edge = 0; edge < problem.fit.length; edge++) if (problem.fit[edge]! > largest) largest = problem.fit[edge]!;
  return largest;
}

/** Finds what the tree can gain from, block by block, and lets it enter. */
class Pricing {
  private readonly order: Int32Array;
  private row = 0;
  private mentor = 0;

  constructor(
    private readonly tree: SpanningTree,
    private readonly problem: PairingProblem,
    private readonly tick: () => void,
  ) {
    this.order = permuted(problem.menteeCount);
  }

  /** Pivots until no pair of the core, no place and nobody's being left out gains anything. */
  exhaust(core: Core): void {
    const { tree, order } = this;
    const { rowStart, target, fit } = core;
    const { price, above, aboveWeight, root } = tree;
    const { perPair, perFit } = tree.objective;
    const { menteeCount, mentorCount } = this.problem;
    const all = target.length + menteeCount + mentorCount;
    const block = Math.max(10, Math.floor(BLOCK_SHARE * Math.sqrt(target.length)));
    const mentorsPerBlock = Math.ceil((block * mentorCount) / all);
    // invariant: the mentees and mentors looked at last, these many, gain nothing at the current prices
    let mentees = 0;
    let mentors = 0;
    while (mentees < menteeCount || mentors < mentorCount) {
      let scanned = 0;
      let bestGain = 0;
      let bestMentee = -1;
      let bestMentor = -1;
      let bestWeight = 0;
      for (let rows = 0; scanned < block && rows < menteeCount; rows++, mentees++) {
        const mentee = order[this.row]!;
        const worth = aboveWeight[mentee]! - price[above[mentee]!]!;
        const end = rowStart[mentee + 1]!;
        if (-perPair - worth > bestGain) {
          bestGain = -perPair - worth;
          bestMentee = mentee;
          bestMentor = root;
          bestWeight = -perPair;
        }
        for (let edge = rowStart[mentee]!; edge < end; edge++) {
          const weight = fit[edge]! * perFit;
          const gain = weight - price[target[edge]!]! - worth;
          if (gain > bestGain) {
            bestGain = gain;
            bestMentee = mentee;
            bestMentor = target[edge]!;
            bestWeight = weight;
          }
        }
        scanned += end - rowStart[mentee]! + 1;
        if (++this.row === menteeCount) this.row = 0;
      }
      for (let count = 0; count < mentorsPerBlock; count++, mentors++) {
        const gain = tree.gainFromPlaces(this.mentor);
        if (gain > bestGain) {
          bestGain = gain;
          bestMentee = -1;
          bestMentor = this.mentor;
        }
        if (++this.mentor === mentorCount) this.mentor = 0;
      }
      if (bestGain === 0) {
        this.tick();
        continue;
      }
      if (bestMentee >= 0) tree.enterPair(bestMentee, bestMentor, bestWeight, bestGain);
      else tree.enterPlaces(bestMentor);
      mentees = 0;
      mentors = 0;
      if (tree.pivots % PIVOTS_PER_TICK === 0) this.tick();
    }
  }
}

/** 0 … count − 1 in an order that is scattered and always the same: neighbours in the input tend to contest the same mentors. */
function permuted(count: number): Int32Array {
  const order = Int32Array.from({ length: count }, (_, index) => index);
  let state = 12345;
  for (let last = count - 1; last > 0; last--) {
    // a linear congruential generator; its high bits are the scattered ones
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    const other = Math.floor((state / 2 ** 32) * (last + 1));
    const kept = order[last]!;
    order[last] = order[other]!;
    order[other] = kept;
  }
  return order;
}
