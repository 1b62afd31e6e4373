import { bundlePlan } from './plan-bundles';
import { layOutPlan, PlanGroup, wrapped } from './plan-layout';

const mentee = (key: string, mentorKey: string | null, fit: number | null = 7000) => ({
  key,
  name: `Mentee ${key}`,
  mentorKey,
  fit: mentorKey === null ? null : fit,
});
const place = (key: string, menteeKey: string | null) => ({ key, name: `Mentor ${key}`, menteeKey });

const groups: PlanGroup[] = [
  {
    key: 'hydrographic',
    label: 'Hydrographic',
    mentees: [mentee('a', null), mentee('b', 'm1', 5000), mentee('c', 'm1', 8000), mentee('d', 'm2', 6000)],
    places: [place('m1', 'b'), place('m1', 'c')],
    short: 1,
  },
  {
    key: 'geodesy',
    label: 'Geodesy and control',
    mentees: [mentee('e', 'm2', 9000)],
    places: [place('m2', null), place('m2', 'e'), place('m2', 'd')],
    short: 0,
  },
];

describe('layOutPlan', () => {
  const layout = layOutPlan(groups);

  it('puts own pairings first by fit, then those that leave the group, and those left out last', () => {
    expect(layout.mentees.filter((each) => each.group === 0).map((each) => each.key)).toEqual(['c', 'b', 'd', 'a']);
  });

  it('draws one thread a pairing, stronger for a better fit', () => {
    const strengths = new Map(layout.threads.map((thread) => [thread.menteeKey, thread.strength]));
    expect([...strengths.keys()].sort()).toEqual(['b', 'c', 'd', 'e']);
    expect(strengths.get('e')).toBe(5);
    expect(strengths.get('b')).toBe(1);
  });

  it('stays inside the picture and never puts two marks in one place', () => {
    for (const row of [layout.mentees, layout.places]) {
      const xs = row.map((mark) => mark.x);
      expect(Math.min(...xs)).toBeGreaterThanOrEqual(0);
      expect(Math.max(...xs)).toBeLessThanOrEqual(100);
      expect(new Set(xs).size).toBe(xs.length);
    }
  });

  it('survives a plan without anyone', () => {
    expect(layOutPlan([]).threads).toEqual([]);
    expect(layOutPlan([{ key: 'x', label: 'X', mentees: [], places: [], short: 0 }]).mentees).toEqual([]);
  });
});

describe('wrapped', () => {
  it('breaks a long label once, near its middle', () => {
    expect(wrapped('Geodesy')).toEqual(['Geodesy']);
    expect(wrapped('Monitoring and deformation')).toEqual(['Monitoring and', 'deformation']);
    expect(wrapped('Photogrammetry')).toEqual(['Photogrammetry']);
  });
});

describe('bundlePlan', () => {
  it('counts threads between groups', () => {
    const { rows, bundles } = bundlePlan(groups);
    expect(bundles.map(({ from, to, count }) => [from, to, count])).toEqual([
      [0, 0, 2],
      [0, 1, 1],
      [1, 1, 1],
    ]);
    expect(rows.map((row) => [row.leftOut, row.unfilled])).toEqual([
      [1, 0],
      [0, 1],
    ]);
  });
});
