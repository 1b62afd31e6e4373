import { describe, expect, it } from 'vitest';
import { CYCLE_PHASES, type CycleCounts, type CycleDates } from './cycles-contract';
import {
  checklistOf,
  isPublic,
  mayApply,
  mayCancel,
  mayEditSettings,
  mayRun,
  nextPhase,
  previousPhase,
  stationsOf,
} from './phase-rules';

const counts: CycleCounts = {
  applications: 12,
  mentees: 7,
  mentors: 4,
  places: 6,
  undecided: 1,
  waitingList: 0,
  withdrawn: 0,
  runs: 2,
  latestRun: 2,
  rounds: 0,
  pending: 0,
  underWay: 0,
  declined: 0,
  activeRules: 10,
  activeCriteria: 9,
};
const dates: CycleDates & { introduction: string } = {
  applicationsOpenOn: '2026-09-01',
  applicationsCloseOn: '2026-10-01',
  answersDueOn: '2026-11-01',
  startsOn: '2026-11-10',
  checkInOn: '2027-02-01',
  endsOn: '2027-05-01',
  introduction: 'Half a year.',
};
const blocking = (phase: Parameters<typeof checklistOf>[0], change: Partial<CycleCounts> = {}, today = '2026-09-15') =>
  checklistOf(phase, dates, { ...counts, ...change }, today)
    .filter((item) => item.blocks && !item.done)
    .map((item) => item.text);

describe('phases', () => {
  it('follow one another, and end', () => {
    const way = ['draft'];
    for (let next = nextPhase('draft'); next; next = nextPhase(next)) way.push(next);
    expect(way).toEqual(CYCLE_PHASES.filter((phase) => phase !== 'cancelled'));
    expect(nextPhase('cancelled')).toBeNull();
  });

  it('go back only as long as nothing published would be lost', () => {
    expect(CYCLE_PHASES.filter((phase) => previousPhase(phase) !== null)).toEqual([
      'open',
      'applications-closed',
      'matching',
    ]);
  });

  it('decide what may be done in them', () => {
    const where = (may: (phase: (typeof CYCLE_PHASES)[number]) => boolean) => CYCLE_PHASES.filter(may);
    expect(where(mayRun)).toEqual(['matching', 'responses', 'under-way']);
    expect(where(mayApply)).toEqual(['open', 'applications-closed', 'matching', 'responses', 'under-way']);
    expect(where((phase) => !mayCancel(phase))).toEqual(['closed', 'cancelled']);
    expect(where((phase) => !mayEditSettings(phase))).toEqual(['closing', 'closed', 'cancelled']);
    expect(where((phase) => !isPublic(phase))).toEqual(['draft', 'cancelled']);
  });
});

describe('check-lists', () => {
  it('name what still blocks the next phase', () => {
    expect(blocking('draft')).toEqual([]);
    expect(blocking('draft', {}, '2026-12-01')).toEqual(['Applications close in the future']);
    expect(blocking('open', { mentees: 0 })).toEqual([]);
    expect(blocking('applications-closed')).toEqual([]);
    expect(blocking('applications-closed', { mentees: 0, places: 0 })).toEqual([
      'At least one admitted mentee',
      'At least one admitted mentor with a place',
    ]);
    expect(blocking('matching')).toEqual(['A plan is published']);
    expect(blocking('responses')).toEqual(['At least one pair']);
  });
});

describe('stations of the ribbon', () => {
  it('are done, under way or ahead, in one order', () => {
    const states = (phase: Parameters<typeof stationsOf>[0]) =>
      stationsOf(phase, dates, counts).map((each) => each.state);
    expect(states('draft')).toEqual(['ahead', 'ahead', 'ahead', 'ahead', 'ahead', 'ahead']);
    expect(states('open')).toEqual(['now', 'ahead', 'ahead', 'ahead', 'ahead', 'ahead']);
    expect(states('matching')).toEqual(['done', 'done', 'now', 'ahead', 'ahead', 'ahead']);
    expect(states('closed')).toEqual(['done', 'done', 'done', 'done', 'done', 'done']);
  });

  it('carry counts in words', () => {
    const words = (change: Partial<CycleCounts>) =>
      stationsOf('responses', dates, { ...counts, ...change }).map((each) => each.count);
    expect(words({ rounds: 1, pending: 3, underWay: 1, declined: 2 })).toEqual([
      '12 in',
      '10 rules, 9 criteria',
      'run 2',
      '3 of 6 settled',
      '1 pair',
      '',
    ]);
    expect(words({ latestRun: null })[2]).toBe('no run yet');
  });
});
