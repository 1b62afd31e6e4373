import type { PairingProblem } from './problem';

/**
 * A problem from a table of fits, one row per mentee and one column per mentor; null where the two are not eligible.
 * Every mentor has one place unless `more` says otherwise. Meant for worked examples; large problems are built in rows.
 */
export function problemFromMatrix(
  fits: readonly (readonly (number | null)[])[],
  more: { capacity?: readonly number[]; loadCharge?: readonly number[]; placesTaken?: readonly number[] } = {},
): PairingProblem {
  const mentorCount = fits[0]?.length ?? more.capacity?.length ?? 0;
  const rowStart = [0];
  const target: number[] = [];
  const fit: number[] = [];
  for (const row of fits) {
    row.forEach((value, mentor) => {
      if (value === null) return;
      target.push(mentor);
      fit.push(value);
    });
    rowStart.push(target.length);
  }
  return {
    menteeCount: fits.length,
    mentorCount,
    capacity: Int32Array.from(more.capacity ?? new Array<number>(mentorCount).fill(1)),
    rowStart: Int32Array.from(rowStart),
    target: Int32Array.from(target),
    fit: Int32Array.from(fit),
    ...(more.loadCharge ? { loadCharge: Int32Array.from(more.loadCharge) } : {}),
    ...(more.placesTaken ? { placesTaken: Int32Array.from(more.placesTaken) } : {}),
  };
}
