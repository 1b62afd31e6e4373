import { describe, expect, it } from 'vitest';
import { chargeOf, problemFromMatrix, solve, verify } from './index';
import { priceOfChoice } from './price';
import { randomOptions, randomProblem } from './random-problems';
import { repairWithout, standbys } from './standbys';

describe('standbys', () => {
  const problem = problemFromMatrix(
    [
      [900, 500, 700, 650],
      [null, 800, 600, null],
      [null, 400, null, null],
    ],
    { capacity: [1, 1, 1, 1] },
  );

  it('names the best eligible mentor with a free place, and nobody for those left out', () => {
    const plan = solve(problem, { barred: [[1, 1]], floor: 450 });
    expect([...plan.mentorOf]).toEqual([0, 2, -1]);
    const free = standbys(problem, plan, { barred: [[1, 1]], floor: 450 });
    expect([...free.mentor]).toEqual([3, -1, -1]);
    expect([...free.fit]).toEqual([650, -1, -1]);
  });

  it('gives locked mentees a standby too', () => {
    const locked = [[0, 3]] as const;
    const plan = solve(problem, { locked });
    expect([...standbys(problem, plan, { locked }).mentor]).toEqual([0, -1, -1]);
  });

  it('weighs the charge of the place that would be taken', () => {
    const charged = problemFromMatrix([[900, 800, 700]], {
      capacity: [1, 2, 1],
      loadCharge: [0, 300],
      placesTaken: [0, 1, 0],
    });
    const free = standbys(charged, solve(charged));
    expect([free.mentor[0], free.fit[0]]).toEqual([2, 700]);
  });

  it('is always eligible, free, and the best such mentor', () => {
    let named = 0;
    for (let seed = 1; seed <= 1000; seed++) {
      const problem = randomProblem(seed, 12);
      const options = randomOptions(problem, seed);
      const plan = solve(problem, options);
      const load = problem.capacity.map((_, mentor) => plan.mentorOf.filter((other) => other === mentor).length);
      const { mentor, fit } = standbys(problem, plan, options);
      for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
        const candidates = Array.from({ length: problem.mentorCount }, (_, other) => other).flatMap((other) => {
          const row = problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]);
          const at = row.indexOf(other);
          const value = problem.fit[problem.rowStart[mentee]! + at]!;
          if (at < 0 || value < (options.floor ?? 0) || other === plan.mentorOf[mentee]) return [];
          if (options.barred?.some(([one, barred]) => one === mentee && barred === other)) return [];
          if (load[other]! >= problem.capacity[other]!) return [];
          return [{ other, value, net: value - chargeOf(problem, other, load[other]!) }];
        });
        const best = candidates.sort((a, b) => b.net - a.net || a.other - b.other)[0];
        const expected = best && plan.mentorOf[mentee]! >= 0 ? [best.other, best.value] : [-1, -1];
        expect([mentor[mentee], fit[mentee]], `seed ${seed}, mentee ${mentee}`).toEqual(expected);
        if (mentor[mentee]! >= 0) named++;
      }
    }
    expect(named).toBeGreaterThan(300);
  });
});

describe('a full repair', () => {
  it('is proven best without the pair, and costs what barring it costs', () => {
    for (let seed = 1; seed <= 300; seed++) {
      const problem = randomProblem(seed, 10);
      const options = randomOptions(problem, seed);
      const plan = solve(problem, options);
      const mentee = plan.mentorOf.findIndex((mentor) => mentor >= 0);
      if (mentee < 0) continue;
      const pair = [mentee, plan.mentorOf[mentee]!] as const;
      const repaired = repairWithout(problem, plan, pair, options);
      const locked = options.locked?.filter(([one]) => one !== mentee);
      const allowed = { ...options, locked, barred: [...(options.barred ?? []), pair] };
      expect(verify(problem, repaired, allowed).faults).toEqual([]);
      if (locked?.length !== options.locked?.length) continue;
      expect(priceOfChoice(problem, plan, { bar: pair }, options)).toEqual({
        pairsLost: plan.paired - repaired.paired,
        fitLost: plan.totalFit - plan.totalCharge - repaired.totalFit + repaired.totalCharge,
      });
    }
  });

  it('releases the lock of the pairing that fell through', () => {
    const problem = problemFromMatrix([[100, 900]]);
    const locked = [[0, 0]] as const;
    const repaired = repairWithout(problem, solve(problem, { locked }), [0, 0], { locked });
    expect([...repaired.mentorOf]).toEqual([1]);
    expect(() => repairWithout(problem, repaired, [0, 0])).toThrow('pair: (0, 0) is not in the plan');
  });
});
