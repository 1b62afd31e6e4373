import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chargeOf, solve, verify } from './index';
import type { PairingPlan, PairingProblem } from './index';
import { AIMS, seeded, problems, generator, optionsFor, bruteForce, fitOf } from '../../tests/support/solve-oracles';

describe('verify', () => {
  const changed = (plan: PairingPlan, change: Partial<PairingPlan>): PairingPlan => ({ ...plan, ...change });
  const withValue = <T extends Int32Array | Float64Array>(values: T, index: number, value: number): T => {
    const copy = values.slice() as T;
    copy[index] = value;
    return copy;
  };

  it.each(AIMS)(
    '%s: refuses every price that is moved, every claim that is changed, every pair that is undone',
    (aim) => {
      fc.assert(
        fc.property(problems(12), fc.nat(), (problem, seed) => {
          const options = { aim, ...optionsFor(problem, seed) };
          const plan = solve(problem, options);
          const refuses = (change: Partial<PairingPlan>): void => {
            expect(verify(problem, changed(plan, change), options).ok).toBe(false);
          };
          const load = new Int32Array(problem.mentorCount);
          plan.mentorOf.forEach((mentor) => mentor >= 0 && load[mentor]!++);
          options.locked?.forEach(([, mentor]) => load[mentor]!--);
          for (const step of [-1, 1]) {
            plan.menteePrice.forEach((price, mentee) => {
              refuses({ menteePrice: withValue(plan.menteePrice, mentee, price + step) });
            });
            plan.mentorPrice.forEach((price, mentor) => {
              if (load[mentor]! > 0) refuses({ mentorPrice: withValue(plan.mentorPrice, mentor, price + step) });
            });
            for (const claim of ['paired', 'totalFit', 'totalCharge', 'weakestFit'] as const)
              refuses({ [claim]: plan[claim] + step });
          }
          plan.mentorOf.forEach((mentor, mentee) => {
            if (mentor < 0) return;
            const fit = fitOf(problem, mentee, mentor);
            const mentorOf = withValue(plan.mentorOf, mentee, -1);
            refuses({ mentorOf });
            refuses({ mentorOf, paired: plan.paired - 1, totalFit: plan.totalFit - fit });
          });
        }),
        seeded(150, 16),
      );
    },
  );

  it('refuses a plan that is worth less, even when it is honest about it', () => {
    fc.assert(
      fc.property(problems(5), fc.nat(), (problem, seed) => {
        const plan = solve(problem);
        const random = generator(seed);
        const load = new Int32Array(problem.mentorCount);
        const mentorOf = plan.mentorOf.map((_, mentee) => {
          const row = [...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1])];
          const free = row.filter((mentor) => load[mentor]! < problem.capacity[mentor]!);
          if (free.length === 0) return -1;
          const mentor = free[Math.floor(random() * free.length)]!;
          load[mentor]!++;
          return mentor;
        });
        const honest = claimsOf(problem, plan, mentorOf);
        const best = bruteForce(problem, {});
        const asGood = honest.paired === best.paired && honest.totalFit - honest.totalCharge === best.netFit;
        // prices that prove one best plan prove every other one
        expect(verify(problem, honest).ok).toBe(asGood);
      }),
      seeded(1500, 17),
    );
  });

  it('refuses a threshold that is moved and a cover with a hole', () => {
    fc.assert(
      fc.property(problems(12), (problem) => {
        const options = { aim: 'lift-the-weakest' } as const;
        const plan = solve(problem, options);
        if (plan.paired === 0) return;
        const lift = plan.lift!;
        const refuses = (change: Partial<typeof lift>): void => {
          expect(verify(problem, changed(plan, { lift: { ...lift, ...change } }), options).ok).toBe(false);
        };
        refuses({ threshold: lift.threshold + 1 });
        refuses({ threshold: lift.threshold - 1 });
        lift.cardinalityCover.mentees.forEach((_, hole) => {
          const mentees = lift.cardinalityCover.mentees.filter((_, index) => index !== hole);
          refuses({ cardinalityCover: { ...lift.cardinalityCover, mentees } });
        });
        expect(verify(problem, changed(plan, { lift: undefined }), options).faults).toContain(
          'the plan shows no threshold',
        );
      }),
      seeded(150, 18),
    );
  });
});

/** The same prices with other pairs, and with claims that are true of them. */
function claimsOf(problem: PairingProblem, plan: PairingPlan, mentorOf: Int32Array): PairingPlan {
  const load = new Int32Array(problem.mentorCount);
  const fits: number[] = [];
  let totalCharge = 0;
  mentorOf.forEach((mentor, mentee) => {
    if (mentor < 0) return;
    fits.push(fitOf(problem, mentee, mentor));
    totalCharge += chargeOf(problem, mentor, load[mentor]!++);
  });
  const totalFit = fits.reduce((sum, fit) => sum + fit, 0);
  const weakestFit = fits.length === 0 ? 0 : Math.min(...fits);
  const method = fits.length === problem.menteeCount ? 'complete' : 'cardinality-first';
  return { ...plan, mentorOf, paired: fits.length, totalFit, totalCharge, weakestFit, method };
}
