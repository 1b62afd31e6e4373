import { describe, expect, it } from 'vitest';
import { assertProblem, findEdge, lexicographicScale, problemFromMatrix, solve } from './index';
import type { PairingProblem } from './index';

const valid = (): PairingProblem =>
  problemFromMatrix(
    [
      [5, 1, null],
      [null, 3, 2],
    ],
    { capacity: [1, 2, 0] },
  );

describe('assertProblem', () => {
  it.each<[Partial<PairingProblem>, string]>([
    [{ menteeCount: -1 }, 'menteeCount: -1 is not a count'],
    [{ mentorCount: 2.5 }, 'mentorCount: 2.5 is not a count'],
    [{ capacity: Int32Array.of(1, -2, 0) }, 'capacity[1]: -2 is negative'],
    [{ capacity: Int32Array.of(1) }, 'capacity: length 1, expected 3'],
    [{ rowStart: Int32Array.of(0, 2) }, 'rowStart: length 2, expected 3'],
    [{ rowStart: Int32Array.of(1, 2, 4) }, 'rowStart[0]: 1, expected 0'],
    [{ rowStart: Int32Array.of(0, 5, 4) }, 'rowStart[2]: less than the start before it'],
    [{ rowStart: Int32Array.of(0, 2, 3) }, 'rowStart[2]: 3, expected 4 pairs'],
    [{ target: Int32Array.of(1, 0, 1, 2) }, 'target[1]: mentor 0 of mentee 0 is out of order'],
    [{ target: Int32Array.of(0, 1, 2, 2) }, 'target[3]: mentor 2 of mentee 1 appears twice'],
    [{ target: Int32Array.of(0, 1, 1, 3) }, 'target[3]: mentor 3 of mentee 1 does not exist'],
    [{ fit: Int32Array.of(0, -1, 0, 0) }, 'fit[1]: -1 is negative'],
    [{ fit: Int32Array.of(0, 1) }, 'fit: length 2, expected 4'],
    [{ loadCharge: Int32Array.of(0, 5, 4) }, 'loadCharge[2]: less than the charge before it'],
    [{ loadCharge: Int32Array.of(-1) }, 'loadCharge[0]: -1 is negative'],
    [{ placesTaken: Int32Array.of(0, 0) }, 'placesTaken: length 2, expected 3'],
  ])('refuses %o', (change, message) => {
    expect(() => assertProblem({ ...valid(), ...change })).toThrow(message);
    expect(() => solve({ ...valid(), ...change })).toThrow(message);
  });

  it('accepts what is valid, empty sides included', () => {
    expect(() => assertProblem(valid())).not.toThrow();
    expect(() => assertProblem(problemFromMatrix([]))).not.toThrow();
  });
});

describe('findEdge', () => {
  it('finds a pair by its two people', () => {
    expect([findEdge(valid(), 1, 2), findEdge(valid(), 0, 2), findEdge(valid(), 1, 0)]).toEqual([3, -1, -1]);
  });
});

describe('lexicographicScale', () => {
  it('is (k + 2)(C + L + 1)', () => {
    expect(lexicographicScale({ ...valid(), loadCharge: Int32Array.of(0, 4) })).toBe((2 + 2) * (5 + 4 + 1));
  });

  it('refuses a problem whose values exceed exact arithmetic', () => {
    const crowd = (menteeCount: number): PairingProblem => ({
      menteeCount,
      mentorCount: 1,
      capacity: Int32Array.of(menteeCount),
      rowStart: new Int32Array(menteeCount + 1).fill(1, 1),
      target: Int32Array.of(0),
      fit: Int32Array.of(2 ** 31 - 1),
    });
    expect(() => solve(crowd(2050))).toThrow('exceed exact arithmetic (2^53)');
    expect(solve(crowd(2040))).toMatchObject({ paired: 1, totalFit: 2 ** 31 - 1 });
  });
});
