import type { PairingProblem } from './problem';

/** What the objective gives for a pair: `perPair + perFit · fit`; charges weigh `perFit` too. Whole numbers. */
export interface Objective {
  perPair: number;
  perFit: number;
}

/**
 * The basis of the network simplex: a strongly feasible spanning tree of the flow mentees → mentors → root, where the root
 * is the common end of all places and of being left out.
 *
 * Because each mentee is worth one unit, the tree is an alternating one (Barr, Glover and Klingman 1977): a mentee is either
 * a leaf, paired over its only tree arc, or it stands between a parent and the one mentor it is paired with. So only mentors
 * are kept as nodes, and mentees are the links between them. Cunningham's rule (1976) for the leaving arc keeps the tree
 * strongly feasible, so that the simplex method cannot cycle although most of its pivots change no pairing.
 *
 * Weights are kept less `perPair`: a pair weighs `perFit · fit` and being left out weighs −perPair.
 */
export class SpanningTree {
  /** Index that stands for the root among mentors. */
  readonly root: number;
  readonly objective: Objective;
  /** Dual price of each mentor; the root's is 0. */
  readonly price: Float64Array;
  /** Towards the root: the mentor above each mentee (the root: the arc of being left out), and that arc's weight. */
  readonly above: Int32Array;
  readonly aboveWeight: Float64Array;
  /** The mentor each mentee is paired with (the root: left out), and that arc's weight. Equal to `above` for leaves. */
  readonly mate: Int32Array;
  readonly mateWeight: Float64Array;
  /** Mentees paired with each mentor. */
  readonly load: Int32Array;
  /** Weight of a mentor's next place, and of its last one in use (−Infinity where there is none). */
  readonly nextCharge: Float64Array;
  readonly lastCharge: Float64Array;
  /** Pivots made, and mentors whose price was moved: counters of work. */
  pivots = 0;
  moved = 0;

  /** The mentee that links a mentor to its parent, or −1 when the mentor hangs on the root by its own places. */
  readonly link: Int32Array;
  private readonly parent: Int32Array;
  private readonly depth: Int32Array;
  private readonly firstChild: Int32Array;
  private readonly nextSibling: Int32Array;
  private readonly previousSibling: Int32Array;
  private readonly charges: Float64Array;
  /** For each number of places used: where the run of equal charges that the next place belongs to starts and ends. */
  private readonly runStart: Int32Array;
  private readonly runEnd: Int32Array;
  private readonly taken: Int32Array;

  constructor(
    private readonly problem: PairingProblem,
    objective: Objective,
  ) {
    this.objective = { perPair: objective.perPair, perFit: objective.perFit };
    const { menteeCount, mentorCount } = problem;
    this.root = mentorCount;
    this.price = new Float64Array(mentorCount + 1);
    this.above = new Int32Array(menteeCount).fill(mentorCount);
    this.aboveWeight = new Float64Array(menteeCount).fill(-objective.perPair);
    this.mate = this.above.slice();
    this.mateWeight = this.aboveWeight.slice();
    this.load = new Int32Array(mentorCount);
    this.nextCharge = new Float64Array(mentorCount);
    this.lastCharge = new Float64Array(mentorCount).fill(-Infinity);
    this.link = new Int32Array(mentorCount).fill(-1);
    this.parent = new Int32Array(mentorCount + 1).fill(mentorCount);
    this.depth = new Int32Array(mentorCount + 1).fill(1);
    this.depth[mentorCount] = 0;
    this.firstChild = new Int32Array(mentorCount + 1).fill(-1);
    this.nextSibling = new Int32Array(mentorCount + 1).fill(-1);
    this.previousSibling = new Int32Array(mentorCount + 1).fill(-1);
    this.charges = Float64Array.from(
      problem.loadCharge?.length ? problem.loadCharge : [0],
      (charge) => charge * objective.perFit,
    );
    this.runStart = new Int32Array(this.charges.length);
    this.runEnd = new Int32Array(this.charges.length).fill(2 ** 31 - 1);
    for (let place = 1; place < this.charges.length; place++) {
      this.runStart[place] = this.charges[place] === this.charges[place - 1] ? this.runStart[place - 1]! : place;
    }
    for (let place = this.charges.length - 2; place >= 0; place--) {
      this.runEnd[place] = this.charges[place] === this.charges[place + 1] ? this.runEnd[place + 1]! : place + 1;
    }
    this.taken = problem.placesTaken ?? new Int32Array(mentorCount);
    for (let mentor = 0; mentor < mentorCount; mentor++) {
      this.setLoad(mentor, 0);
      this.adopt(mentor, mentorCount);
      // a mentor without places is priced out of every pair
      this.price[mentor] = problem.capacity[mentor] === 0 ? Infinity : this.nextCharge[mentor]!;
    }
  }

  /** Makes one more pair worth `perPair`, and moves the prices that hang on someone being left out. */
  setPairWorth(perPair: number): void {
    const rise = perPair - this.objective.perPair;
    this.objective.perPair = perPair;
    for (let mentee = 0; mentee < this.above.length; mentee++) {
      if (this.above[mentee] === this.root) this.aboveWeight[mentee] = -perPair;
      if (this.mate[mentee] === this.root) this.mateWeight[mentee] = -perPair;
    }
    for (let mentor = this.firstChild[this.root]!; mentor >= 0; mentor = this.nextSibling[mentor]!) {
      if (this.link[mentor]! >= 0) this.shift(mentor, rise);
    }
  }

  /** What a mentee has, in weights less `perPair`: its dual price less `perPair`. */
  worth(mentee: number): number {
    return this.aboveWeight[mentee]! - this.price[this.above[mentee]!]!;
  }

  /** Brings the pair into the tree; `gain` = weight − price of the mentor − worth of the mentee, and is positive. */
  enterPair(mentee: number, mentor: number, weight: number, gain: number): void {
    this.pivots++;
    const from = this.above[mentee]!;
    const own = this.mate[mentee]!;
    if (own !== from) {
      if (this.isWithin(mentor, own)) {
        // the mentee stands above the mentor: the pairings on the path between them move round
        this.mate[mentee] = mentor;
        this.mateWeight[mentee] = weight;
        this.reverse(mentor, own, mentee, from, gain);
      } else {
        // no flow moves: the mentee, with all that hangs on it, goes to the other parent
        this.above[mentee] = mentor;
        this.aboveWeight[mentee] = weight;
        this.rehang(own, mentor, -gain);
      }
      return;
    }
    if (from !== this.root && !this.isWithin(mentor, from)) {
      const link = this.link[from]!;
      const empty = link >= 0 || this.load[from] === this.startOfRun(from);
      if (empty) {
        // no flow moves: the mentee replaces what linked its mentor to the root
        if (link >= 0) this.makeLeaf(link, from);
        this.link[from] = mentee;
        this.above[mentee] = mentor;
        this.aboveWeight[mentee] = weight;
        this.rehang(from, mentor, -gain);
        return;
      }
      this.setLoad(from, this.load[from]! - 1);
      this.price[from] = this.nextCharge[from]!;
    }
    this.augment(mentee, from, mentor, weight, gain);
  }

  /** What would be gained from a mentor's next place, or from freeing its last one; at most 0 when it sets the price already. */
  gainFromPlaces(mentor: number): number {
    if (this.link[mentor]! < 0) return 0;
    const price = this.price[mentor]!;
    return Math.max(price - this.nextCharge[mentor]!, this.lastCharge[mentor]! - price);
  }

  /** Lets a mentor's places set its price, where `gainFromPlaces` is positive. */
  enterPlaces(mentor: number): void {
    this.pivots++;
    const price = this.price[mentor]!;
    if (price > this.nextCharge[mentor]!) {
      // the next place is cheaper; no flow moves
      this.makeLeaf(this.link[mentor]!, mentor);
      this.link[mentor] = -1;
      this.rehang(mentor, this.root, this.nextCharge[mentor]! - price);
      return;
    }
    // the last place is too dear: a pairing moves up the tree, at the end maybe out
    const gain = this.lastCharge[mentor]! - price;
    const top = this.childTowards(this.root, mentor);
    this.setLoad(mentor, this.load[mentor]! - 1);
    this.reverse(mentor, this.giveWay(top, mentor), -1, this.root, gain);
  }

  /** One unit moves from the mentee's old place to the mentor and on; the first arc from the apex that is used up leaves. */
  private augment(mentee: number, from: number, mentor: number, weight: number, gain: number): void {
    if (mentor === this.root) {
      this.pairOutright(mentee, mentor, weight);
      return;
    }
    const apex = from !== this.root && this.isWithin(mentor, from) ? from : this.root;
    const top = this.childTowards(apex, mentor);
    if (top === mentor && this.link[top]! < 0 && this.load[top]! + 1 < this.endOfRun(top)) {
      // the mentor has places left at the same charge: the mentee is simply paired
      this.setLoad(top, this.load[top]! + 1);
      this.pairOutright(mentee, mentor, weight);
      return;
    }
    const cut = this.giveWay(top, mentor);
    this.mate[mentee] = mentor;
    this.mateWeight[mentee] = weight;
    this.reverse(mentor, cut, mentee, from, gain);
  }

  /** Makes the mentee a leaf of the mentor, or of the root. */
  private pairOutright(mentee: number, mentor: number, weight: number): void {
    this.mate[mentee] = this.above[mentee] = mentor;
    this.mateWeight[mentee] = this.aboveWeight[mentee] = weight;
  }

  /** Lets one unit out at the top of the path from a mentor upwards; returns the mentor below the arc that leaves the tree. */
  private giveWay(top: number, mentor: number): number {
    const link = this.link[top]!;
    if (link >= 0) {
      this.makePairedAbove(link);
      return top;
    }
    const hasMore = this.load[top]! + 1 < this.endOfRun(top);
    this.setLoad(top, this.load[top]! + 1);
    if (!hasMore) return top;
    const below = this.childTowards(top, mentor);
    this.makePairedAbove(this.link[below]!);
    return below;
  }

  /** The mentee leaves the mentor below it and is paired over the arc above it. */
  private makePairedAbove(mentee: number): void {
    this.mate[mentee] = this.above[mentee]!;
    this.mateWeight[mentee] = this.aboveWeight[mentee]!;
  }

  /** The mentee keeps its mentor and loses the arc above it. */
  private makeLeaf(mentee: number, mentor: number): void {
    this.above[mentee] = mentor;
    this.aboveWeight[mentee] = this.mateWeight[mentee]!;
  }

  /** Turns the path from `bottom` up to `top` round, so that `bottom` hangs by `link` under `parent`, and shifts the prices. */
  private reverse(bottom: number, top: number, link: number, parent: number, change: number): void {
    let child = bottom;
    let newParent = parent;
    let newLink = link;
    for (;;) {
      const oldLink = this.link[child]!;
      const oldParent = this.parent[child]!;
      this.disown(child);
      this.link[child] = newLink;
      this.adopt(child, newParent);
      if (child === top) break;
      const { above, aboveWeight, mate, mateWeight } = this;
      const weight = aboveWeight[oldLink]!;
      above[oldLink] = child;
      aboveWeight[oldLink] = mateWeight[oldLink]!;
      mate[oldLink] = oldParent;
      mateWeight[oldLink] = weight;
      newParent = child;
      newLink = oldLink;
      child = oldParent;
    }
    this.shift(bottom, change);
  }

  private rehang(mentor: number, parent: number, change: number): void {
    this.disown(mentor);
    this.adopt(mentor, parent);
    this.shift(mentor, change);
  }

  private disown(child: number): void {
    const { nextSibling, previousSibling } = this;
    const next = nextSibling[child]!;
    const previous = previousSibling[child]!;
    if (previous >= 0) nextSibling[previous] = next;
    else this.firstChild[this.parent[child]!] = next;
    if (next >= 0) previousSibling[next] = previous;
  }

  private adopt(child: number, parent: number): void {
    const first = this.firstChild[parent]!;
    this.parent[child] = parent;
    this.nextSibling[child] = first;
    this.previousSibling[child] = -1;
    if (first >= 0) this.previousSibling[first] = child;
    this.firstChild[parent] = child;
  }

  /** Adds to the price of a mentor and of all below it, and sets their depths anew. */
  private shift(top: number, change: number): void {
    const { price, depth, parent, firstChild, nextSibling } = this;
    let node = top;
    let moved = 0;
    for (;;) {
      price[node]! += change;
      depth[node] = depth[parent[node]!]! + 1;
      moved++;
      let next = firstChild[node]!;
      while (next < 0 && node !== top) {
        next = nextSibling[node]!;
        if (next < 0) node = parent[node]!;
      }
      if (next < 0) break;
      node = next;
    }
    this.moved += moved;
  }

  private isWithin(mentor: number, top: number): boolean {
    const { depth, parent } = this;
    const level = depth[top]!;
    let node = mentor;
    while (depth[node]! > level) node = parent[node]!;
    return node === top;
  }

  private childTowards(ancestor: number, mentor: number): number {
    const { parent } = this;
    let node = mentor;
    while (parent[node] !== ancestor) node = parent[node]!;
    return node;
  }

  private setLoad(mentor: number, load: number): void {
    const { charges } = this;
    const last = charges.length - 1;
    const used = this.taken[mentor]! + load;
    this.load[mentor] = load;
    this.nextCharge[mentor] = load < this.problem.capacity[mentor]! ? charges[Math.min(used, last)]! : Infinity;
    this.lastCharge[mentor] = load > 0 ? charges[Math.min(used - 1, last)]! : -Infinity;
  }

  /** The loads at which the run of equally charged places, to which the mentor's next place belongs, starts and ends. */
  private startOfRun(mentor: number): number {
    const taken = this.taken[mentor]!;
    const place = Math.min(taken + this.load[mentor]!, this.charges.length - 1);
    return Math.max(0, this.runStart[place]! - taken);
  }

  private endOfRun(mentor: number): number {
    const taken = this.taken[mentor]!;
    const place = Math.min(taken + this.load[mentor]!, this.charges.length - 1);
    return Math.min(this.problem.capacity[mentor]!, this.runEnd[place]! - taken);
  }
}
