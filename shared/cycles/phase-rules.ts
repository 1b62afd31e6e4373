/** Pure decisions about a cycle's phases, made alike by server and pages. */
import { CYCLE_PHASES, type CheckItem, type CycleCounts, type CycleDates, type CyclePhase } from './cycles-contract';

/** The order of a cycle's life; `cancelled` stands outside it. */
const ORDER: readonly CyclePhase[] = CYCLE_PHASES.filter((phase) => phase !== 'cancelled');

/** The phase that follows; null at the end. */
export function nextPhase(phase: CyclePhase): CyclePhase | null {
  const at = ORDER.indexOf(phase);
  return at < 0 ? null : (ORDER[at + 1] ?? null);
}

/** The phase one may go back to; null where something published would be lost. */
export function previousPhase(phase: CyclePhase): CyclePhase | null {
  return phase === 'open' || phase === 'applications-closed' || phase === 'matching'
    ? ORDER[ORDER.indexOf(phase) - 1]!
    : null;
}

export const mayCancel = (phase: CyclePhase): boolean => phase !== 'closed' && phase !== 'cancelled';
export const mayEdit = (phase: CyclePhase): boolean => phase !== 'closed' && phase !== 'cancelled';
export const mayEditSettings = (phase: CyclePhase): boolean =>
  ['draft', 'open', 'applications-closed', 'matching', 'responses', 'under-way'].includes(phase);
export const mayRun = (phase: CyclePhase): boolean => ['matching', 'responses', 'under-way'].includes(phase);
/** On time while open; later applications wait on the list. */
export const mayApply = (phase: CyclePhase): boolean =>
  ['open', 'applications-closed', 'matching', 'responses', 'under-way'].includes(phase);
export const isOnTime = (phase: CyclePhase): boolean => phase === 'open';
/** Phases that visitors and members may know of. */
export const isPublic = (phase: CyclePhase): boolean => phase !== 'draft' && phase !== 'cancelled';

type Facts = CycleDates & { introduction: string };

/** What is still missing before the cycle moves on. */
export function checklistOf(phase: CyclePhase, cycle: Facts, counts: CycleCounts, today: string): CheckItem[] {
  const item = (text: string, done: boolean, blocks = false): CheckItem => ({ text, done, blocks });
  switch (phase) {
    case 'draft':
      return [
        item('An introduction for members', cycle.introduction.trim() !== ''),
        item('Applications close in the future', cycle.applicationsCloseOn >= today, true),
        item('At least one criterion has a weight', counts.activeCriteria > 0, true),
      ];
    case 'open':
      return [
        item('The last day for applications is over', cycle.applicationsCloseOn < today),
        item('Mentees have applied', counts.mentees > 0),
        item('Mentors have applied', counts.mentors > 0),
      ];
    case 'applications-closed':
      return [
        item('At least one admitted mentee', counts.mentees > 0, true),
        item('At least one admitted mentor with a place', counts.places > 0, true),
        item('No application waits for a decision', counts.undecided === 0),
      ];
    case 'matching':
      return [item('A plan is published', counts.rounds > 0, true)];
    case 'responses':
      return [
        item('Every proposal is answered', counts.pending === 0),
        item('At least one pair', counts.underWay > 0, true),
      ];
    case 'under-way':
      return [item('The cycle’s last day is near or over', cycle.endsOn <= today)];
    case 'closing':
      return [item('The cycle’s last day is over', cycle.endsOn <= today)];
    default:
      return [];
  }
}

export interface Station {
  key: 'applications' | 'rules' | 'matching' | 'responses' | 'pairs' | 'close';
  label: string;
  state: 'done' | 'now' | 'ahead';
  count: string;
  /** The day that matters there, and what happens on it. */
  day: { what: string; on: string } | null;
}

/** From which phase a station is worked in, and from which it is done. */
const STATIONS: readonly { key: Station['key']; label: string; from: CyclePhase; until: CyclePhase }[] = [
  { key: 'applications', label: 'Applications', from: 'open', until: 'applications-closed' },
  { key: 'rules', label: 'Rules & criteria', from: 'applications-closed', until: 'matching' },
  { key: 'matching', label: 'Runs & plan', from: 'matching', until: 'responses' },
  { key: 'responses', label: 'Responses', from: 'responses', until: 'under-way' },
  { key: 'pairs', label: 'Pairs', from: 'under-way', until: 'closing' },
  { key: 'close', label: 'Close', from: 'closing', until: 'closed' },
];

/** The six stations of the cycle ribbon. */
export function stationsOf(phase: CyclePhase, cycle: CycleDates, counts: CycleCounts): Station[] {
  const at = ORDER.indexOf(phase);
  const stateOf = (from: CyclePhase, until: CyclePhase): Station['state'] => {
    if (at >= ORDER.indexOf(until)) return 'done';
    return at >= ORDER.indexOf(from) ? 'now' : 'ahead';
  };
  return STATIONS.map(({ key, label, from, until }) => ({
    key,
    label,
    state: stateOf(from, until),
    count: countAt(key, counts),
    day: dayAt(key, phase, cycle),
  }));
}

const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

function countAt(key: Station['key'], counts: CycleCounts): string {
  switch (key) {
    case 'applications':
      return `${counts.applications} in`;
    case 'rules':
      return `${counted(counts.activeRules, 'rule', 'rules')}, ${counted(counts.activeCriteria, 'criterion', 'criteria')}`;
    case 'matching':
      return counts.latestRun === null ? 'no run yet' : `run ${counts.latestRun}`;
    case 'responses': {
      const total = counts.pending + counts.underWay + counts.declined;
      return counts.rounds === 0 ? 'publish to open' : `${total - counts.pending} of ${total} settled`;
    }
    case 'pairs':
      return counts.underWay === 0 ? '' : counted(counts.underWay, 'pair', 'pairs');
    case 'close':
      return '';
  }
}

function dayAt(key: Station['key'], phase: CyclePhase, cycle: CycleDates): Station['day'] {
  switch (key) {
    case 'applications':
      if (phase === 'draft') return { what: 'open', on: cycle.applicationsOpenOn };
      return { what: phase === 'open' ? 'close' : 'closed', on: cycle.applicationsCloseOn };
    case 'responses':
      return { what: 'answers by', on: cycle.answersDueOn };
    case 'pairs':
      return { what: 'from', on: cycle.startsOn };
    case 'close':
      return { what: 'ends', on: cycle.endsOn };
    default:
      return null;
  }
}
