/** One criterion's part in a pairing's fit. */
export interface FitCriterion {
  readonly label: string;
  /** Four letters or so for the header; the label's first word without it. */
  readonly short?: string;
  /** Relative weight, any positive unit; a cell's width follows it. */
  readonly weight: number;
  /** 0 to 1. */
  readonly score: number;
  /** The data were missing, and 0.5 stands in for them. */
  readonly missing?: boolean;
}

export interface StripCell {
  readonly x: number;
  readonly width: number;
}

/** A cell is never narrower than this, in CSS pixels, so that its fill can be told. */
export const NARROWEST_CELL = 14;
export const CELL_GAP = 2;

/**
 * Places one cell per criterion within `width` CSS pixels: as wide as its weight, but not under 14 px. What the
 * narrow cells need more than their weight is taken from the wide ones in proportion. If there are so many that even
 * 14 px each do not fit, the strip becomes longer than asked.
 */
export function layOutStrip(weights: readonly number[], width: number): readonly StripCell[] {
  const room = Math.max(width - CELL_GAP * (weights.length - 1), NARROWEST_CELL * weights.length);
  const widths = shareOut(weights, room);
  let x = 0;
  return widths.map((cellWidth) => {
    const cell = { x, width: cellWidth };
    x += cellWidth + CELL_GAP;
    return cell;
  });
}

/** The whole length of a laid-out strip. */
export function stripLength(cells: readonly StripCell[]): number {
  const last = cells[cells.length - 1];
  return last ? last.x + last.width : 0;
}

// Repeats until stable: each pass fixes at least one more cell at the narrowest, so it ends.
function shareOut(weights: readonly number[], room: number): readonly number[] {
  const narrow = new Set<number>();
  for (;;) {
    const free = room - narrow.size * NARROWEST_CELL;
    const freeWeight = weights.reduce((sum, weight, at) => (narrow.has(at) ? sum : sum + weight), 0);
    const widths = weights.map((weight, at) =>
      narrow.has(at) || freeWeight === 0 ? NARROWEST_CELL : (free * weight) / freeWeight,
    );
    const tooNarrow = widths.flatMap((width, at) => (!narrow.has(at) && width < NARROWEST_CELL ? [at] : []));
    if (tooNarrow.length === 0) return widths;
    for (const at of tooNarrow) narrow.add(at);
  }
}

/** Each weight as a share of all, 0 to 1. */
export function weightShares(criteria: readonly FitCriterion[]): readonly number[] {
  const total = criteria.reduce((sum, criterion) => sum + criterion.weight, 0);
  return criteria.map((criterion) => (total > 0 ? criterion.weight / total : 0));
}
