import { createHash } from 'node:crypto';
import { judgeOf } from '../../../shared/matching/build-problem';
import { explainPair } from '../../../shared/matching/explain-pair';
import type { MatchingInput } from '../../../shared/matching/matching-input';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import type { RunLine } from '../../../shared/matching/runs-contract';
import { mayRun } from '../../../shared/cycles/phase-rules';
import { recordAudit } from '../audit';
import { holdCycle } from '../cycles';
import { inTransaction, notFound, Problem, violatedConstraint, type Context } from '../platform';
import { freeze } from './gather-queries';
import { gatherInput } from './gather-input';
import { showRun } from './run-lines';
import { insertRun, nextRunNumber } from './runs-queries';
import { zipped } from './zipped';

/** Freezes what the run reads and puts it into the queue, together. */
export async function startRun(ctx: Context, cycleId: string, trial: MatchingSettings | null): Promise<RunLine> {
  const runId = await inTransaction(ctx, async (tx) => {
    await freeze(tx.db);
    const cycle = await holdCycle(tx.db, cycleId);
    if (!cycle) throw notFound('cycle');
    if (!mayRun(cycle.phase))
      throw new Problem('conflict', 'Runs start once applications are closed', {
        detail: 'Move the cycle on to matching first.',
      });
    const settings = trial ?? cycle.settings;
    const input = await gatherInput(tx.db, cycle, settings);
    assertRunnable(input);
    const bytes = zipped(input);
    const id = await insertRun(tx.db, {
      cycleId,
      number: await nextRunNumber(tx.db, cycleId),
      settings,
      input: bytes,
      inputHash: createHash('sha256').update(JSON.stringify(input)).digest('hex'),
      requestedBy: tx.actor?.personId ?? null,
      createdAt: tx.now(),
    });
    await tx.enqueue(tx.db, 'matching-run', { runId: id });
    await recordAudit(tx, { action: 'matching.start-run', subjectId: id, cycleId });
    return id;
  }).catch((error: unknown) => {
    if (violatedConstraint(error) === 'runs_one_at_a_time')
      throw new Problem('conflict', 'A run of this cycle is under way already; wait for it or stop it');
    throw error;
  });
  return showRun(ctx, runId);
}

/** Says before anything is queued what would make the run pointless. */
export function assertRunnable(input: MatchingInput): void {
  const places = input.mentors.reduce((sum, mentor) => sum + mentor.places, 0);
  if (input.mentees.length === 0)
    throw new Problem('unprocessable', 'There is no admitted mentee who waits for a mentor', {
      detail: 'Admit mentees in the applicants table, or import them.',
    });
  if (input.mentors.length === 0 || places === 0)
    throw new Problem('unprocessable', 'There is no admitted mentor with a place left', {
      detail: 'Admit mentors in the applicants table, or import them.',
    });
  assertLocks(input);
}

/** Locks that cannot be kept are named before the run, each with its reason. */
function assertLocks(input: MatchingInput): void {
  const locks = input.decisions.filter((each) => each.kind === 'lock');
  if (locks.length === 0) return;
  const judge = judgeOf(input);
  const menteeAt = new Map(input.mentees.map((mentee, at) => [mentee.key, at]));
  const mentorAt = new Map(input.mentors.map((mentor, at) => [mentor.key, at]));
  const used = new Map<string, number>();
  for (const { mentee, mentor, overridesRules } of locks) {
    const i = menteeAt.get(mentee);
    const j = mentorAt.get(mentor);
    if (i === undefined || j === undefined) continue;
    const count = (used.get(mentor) ?? 0) + 1;
    used.set(mentor, count);
    if (count > input.mentors[j]!.places)
      throw new Problem('unprocessable', 'More mentees are locked to a mentor than the mentor has places', {
        detail: 'Release one of the locks at this mentor, or ask for one more place.',
      });
    const { reasons } = explainPair(judge, i, j);
    if (reasons.length > 0 && !overridesRules)
      throw new Problem('unprocessable', 'A locked pairing is not allowed by the rules', {
        detail: `${reasons.map((reason) => reason.text).join(' ')} Release the lock, or keep it with a note.`,
      });
  }
}
