import type { z } from 'zod';
import { PHASE_LABEL, type Cycle, type CyclePhase, type PhaseMove } from '../../../shared/cycles/cycles-contract';
import { checklistOf, mayCancel, nextPhase, previousPhase } from '../../../shared/cycles/phase-rules';
import { findAssociation } from '../accounts';
import { recordAudit } from '../audit';
import { postMessages } from '../messages';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import { holdCycle, listApplicantsToTell, stopWorkOfCycle, updateCycle, type CycleRow } from './cycles-queries';
import { countsOf, showCycle, today } from './show-cycles';

/** Moves a cycle on, back, or cancels it, as a coordinator asks. */
export async function moveCycle(
  ctx: Context,
  cycleId: string,
  { to, reason }: z.output<typeof PhaseMove>,
): Promise<Cycle> {
  await inTransaction(ctx, async (tx) => {
    const row = await holdCycle(tx.db, cycleId);
    if (!row) throw notFound('cycle');
    if (row.phase === to) return;
    if (to === 'cancelled') return cancel(tx, row, reason);
    if (to === nextPhase(row.phase)) return moveOn(tx, row, to);
    if (to === previousPhase(row.phase)) return moveBack(tx, row, to, reason);
    throw new Problem(
      'conflict',
      `A cycle in the phase "${PHASE_LABEL[row.phase]}" cannot move to "${PHASE_LABEL[to]}"`,
    );
  });
  return showCycle(ctx, cycleId);
}

/** Moves a cycle as part of another deed (publishing); the caller has checked that it may. */
export async function movePhase(tx: Context, cycleId: string, to: CyclePhase): Promise<void> {
  await updateCycle(tx.db, cycleId, { phase: to });
  await recordAudit(tx, { action: 'cycles.move', subjectId: cycleId, cycleId, fields: [to] });
}

async function moveOn(tx: Context, row: CycleRow, to: CyclePhase): Promise<void> {
  if (row.phase === 'matching')
    throw new Problem('conflict', 'Responses open when a plan is published', {
      detail: 'Open the plan of a run, review it and publish.',
    });
  const missing = checklistOf(row.phase, row, await countsOf(tx, row), await today(tx)).filter(
    (item) => item.blocks && !item.done,
  );
  if (missing.length > 0)
    throw new Problem('conflict', 'Something is still missing', {
      detail: missing.map((item) => item.text).join('. '),
    });
  await movePhase(tx, row.id, to);
}

async function moveBack(tx: Context, row: CycleRow, to: CyclePhase, reason: string): Promise<void> {
  assertReason(reason, 'Say why the cycle moves back; the audit trail keeps it');
  await updateCycle(tx.db, row.id, { phase: to });
  await recordAudit(tx, { action: 'cycles.move-back', subjectId: row.id, cycleId: row.id, fields: [to], note: reason });
}

async function cancel(tx: Context, row: CycleRow, reason: string): Promise<void> {
  if (!mayCancel(row.phase)) throw new Problem('conflict', 'A closed cycle cannot be cancelled');
  assertReason(reason, 'Say why the cycle is cancelled; applicants read this');
  const association = await findAssociation(tx.db);
  await updateCycle(tx.db, row.id, { phase: 'cancelled' });
  await stopWorkOfCycle(tx.db, row.id, tx.now());
  await recordAudit(tx, { action: 'cycles.cancel', subjectId: row.id, cycleId: row.id, note: reason });
  const told = row.phase === 'draft' ? [] : await listApplicantsToTell(tx.db, row.id);
  await postMessages(
    tx,
    told.map((person) => ({
      template: 'cycles/cancelled' as const,
      cause: `cycle-cancelled:${row.id}`,
      recipientId: person.personId,
      address: person.email,
      data: {
        name: person.name,
        associationName: association?.name ?? '',
        contactEmail: association?.contactEmail ?? '',
        cycleName: row.name,
        reason,
      },
    })),
  );
}

function assertReason(reason: string, message: string): void {
  if (reason.length < 3)
    throw new Problem('invalid', 'Some fields need another look', { fields: [{ field: 'reason', message }] });
}
