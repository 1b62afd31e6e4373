/**
 * Checks a plan against its problem and its own claims, without trusting whoever made it.
 *
 * The argument is weak duality. Prices u ≥ 0 for mentees and p ≥ 0 for mentors' places with u + p ≥ worth of every eligible
 * pair bound the value of every plan from above: nobody can be worth more than Σ u plus, for each place, what its price
 * exceeds its charge by. A plan whose value equals that bound is the best there is. The worth of a pair is M + fit (`best-total`:
 * 1 + (k + 1) · fit), with M and k recomputed here. Under `lift-the-weakest` the prices speak of pairs with at least the
 * threshold, and two covers show that neither more pairs nor a higher threshold are possible (König 1931: no pairing is
 * larger than a set of mentees and places that touches every pair).
 *
 * Time O(mentees + mentors + pairs). This file imports types only, and the problem is taken to be valid (`assertProblem`).
 */
import type { Cover, Pair, PairingPlan, PairingProblem, SolveOptions } from './problem';

export interface Verdict {
  ok: boolean;
  /** Why not, as sentences with indices; at most `FAULT_LIMIT`. */
  faults: string[];
}

const FAULT_LIMIT = 20;

/** Says whether the plan is valid, is what it claims to be, and is proven best for its aim under the options. */
export function verify(problem: PairingProblem, plan: PairingPlan, options: SolveOptions = {}): Verdict {
  const faults: string[] = [];
  const fault = (sentence: string): void => {
    if (faults.length < FAULT_LIMIT) faults.push(sentence);
  };
  const check = new Check(problem, plan, options, fault);
  if (check.shape()) {
    check.pairs();
    check.claims();
    check.menteePrices();
    check.mentorPrices();
    check.value();
    if (check.aim === 'lift-the-weakest') check.lift();
  }
  return { ok: faults.length === 0, faults };
}

class Check {
  readonly aim: PairingPlan['aim'];
  private readonly floor: number;
  private readonly threshold: number;
  private readonly perPair: number;
  private readonly perFit: number;
  private readonly bound: number;
  /** Locked mentor of each mentee, −1 without a lock. */
  private readonly lockOf: Int32Array;
  private readonly locksAt: Int32Array;
  private readonly loadOf: Int32Array;
  private readonly barredBy = new Map<number, Set<number>>();
  private readonly overridden: Set<string>;
  /** Fit of each mentee's pair in the plan; −1 without one. */
  private readonly fitOf: Float64Array;

  constructor(
    private readonly problem: PairingProblem,
    private readonly plan: PairingPlan,
    private readonly options: SolveOptions,
    private readonly fault: (sentence: string) => void,
  ) {
    this.aim = options.aim ?? 'everyone-first';
    this.floor = options.floor ?? 0;
    this.threshold = this.aim === 'lift-the-weakest' ? (plan.lift?.threshold ?? 0) : 0;
    let places = 0;
    for (const capacity of problem.capacity) places += capacity;
    let largestFit = 0;
    for (let edge = 0; edge < problem.fit.length; edge++) largestFit = Math.max(largestFit, problem.fit[edge]!);
    const largestCharge = problem.loadCharge?.at(-1) ?? 0;
    const most = Math.min(problem.menteeCount, places);
    const scale = (most + 2) * (largestFit + largestCharge + 1);
    this.bound = most * scale;
    this.perPair = this.aim === 'best-total' ? 1 : scale;
    this.perFit = this.aim === 'best-total' ? most + 1 : 1;
    this.lockOf = new Int32Array(problem.menteeCount).fill(-1);
    this.locksAt = new Int32Array(problem.mentorCount);
    this.loadOf = new Int32Array(problem.mentorCount);
    this.fitOf = new Float64Array(problem.menteeCount).fill(-1);
    this.overridden = new Set((options.overridden ?? []).map(String));
    for (const [mentee, mentor] of options.barred ?? []) {
      this.barredBy.set(mentee, (this.barredBy.get(mentee) ?? new Set()).add(mentor));
    }
    for (const [mentee, mentor] of options.locked ?? []) this.readLock([mentee, mentor]);
  }

  private readLock([mentee, mentor]: Pair): void {
    if (this.lockOf[mentee] !== -1) this.fault(`mentee ${mentee} is locked twice`);
    this.lockOf[mentee] = mentor;
    this.locksAt[mentor]!++;
  }

  /** Whether the plan has the arrays it needs, and numbers that can be computed with exactly. */
  shape(): boolean {
    const { problem, plan } = this;
    const fits = [
      ['mentorOf', plan.mentorOf.length, problem.menteeCount],
      ['menteePrice', plan.menteePrice.length, problem.menteeCount],
      ['mentorPrice', plan.mentorPrice.length, problem.mentorCount],
    ] as const;
    for (const [name, length, expected] of fits) {
      if (length !== expected) this.fault(`${name} has length ${length}, not ${expected}`);
    }
    if (plan.aim !== this.aim) this.fault(`the plan is for ${plan.aim}, not ${this.aim}`);
    if (!(this.bound < 2 ** 53)) this.fault('the values exceed exact arithmetic (2^53)');
    plan.menteePrice.forEach((price, mentee) => this.assertPrice(price, `mentee ${mentee}`));
    plan.mentorPrice.forEach((price, mentor) => this.assertPrice(price, `mentor ${mentor}`));
    return fits.every(([, length, expected]) => length === expected);
  }

  private assertPrice(price: number, whose: string): void {
    if (!Number.isSafeInteger(price) || price < 0) this.fault(`the price of ${whose} is ${price}`);
  }

  /** Whether a pair may be used by someone without a lock. */
  private isEligible(mentee: number, edge: number): boolean {
    if (this.problem.fit[edge]! < this.floor) return false;
    return !(this.barredBy.get(mentee)?.has(this.problem.target[edge]!) ?? false);
  }

  /** Every pair is eligible, every lock is kept, no mentor has more mentees than places. */
  pairs(): void {
    const { problem, plan, loadOf } = this;
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      const mentor = plan.mentorOf[mentee]!;
      const lock = this.lockOf[mentee]!;
      if (lock >= 0 && mentor !== lock) this.fault(`mentee ${mentee} is locked to mentor ${lock} but has ${mentor}`);
      if (mentor === -1) continue;
      if (!(mentor >= 0 && mentor < problem.mentorCount)) {
        this.fault(`mentee ${mentee} has mentor ${mentor}, who does not exist`);
        continue;
      }
      loadOf[mentor]!++;
      const edge = problem.target.subarray(problem.rowStart[mentee]!, problem.rowStart[mentee + 1]!).indexOf(mentor);
      if (edge < 0) {
        this.fault(`mentee ${mentee} and mentor ${mentor} are not eligible`);
        continue;
      }
      const at = problem.rowStart[mentee]! + edge;
      this.fitOf[mentee] = problem.fit[at]!;
      const excused =
        lock >= 0 && this.overridden.has(String([mentee, mentor])) && !this.barredBy.get(mentee)?.has(mentor);
      if (!this.isEligible(mentee, at) && !excused) {
        this.fault(`mentee ${mentee} and mentor ${mentor} are barred or below the floor`);
      }
    }
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      const [load, capacity] = [loadOf[mentor]!, problem.capacity[mentor]!];
      if (load > capacity) this.fault(`mentor ${mentor} has ${load} mentees and ${capacity} places`);
    }
  }

  /** The numbers that the plan states about itself. */
  claims(): void {
    const { plan, problem } = this;
    const fits = this.fitOf.filter((fit) => fit >= 0);
    let charge = 0;
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      for (let place = 1; place <= this.loadOf[mentor]!; place++) charge += this.chargeFor(mentor, place, 0);
    }
    this.claim('paired', plan.paired, fits.length);
    this.claim(
      'totalFit',
      plan.totalFit,
      fits.reduce((sum, fit) => sum + fit, 0),
    );
    this.claim('totalCharge', plan.totalCharge, charge);
    this.claim(
      'weakestFit',
      plan.weakestFit,
      fits.length === 0 ? 0 : fits.reduce((least, fit) => Math.min(least, fit)),
    );
    const pairsFirst = fits.length === problem.menteeCount ? 'complete' : 'cardinality-first';
    this.claim('method', plan.method, this.aim === 'best-total' ? 'best-total' : pairsFirst);
  }

  private claim<T>(name: string, claimed: T, found: T): void {
    if (claimed !== found) this.fault(`${name} is claimed as ${claimed} but is ${found}`);
  }

  /** Charge for a mentor's place, counted from 1, once `locks` of the places are given to locked mentees. */
  private chargeFor(mentor: number, place: number, locks: number): number {
    const { loadCharge, placesTaken } = this.problem;
    if (!loadCharge || loadCharge.length === 0) return 0;
    const used = (placesTaken?.[mentor] ?? 0) + locks + place;
    return loadCharge[Math.min(used, loadCharge.length) - 1]!;
  }

  /** No unlocked eligible pair is underpriced, the plan's pairs are priced exactly, and being left out costs nothing. */
  menteePrices(): void {
    const { problem, plan, perPair, perFit } = this;
    const { rowStart, target, fit } = problem;
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      const price = plan.menteePrice[mentee]!;
      const mentor = plan.mentorOf[mentee]!;
      if (this.lockOf[mentee]! >= 0) {
        if (price !== 0) this.fault(`mentee ${mentee} is locked and has the price ${price}`);
        continue;
      }
      if (mentor === -1 && price !== 0) this.fault(`mentee ${mentee} is left out at the price ${price}`);
      for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
        const gap = price + plan.mentorPrice[target[edge]!]! - (perPair + perFit * fit[edge]!);
        if (gap === 0 || (gap > 0 && target[edge] !== mentor)) continue;
        if (fit[edge]! < this.threshold || !this.isEligible(mentee, edge)) continue;
        const wrong = gap < 0 ? 'underpriced' : 'in the plan but overpriced';
        this.fault(`pair (${mentee}, ${target[edge]}) is ${wrong} by ${Math.abs(gap)}`);
      }
    }
  }

  /** A place in use is worth at least its charge, and a free one at most its charge. */
  mentorPrices(): void {
    const { problem, plan, perFit } = this;
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      const price = plan.mentorPrice[mentor]!;
      const locks = this.locksAt[mentor]!;
      const load = this.loadOf[mentor]! - locks;
      const last = load > 0 ? perFit * this.chargeFor(mentor, load, locks) : 0;
      if (price < last)
        this.fault(`mentor ${mentor} has the price ${price}, less than the charge ${last} of a place in use`);
      if (this.loadOf[mentor]! >= problem.capacity[mentor]!) continue;
      const next = perFit * this.chargeFor(mentor, load + 1, locks);
      if (price > next)
        this.fault(`mentor ${mentor} has the price ${price}, more than the charge ${next} of a free place`);
    }
  }

  /** What the prices add up to, and what the unlocked pairs are worth: weak duality closes the argument. */
  value(): void {
    const { problem, plan, perPair, perFit, lockOf } = this;
    let paid = 0;
    let worth = 0;
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      if (lockOf[mentee]! >= 0) continue;
      paid += plan.menteePrice[mentee]!;
      if (plan.mentorOf[mentee] !== -1) worth += perPair + perFit * this.fitOf[mentee]!;
    }
    const steps = problem.loadCharge?.length ?? 0;
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      const locks = this.locksAt[mentor]!;
      const places = problem.capacity[mentor]! - locks;
      const load = this.loadOf[mentor]! - locks;
      for (let place = 1; place <= load; place++) worth -= perFit * this.chargeFor(mentor, place, locks);
      const charged = Math.min(places, steps);
      for (let place = 1; place <= charged; place++) {
        paid += Math.max(0, plan.mentorPrice[mentor]! - perFit * this.chargeFor(mentor, place, locks));
      }
      // beyond the steps every place is charged alike
      const each = Math.max(0, plan.mentorPrice[mentor]! - perFit * this.chargeFor(mentor, charged + 1, locks));
      paid += (places - charged) * each;
    }
    if (paid !== worth) this.fault(`the pairs are worth ${worth} but the prices add up to ${paid}`);
  }

  /** The second witness of `lift-the-weakest`: no more pairs, and no higher threshold for as many. */
  lift(): void {
    const { problem, plan, lockOf } = this;
    if (!plan.lift) {
      this.fault('the plan shows no threshold');
      return;
    }
    const { threshold, cardinalityCover, thresholdCover } = plan.lift;
    if (!Number.isSafeInteger(threshold) || threshold < 0) this.fault(`the threshold is ${threshold}`);
    let pairs = 0;
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      if (lockOf[mentee]! >= 0 || plan.mentorOf[mentee] === -1) continue;
      pairs++;
      if (this.fitOf[mentee]! < threshold) this.fault(`mentee ${mentee} is paired below the threshold ${threshold}`);
    }
    const most = this.coverSize(cardinalityCover, 0, 'cardinalityCover');
    if (most !== pairs) this.fault(`${pairs} pairs are made but the cover allows ${most}`);
    if (pairs === 0) return;
    const fewer = this.coverSize(thresholdCover, threshold + 1, 'thresholdCover');
    if (fewer >= pairs) this.fault(`${fewer} pairs above the threshold ${threshold} are not ruled out`);
  }

  /** Size of a cover in mentees and free places; faults for each unlocked eligible pair of that fit that it leaves open. */
  private coverSize(cover: Cover, leastFit: number, name: string): number {
    const { problem, lockOf } = this;
    const mentees = new Set(cover.mentees);
    const mentors = new Set(cover.mentors);
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      if (lockOf[mentee]! >= 0 || mentees.has(mentee)) continue;
      for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
        if (problem.fit[edge]! < leastFit || mentors.has(problem.target[edge]!)) continue;
        if (this.isEligible(mentee, edge)) this.fault(`${name} leaves pair (${mentee}, ${problem.target[edge]}) open`);
      }
    }
    let size = mentees.size;
    for (const mentor of mentors) size += problem.capacity[mentor]! - this.locksAt[mentor]!;
    return size;
  }
}
