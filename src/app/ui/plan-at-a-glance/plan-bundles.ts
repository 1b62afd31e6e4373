import { linkHorizontal } from 'd3-shape';
import { PlanGroup } from './plan-layout';

export interface BundleRow {
  readonly key: string;
  readonly label: string;
  readonly mentees: number;
  readonly leftOut: number;
  readonly places: number;
  readonly unfilled: number;
  readonly short: number;
  /** Heights in the bundle's own units, filled part first. */
  readonly menteeBar: BundleBar;
  readonly placeBar: BundleBar;
}

export interface BundleBar {
  readonly y: number;
  readonly filled: number;
  readonly hollow: number;
}

export interface Bundle {
  readonly from: number;
  readonly to: number;
  readonly count: number;
  readonly path: string;
  readonly thickness: number;
}

export interface BundleLayout {
  readonly rows: readonly BundleRow[];
  readonly bundles: readonly Bundle[];
  readonly height: number;
}

export const ROW_HEIGHT = 64;
const TALLEST = 50;

/** One row a group, mentees left and places right; all threads between two groups become one band as thick as they are many. */
export function bundlePlan(groups: readonly PlanGroup[]): BundleLayout {
  const most = Math.max(1, ...groups.flatMap((group) => [group.mentees.length, group.places.length]));
  const unit = TALLEST / most;
  const flows = countFlows(groups);

  const rows = groups.map((group, at): BundleRow => {
    const leftOut = group.mentees.filter((mentee) => mentee.mentorKey === null).length;
    const unfilled = group.places.filter((place) => place.menteeKey === null).length;
    return {
      key: group.key,
      label: group.label,
      mentees: group.mentees.length,
      leftOut,
      places: group.places.length,
      unfilled,
      short: group.short,
      menteeBar: barOf(at, group.mentees.length - leftOut, leftOut, unit),
      placeBar: barOf(at, group.places.length - unfilled, unfilled, unit),
    };
  });

  // bands leave and arrive stacked in the order of the groups, so that they do not lie on one another
  const left = rows.map((row) => row.menteeBar.y);
  const right = rows.map((row) => row.placeBar.y);
  const draw = linkHorizontal<unknown, [number, number]>();
  const bundles = flows.map(({ from, to, count }): Bundle => {
    const thickness = count * unit;
    const y1 = (left[from] ?? 0) + thickness / 2;
    const y2 = (right[to] ?? 0) + thickness / 2;
    left[from] = (left[from] ?? 0) + thickness;
    right[to] = (right[to] ?? 0) + thickness;
    return { from, to, count, thickness, path: draw({ source: [0, y1], target: [100, y2] }) ?? '' };
  });
  return { rows, bundles, height: rows.length * ROW_HEIGHT };
}

function barOf(row: number, filled: number, hollow: number, unit: number): BundleBar {
  const height = (filled + hollow) * unit;
  return { y: row * ROW_HEIGHT + (ROW_HEIGHT - height) / 2, filled: filled * unit, hollow: hollow * unit };
}

function countFlows(groups: readonly PlanGroup[]): readonly { from: number; to: number; count: number }[] {
  const groupOfMentee = new Map(
    groups.flatMap((group, at) => group.mentees.map((mentee) => [mentee.key, at] as const)),
  );
  const counts = groups.map(() => groups.map(() => 0));
  groups.forEach((group, to) => {
    for (const place of group.places) {
      const from = place.menteeKey === null ? undefined : groupOfMentee.get(place.menteeKey);
      const row = from === undefined ? undefined : counts[from];
      if (row) row[to] = (row[to] ?? 0) + 1;
    }
  });
  return counts.flatMap((row, from) => row.flatMap((count, to) => (count > 0 ? [{ from, to, count }] : [])));
}
