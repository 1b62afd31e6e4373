import { linkVertical } from 'd3-shape';

/** A mentee of the plan; `mentorKey` null means left out, and then there is no fit. */
export interface PlanMentee {
  readonly key: string;
  readonly name: string;
  readonly mentorKey: string | null;
  /** 0 to 10000. */
  readonly fit: number | null;
}

/** One place of a mentor (a mentor with three places appears three times); `menteeKey` null means not filled. */
export interface PlanPlace {
  /** The mentor's key. */
  readonly key: string;
  readonly name: string;
  readonly menteeKey: string | null;
}

export interface PlanGroup {
  readonly key: string;
  readonly label: string;
  readonly mentees: readonly PlanMentee[];
  readonly places: readonly PlanPlace[];
  /** How many places are missing; 0 where the group is not short. */
  readonly short: number;
}

export interface PlacedMentee extends PlanMentee {
  readonly x: number;
  readonly group: number;
  readonly mentorName: string | null;
}

export interface PlacedPlace extends PlanPlace {
  readonly x: number;
  readonly group: number;
}

export interface Thread {
  readonly menteeKey: string;
  readonly path: string;
  /** 1 (weakest fit of this plan) to 5 (strongest). */
  readonly strength: number;
}

export interface PlacedGroup {
  readonly key: string;
  readonly lines: readonly string[];
  readonly short: number;
  readonly middle: number;
  readonly placeCount: number;
  /** The stretch of its marks, for the tint and the target of its label. */
  readonly left: number;
  readonly width: number;
  readonly slotLeft: number;
  readonly slotWidth: number;
}

export interface PlanLayout {
  readonly groups: readonly PlacedGroup[];
  readonly mentees: readonly PlacedMentee[];
  readonly places: readonly PlacedPlace[];
  readonly threads: readonly Thread[];
  /** Distance between two marks, in per cent of the width. */
  readonly pitch: number;
}

/** Vertical measures in CSS pixels; all x are per cent of the width, so that nothing has to be measured. */
export const ROWS = { mentees: 16, places: 168, height: 184 } as const;

// Groups stand at least as far apart as this many marks.
const GAP = 2.4;
const LETTER_WIDTH = 6.8;
// Labels must fit from this width on; below it the picture is bundled anyway.
const NARROWEST = 960;

/**
 * Lays the plan out in two rows of marks, grouped, mentees above and places below, each group's rows centred on one
 * another. Within a group, pairings that leave it to the left come first, then its own from the best fit to the weakest,
 * then those that leave to the right, and those left out last. Places follow the order of their mentees, so that threads
 * cross only where a pairing leaves its group.
 */
export function layOutPlan(groups: readonly PlanGroup[]): PlanLayout {
  const groupOfServing = servingGroups(groups);
  const mentorNames = new Map(groups.flatMap((group) => group.places.map((place) => [place.key, place.name] as const)));
  const labels = groups.map((group) => wrapped(group.label));

  const counts = groups.map((group) => Math.max(group.mentees.length, group.places.length, 1));
  const marks = counts.reduce((sum, count) => sum + count + GAP, 0);
  // columns of a group: its marks, or what its label needs
  const slots = labels.map((lines, at) => {
    const letters = Math.max(...lines.map((line) => line.length));
    return Math.max(counts[at] ?? 1, (letters * LETTER_WIDTH * marks) / NARROWEST) + GAP;
  });
  const pitch =
    100 /
    Math.max(
      1,
      slots.reduce((sum, slot) => sum + slot, 0),
    );

  const mentees: PlacedMentee[] = [];
  const places: PlacedPlace[] = [];
  const placedGroups: PlacedGroup[] = [];
  let start = 0;
  groups.forEach((group, at) => {
    const middle = (start + (slots[at] ?? 0) / 2) * pitch;
    start += slots[at] ?? 0;
    const xOf = (column: number, count: number): number => middle + (column - (count - 1) / 2) * pitch;

    const rank = (mentee: PlanMentee): number => {
      const served = groupOfServing.get(mentee.key);
      return served === undefined ? Number.POSITIVE_INFINITY : served;
    };
    const inOrder = group.mentees.map((mentee, order) => ({ mentee, order, rank: rank(mentee) }));
    inOrder.sort((a, b) => compare(a.rank, b.rank) || (b.mentee.fit ?? 0) - (a.mentee.fit ?? 0) || a.order - b.order);
    inOrder.forEach(({ mentee }, column) => {
      const mentorName = mentee.mentorKey === null ? null : (mentorNames.get(mentee.mentorKey) ?? null);
      mentees.push({ ...mentee, x: xOf(column, inOrder.length), group: at, mentorName });
    });
    placedGroups.push({
      key: group.key,
      lines: labels[at] ?? [],
      short: group.short,
      middle,
      placeCount: group.places.length,
      left: xOf(0, inOrder.length) - pitch,
      width: (inOrder.length + 1) * pitch,
      slotLeft: middle - ((slots[at] ?? 0) - 0.4) * pitch * 0.5,
      slotWidth: ((slots[at] ?? 0) - 0.4) * pitch,
    });
  });

  const xOfMentee = new Map(mentees.map((mentee) => [mentee.key, mentee.x]));
  groups.forEach((group, at) => {
    const middle = placedGroups[at]?.middle ?? 0;
    const inOrder = [...group.places].sort((a, b) => compare(positionOf(a, xOfMentee), positionOf(b, xOfMentee)));
    inOrder.forEach((place, column) => {
      places.push({ ...place, x: middle + (column - (inOrder.length - 1) / 2) * pitch, group: at });
    });
  });

  return { groups: placedGroups, mentees, places, threads: drawThreads(mentees, places), pitch };
}

function servingGroups(groups: readonly PlanGroup[]): ReadonlyMap<string, number> {
  return new Map(
    groups.flatMap((group, at) =>
      group.places.flatMap((place) => (place.menteeKey === null ? [] : [[place.menteeKey, at] as const])),
    ),
  );
}

// Infinity minus infinity is no number, hence not a subtraction.
function compare(a: number, b: number): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function positionOf(place: PlanPlace, xOfMentee: ReadonlyMap<string, number>): number {
  return place.menteeKey === null
    ? Number.POSITIVE_INFINITY
    : (xOfMentee.get(place.menteeKey) ?? Number.POSITIVE_INFINITY);
}

function drawThreads(mentees: readonly PlacedMentee[], places: readonly PlacedPlace[]): readonly Thread[] {
  const mentee = new Map(mentees.map((each) => [each.key, each]));
  const fits = mentees.flatMap((each) => (each.fit === null ? [] : [each.fit]));
  const weakest = Math.min(...fits);
  const span = Math.max(1, Math.max(...fits) - weakest);
  const draw = linkVertical<unknown, [number, number]>();
  return places.flatMap((place) => {
    const from = place.menteeKey === null ? undefined : mentee.get(place.menteeKey);
    if (!from) return [];
    const path = draw({ source: [from.x, ROWS.mentees + 6], target: [place.x, ROWS.places - 6] }) ?? '';
    const strength = 1 + Math.min(4, Math.floor((5 * ((from.fit ?? weakest) - weakest)) / span));
    return [{ menteeKey: from.key, path, strength }];
  });
}

/** A label in at most two lines, broken at the space nearest its middle; short ones stay whole. */
export function wrapped(label: string): readonly string[] {
  if (label.length <= 12) return [label];
  const spaces = [...label.matchAll(/[ -]/gu)].map((match) => match.index + (match[0] === '-' ? 1 : 0));
  const middle = label.length / 2;
  const [nearest] = spaces.sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle));
  return nearest === undefined ? [label] : [label.slice(0, nearest).trim(), label.slice(nearest).trim()];
}
