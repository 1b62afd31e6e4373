import { describe, expect, it } from 'vitest';
import { problemFromMatrix, solve } from './index';
import type { Aim, Pair, PairingPlan, PairingProblem, SolveOptions } from './index';
import { priceOfBarring, priceOfChoice, priceOfPartner, pricesOfPartners, type Price } from './price';
import { randomOptions, randomProblem } from './random-problems';

const AIMS: Aim[] = ['everyone-first', 'best-total', 'lift-the-weakest'];

/** What solving again with one more lock or bar gives up; null where that is refused. */
function again(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions,
  change: { force?: Pair; bar?: Pair },
): Price | null {
  const locked = [...(options.locked ?? []), ...(change.force ? [change.force] : [])];
  const barred = [...(options.barred ?? []), ...(change.bar ? [change.bar] : [])];
  try {
    const other = solve(problem, { ...options, locked, barred });
    const [net, otherNet] = [plan.totalFit - plan.totalCharge, other.totalFit - other.totalCharge];
    return { pairsLost: plan.paired - other.paired, fitLost: net - otherNet };
  } catch {
    return null;
  }
}

describe('the price of a choice equals solving again', () => {
  it.each(AIMS)('%s: for every partner of every mentee, and for barring every pairing', (aim) => {
    let partners = 0;
    let pairings = 0;
    for (let seed = 1; seed <= 1500; seed++) {
      const problem = randomProblem(seed, 9);
      const options = { aim, ...randomOptions(problem, seed) };
      const plan = solve(problem, options);
      const locked = new Set(options.locked?.map(([mentee]) => mentee));
      const barring = priceOfBarring(problem, plan, options);
      for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
        const partner = plan.mentorOf[mentee]!;
        if (locked.has(mentee)) {
          expect(barring[mentee]).toBeNull();
          continue;
        }
        const row = [...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1])];
        const expected = row.map((mentor) => again(problem, plan, options, { force: [mentee, mentor] }));
        expect(pricesOfPartners(problem, plan, mentee, options), `seed ${seed}, mentee ${mentee}`).toEqual(expected);
        expect([...priceOfPartner(problem, plan, mentee, options)]).toEqual(
          expected.map((price) => (!price || price.pairsLost > 0 ? -1 : Math.max(0, price.fitLost))),
        );
        const bar = partner < 0 ? null : again(problem, plan, options, { bar: [mentee, partner] });
        expect(barring[mentee], `seed ${seed}, mentee ${mentee}`).toEqual(bar);
        if (bar) expect(priceOfChoice(problem, plan, { bar: [mentee, partner] }, options)).toEqual(bar);
        partners += row.length;
        if (bar) pairings++;
      }
    }
    expect(partners).toBeGreaterThan(5000);
    expect(pairings).toBeGreaterThan(1000);
  });

  it.each(AIMS)('%s: for one pair forced, and for one forced while another is barred', (aim) => {
    for (let seed = 1; seed <= 300; seed++) {
      const problem = randomProblem(seed, 8);
      const plan = solve(problem, { aim });
      if (problem.target.length < 2 || problem.rowStart[1] === 0) continue;
      const force: Pair = [0, problem.target[0]!];
      const bars = plan.mentorOf.findLastIndex((mentor, mentee) => mentor >= 0 && mentee > 0);
      const forced = again(problem, plan, { aim }, { force });
      if (!forced) {
        expect(() => priceOfChoice(problem, plan, { force }, { aim })).toThrow();
        continue;
      }
      expect(priceOfChoice(problem, plan, { force }, { aim })).toEqual(forced);
      if (bars < 0) continue;
      const both = { force, bar: [bars, plan.mentorOf[bars]!] as const };
      expect(priceOfChoice(problem, plan, both, { aim })).toEqual(again(problem, plan, { aim }, both));
    }
  });

  it('on larger problems, where the paths are long', () => {
    for (let seed = 1; seed <= 200; seed++) {
      const problem = randomProblem(seed, 50);
      const options = randomOptions(problem, seed);
      const plan = solve(problem, options);
      priceOfBarring(problem, plan, options).forEach((price, mentee) => {
        if (!price) return;
        expect(price).toEqual(again(problem, plan, options, { bar: [mentee, plan.mentorOf[mentee]!] }));
      });
    }
  });
});

describe('what prices say', () => {
  const problem = problemFromMatrix([
    [900, 800, null],
    [850, 300, 400],
    [null, 500, null],
  ]);

  it('is 0 for the partner in the plan, the loss for others, and a pair where someone would be left out', () => {
    const plan = solve(problem);
    expect([...plan.mentorOf]).toEqual([0, 2, 1]);
    expect([...priceOfPartner(problem, plan, 1)]).toEqual([-1, -1, 0]);
    expect(pricesOfPartners(problem, plan, 1)).toEqual([
      { pairsLost: 1, fitLost: 150 },
      { pairsLost: 1, fitLost: 600 },
      { pairsLost: 0, fitLost: 0 },
    ]);
    expect(priceOfBarring(problem, plan)[2]).toEqual({ pairsLost: 1, fitLost: 150 });
  });

  it('costs nothing to bar what the plan does not use', () => {
    expect(priceOfChoice(problem, solve(problem), { bar: [0, 1] })).toEqual({ pairsLost: 0, fitLost: 0 });
    expect(priceOfChoice(problem, solve(problem), {})).toEqual({ pairsLost: 0, fitLost: 0 });
  });

  it('counts what charges change', () => {
    const charged = problemFromMatrix(
      [
        [500, 450],
        [500, null],
      ],
      { capacity: [2, 1], loadCharge: [0, 30] },
    );
    const plan = solve(charged);
    expect(plan).toMatchObject({ totalFit: 1000, totalCharge: 30 });
    expect([...priceOfPartner(charged, plan, 0)]).toEqual([0, 20]);
  });

  it('refuses locked mentees, strangers, and plans made for something else', () => {
    const plan = solve(problem);
    expect(() => priceOfPartner(problem, plan, 0, { locked: [[0, 0]] })).toThrow('mentee 0 is locked');
    expect(() => priceOfPartner(problem, plan, 3)).toThrow('mentee: mentee 3 does not exist');
    expect(() => priceOfPartner(problem, plan, 0, { aim: 'best-total' })).toThrow('plan: made for everyone-first');
    expect(() => priceOfBarring(problem, { ...plan, mentorPrice: plan.mentorPrice.map(() => 0) })).toThrow(
      'do not prove',
    );
    expect(() => priceOfBarring(problem, { ...plan, mentorOf: plan.mentorOf.subarray(1) })).toThrow('another size');
    expect(() => priceOfChoice(problem, plan, { force: [2, 0] })).toThrow('pair (2, 0) cannot be had');
  });
});
