/** From matching to the end of a closed cycle: run, plan, answers, pairs and how they ended. */
import type { PairingAnswer } from '../../shared/pairings/pairings-contract';
import { findCycle, moveCycle } from '../../src/server/cycles';
import { publishRun, startRun, workRun } from '../../src/server/matching';
import { answerOwn, endPairing, keepDeadlines, listPairingsOfCycle, type PairingRow } from '../../src/server/pairings';
import { Problem, type Context } from '../../src/server/platform';
import { at, daysAfter, instantOf } from './clock';
import { deliver, type Seeding } from './cycle';
import type { DemoCycle, DemoOutcome } from './data';

export async function settleCycle(
  { ctx, coordinator }: Seeding,
  cycle: DemoCycle,
  cycleId: string,
  publishedOn: string,
): Promise<void> {
  const { draft } = cycle;
  const on = (day: string, hour = 9): Context => at(ctx, instantOf(day, hour), coordinator);
  await publish(on(publishedOn), cycleId);
  await deliver(on(publishedOn, 9));
  const rows = await listPairingsOfCycle(ctx.db, cycleId, { state: undefined, search: '' });
  const outcomes = new Map(cycle.outcomes.map((outcome) => [outcome.menteeEmail, outcome]));
  await answerAll(ctx, rows, outcomes, publishedOn);
  await keepDeadlines(on(daysAfter(draft.answersDueOn, 1)));
  await deliver(on(daysAfter(draft.answersDueOn, 1)));
  await moveCycle(on(draft.startsOn), cycleId, { to: 'under-way', reason: '' });
  await endAll(ctx, rows, outcomes);
  await moveCycle(on(draft.endsOn), cycleId, { to: 'closing', reason: '' });
  await moveCycle(on(daysAfter(draft.endsOn, 14)), cycleId, { to: 'closed', reason: '' });
}

async function publish(ctx: Context, cycleId: string): Promise<void> {
  const run = await startRun(ctx, cycleId, null);
  await workRun(ctx, run.id);
  const cycle = await findCycle(ctx.db, cycleId);
  await publishRun(ctx, run.id, { acknowledgedChanges: true, version: cycle!.version });
}

interface Event {
  day: string;
  row: PairingRow;
  side: 'mentee' | 'mentor';
  answer: PairingAnswer;
  reason: string;
}

function eventsOf(row: PairingRow, outcome: DemoOutcome, publishedOn: string): Event[] {
  const event = (side: Event['side'], answer: PairingAnswer, reason: string, after: number | null): Event[] =>
    answer === 'unanswered' || after === null
      ? []
      : [{ day: daysAfter(publishedOn, after), row, side, answer, reason }];
  return [
    ...event('mentee', outcome.menteeAnswer, outcome.menteeReason, outcome.menteeAnsweredAfterDays),
    ...event('mentor', outcome.mentorAnswer, outcome.mentorReason, outcome.mentorAnsweredAfterDays),
  ];
}

async function answerAll(
  ctx: Context,
  rows: readonly PairingRow[],
  outcomes: ReadonlyMap<string, DemoOutcome>,
  publishedOn: string,
): Promise<void> {
  const events = rows
    .flatMap((row) => {
      const outcome = outcomes.get(row.mentee.email);
      return outcome ? eventsOf(row, outcome, publishedOn) : [];
    })
    .sort((a, b) => a.day.localeCompare(b.day));
  for (const [position, { day, row, side, answer, reason }] of events.entries()) {
    const moment = instantOf(day, 11 + (position % 9), (position * 11) % 60);
    const own = at(ctx, moment, { personId: row[side].personId, name: row[side].name, roles: [] });
    // Whoever meant to accept what the other side has declined finds it settled.
    await answerOwn(own, row.pairing.id, { answer, reason }).catch((error: unknown) => {
      if (!(error instanceof Problem && error.code === 'conflict')) throw error;
    });
    if (events[position + 1]?.day !== day) await deliver(at(ctx, instantOf(day, 22)));
  }
}

async function endAll(
  ctx: Context,
  rows: readonly PairingRow[],
  outcomes: ReadonlyMap<string, DemoOutcome>,
): Promise<void> {
  const underWay = await listPairingsOfCycle(ctx.db, rows[0]!.pairing.cycleId, { state: 'under-way', search: '' });
  for (const row of underWay) {
    const outcome = outcomes.get(row.mentee.email);
    if (!outcome?.endedOn) continue;
    const ending = outcome.ending === 'ended-early' ? 'ended-early' : 'completed';
    await endPairing(at(ctx, instantOf(outcome.endedOn, 17)), row.pairing.id, ending);
  }
}
