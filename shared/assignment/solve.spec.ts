import { describe, expect, it } from 'vitest';
import { problemFromMatrix, solve, verify } from './index';
import type { PairingPlan, PairingProblem, SolveOptions } from './index';

/** Solves, and holds the plan to its certificate. */
function proven(problem: PairingProblem, options: SolveOptions = {}): PairingPlan {
  const plan = solve(problem, options);
  expect(verify(problem, plan, options).faults).toEqual([]);
  return plan;
}

/** Each mentee but the first fits their own mentor badly and the one before perfectly; the first has only one to go to. */
function chain(length: number): PairingProblem {
  const pairs = 2 * length - 1;
  const rowStart = Int32Array.from({ length: length + 1 }, (_, mentee) => Math.max(0, 2 * mentee - 1));
  return {
    menteeCount: length,
    mentorCount: length,
    capacity: new Int32Array(length).fill(1),
    rowStart,
    target: Int32Array.from({ length: pairs }, (_, pair) => pair >> 1),
    fit: Int32Array.from({ length: pairs }, (_, pair) => (pair % 2 === 1 ? 10_000 : 0)),
  };
}

describe('everyone first', () => {
  it('calls a plan complete when everyone is paired, and cardinality-first when not', () => {
    expect(
      proven(
        problemFromMatrix([
          [5, 1],
          [4, 3],
        ]),
      ).method,
    ).toBe('complete');
    expect(proven(problemFromMatrix([[5], [4]]))).toMatchObject({
      method: 'cardinality-first',
      paired: 1,
      totalFit: 5,
    });
    expect(proven(problemFromMatrix([], { capacity: [2] }))).toMatchObject({
      method: 'complete',
      paired: 0,
      weakestFit: 0,
    });
  });

  it('pairs one more even when all others lose everything by it, where a penalty above the largest fit would not', () => {
    const problem = chain(4);
    const plan = proven(problem);
    expect(plan).toMatchObject({ paired: 4, totalFit: 0 });
    // a penalty of 10,001 for being left out would prefer to leave the first mentee out: 3 pairs of 10,000 and one penalty
    expect(3 * 10_000 - 10_001).toBeGreaterThan(plan.totalFit);
  });

  it('keeps pairs first with 20,000 mentees and fits of 10,000', () => {
    expect(proven(chain(20_000))).toMatchObject({ paired: 20_000, totalFit: 0 });
  });

  it('leaves a mentee out whose only mentor has no places', () => {
    const plan = proven(
      problemFromMatrix(
        [
          [9, null],
          [8, 7],
        ],
        { capacity: [0, 3] },
      ),
    );
    expect([...plan.mentorOf]).toEqual([-1, 1]);
  });

  it('spreads mentees by charges before any mentor is full', () => {
    const problem = problemFromMatrix(
      [
        [900, 700],
        [850, 600],
      ],
      { capacity: [2, 2], loadCharge: [0, 300] },
    );
    const plan = proven(problem);
    expect(plan).toMatchObject({ totalFit: 1550, totalCharge: 0 });
    expect([...plan.mentorOf]).toEqual([1, 0]);
    expect(proven({ ...problem, loadCharge: Int32Array.of(0, 100) })).toMatchObject({
      totalFit: 1750,
      totalCharge: 100,
    });
  });

  it('charges a second mentee as a second when the first was paired in an earlier round', () => {
    const problem = problemFromMatrix([[900, 700]], { capacity: [2, 2], loadCharge: [0, 300], placesTaken: [1, 0] });
    expect([...proven(problem).mentorOf]).toEqual([1]);
  });
});

describe('best total', () => {
  it('leaves someone out, without a floor, when others then fit better', () => {
    const problem = problemFromMatrix([
      [900, null],
      [1000, 50],
    ]);
    expect(proven(problem, { aim: 'best-total' })).toMatchObject({ paired: 1, totalFit: 1000, method: 'best-total' });
    expect(proven(problem)).toMatchObject({ paired: 2, totalFit: 950 });
  });

  it('pairs more where it costs nothing', () => {
    expect(
      proven(
        problemFromMatrix([
          [7, 0],
          [0, 0],
        ]),
        { aim: 'best-total' },
      ).paired,
    ).toBe(2);
  });
});

describe('lift the weakest', () => {
  it('gives up total fit for the least fit', () => {
    const problem = problemFromMatrix([
      [100, 40],
      [60, 10],
    ]);
    expect(proven(problem)).toMatchObject({ totalFit: 110, weakestFit: 10 });
    const lifted = proven(
      problemFromMatrix([
        [100, 45],
        [50, 10],
      ]),
      { aim: 'lift-the-weakest' },
    );
    expect(lifted).toMatchObject({ totalFit: 95, weakestFit: 45, lift: { threshold: 45 } });
  });

  it('does not let a weak locked pair hold the threshold down', () => {
    const problem = problemFromMatrix([
      [1, 90, 90],
      [90, 50, 60],
      [90, 60, 55],
    ]);
    const plan = proven(problem, { aim: 'lift-the-weakest', locked: [[0, 0]] });
    expect(plan).toMatchObject({ weakestFit: 1, totalFit: 121, lift: { threshold: 60 } });
  });
});

describe('locks, bars and floor', () => {
  const problem = problemFromMatrix([
    [9, 6],
    [8, null],
  ]);

  it('lets a lock cause a shortage, and claims the best plan subject to it', () => {
    expect(proven(problem)).toMatchObject({ paired: 2, totalFit: 14 });
    expect(proven(problem, { locked: [[0, 0]] })).toMatchObject({
      paired: 1,
      totalFit: 9,
      method: 'cardinality-first',
    });
  });

  it('charges locked mentees first', () => {
    const charged = problemFromMatrix(
      [
        [900, 700],
        [850, 600],
      ],
      { capacity: [2, 2], loadCharge: [0, 300] },
    );
    const plan = proven(charged, { locked: [[1, 0]] });
    expect(plan).toMatchObject({ totalFit: 1550, totalCharge: 0 });
    const both = proven(charged, {
      locked: [
        [1, 0],
        [0, 0],
      ],
    });
    expect(both).toMatchObject({ totalFit: 1750, totalCharge: 300 });
  });

  it('uses neither barred pairs nor pairs below the floor', () => {
    expect(proven(problem, { barred: [[0, 1]] })).toMatchObject({ paired: 1, totalFit: 9 });
    expect(proven(problem, { floor: 8 })).toMatchObject({ paired: 1, totalFit: 9 });
  });

  it.each<[string, SolveOptions, string]>([
    ['not eligible', { locked: [[1, 1]] }, 'options.locked[0]: pair (1, 1) is not eligible'],
    ['barred', { locked: [[0, 1]], barred: [[0, 1]] }, 'options.locked[0]: pair (0, 1) is barred'],
    ['below the floor', { locked: [[0, 1]], floor: 7 }, 'options.locked[0]: pair (0, 1) is below the floor'],
    [
      'of someone locked elsewhere',
      {
        locked: [
          [0, 0],
          [0, 1],
        ],
      },
      'options.locked[1]: mentee 0 is locked twice',
    ],
    [
      'beyond the places',
      {
        locked: [
          [0, 0],
          [1, 0],
        ],
      },
      'options.locked[1]: mentor 0 has no place for this lock',
    ],
    ['of nobody', { locked: [[2, 0]] }, 'options.locked[0]: mentee 2 does not exist'],
  ])('refuses a lock that is %s', (_, options, message) => {
    expect(() => solve(problem, options)).toThrow(message);
  });

  it('allows a lock below the floor where the coordinator overrides it', () => {
    const options: SolveOptions = { locked: [[0, 1]], overridden: [[0, 1]], floor: 7 };
    expect(proven(problem, options)).toMatchObject({ paired: 2, totalFit: 14 });
    expect(() => solve(problem, { overridden: [[0, 1]] })).toThrow('options.overridden[0]: pair (0, 1) is not locked');
  });
});

describe('progress', () => {
  it('rises from 0 to 1, and abandons the work when the listener throws', () => {
    const shares: number[] = [];
    solve(chain(500), { onProgress: (share) => shares.push(share) });
    expect(shares.at(-1)).toBe(1);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    const stop = (): void => {
      throw new Error('cancelled');
    };
    expect(() => solve(chain(500), { onProgress: stop })).toThrow('cancelled');
  });
});
