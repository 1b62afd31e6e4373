import type { z } from 'zod';
import { judgeOf } from '../../../shared/matching/build-problem';
import { NEVER_OVERRIDDEN } from '../../../shared/matching/catalogue';
import { explainPair } from '../../../shared/matching/explain-pair';
import type { PairDecisionForm, PairDecisions } from '../../../shared/matching/runs-contract';
import { recordAudit } from '../audit';
import { findCycle, holdCycle, type CycleRow } from '../cycles';
import { actorOf, inTransaction, notFound, Problem, violatedConstraint, type Context } from '../platform';
import { findApplicants } from './cycle-facts-queries';
import { deleteDecision, listDecisions, saveDecision } from './decisions-queries';
import { gatherInput } from './gather-input';

type Form = z.output<typeof PairDecisionForm>;

/** The locks and bars of a cycle, with names. */
export async function showDecisions(ctx: Context, cycleId: string): Promise<PairDecisions> {
  if (!(await findCycle(ctx.db, cycleId))) throw notFound('cycle');
  const rows = await listDecisions(ctx.db, cycleId);
  const ids = rows.flatMap((row) => [row.menteeApplicationId, row.mentorApplicationId]);
  const names = new Map(
    ids.length === 0 ? [] : (await findApplicants(ctx.db, cycleId, ids)).map((each) => [each.applicationId, each.name]),
  );
  return {
    decisions: rows.map((row) => ({
      mentee: row.menteeApplicationId,
      menteeName: names.get(row.menteeApplicationId) ?? '',
      mentor: row.mentorApplicationId,
      mentorName: names.get(row.mentorApplicationId) ?? '',
      kind: row.kind,
      note: row.note,
      overridesRules: row.overridesRules,
      decidedAt: row.decidedAt.toISOString(),
    })),
  };
}

/** Locks or bars a pair, or takes that back. A lock that the rules forbid is refused with its reasons, unless kept with a note. */
export async function decidePair(ctx: Context, cycleId: string, form: Form): Promise<PairDecisions> {
  await inTransaction(ctx, async (tx) => {
    const cycle = await holdCycle(tx.db, cycleId);
    if (!cycle) throw notFound('cycle');
    await assertPair(tx, cycleId, form);
    if (form.kind === 'none') {
      await deleteDecision(tx.db, form.mentee, form.mentor);
    } else {
      if (form.kind === 'lock') await assertLockable(tx, cycle, form);
      await saveDecision(tx.db, {
        cycleId,
        menteeApplicationId: form.mentee,
        mentorApplicationId: form.mentor,
        kind: form.kind,
        note: form.note,
        overridesRules: form.kind === 'lock' && form.overridesRules,
        decidedBy: actorOf(tx).personId,
        decidedAt: tx.now(),
      });
    }
    await recordAudit(tx, {
      action: `matching.${form.kind === 'none' ? 'release' : form.kind}`,
      subjectId: form.mentee,
      cycleId,
      note: form.note,
    });
  }).catch((error: unknown) => {
    if (violatedConstraint(error) === 'pair_decisions_one_lock')
      throw new Problem('conflict', 'This mentee is locked to another mentor already; release that lock first');
    throw error;
  });
  return showDecisions(ctx, cycleId);
}

async function assertPair(tx: Context, cycleId: string, { mentee, mentor }: Form): Promise<void> {
  const found = await findApplicants(tx.db, cycleId, [mentee, mentor]);
  const side = (id: string) => found.find((each) => each.applicationId === id)?.side;
  if (side(mentee) !== 'mentee' || side(mentor) !== 'mentor') throw notFound('pair of applications');
}

async function assertLockable(tx: Context, cycle: CycleRow, form: Form): Promise<void> {
  const input = await gatherInput(tx.db, cycle, cycle.settings);
  const i = input.mentees.findIndex((mentee) => mentee.key === form.mentee);
  const j = input.mentors.findIndex((mentor) => mentor.key === form.mentor);
  if (i < 0 || j < 0) throw new Problem('conflict', 'Only admitted applicants who wait for a pairing can be locked');
  const others = input.decisions.filter(
    (each) => each.kind === 'lock' && each.mentor === form.mentor && each.mentee !== form.mentee,
  ).length;
  if (others >= input.mentors[j]!.places)
    throw new Problem('conflict', 'All places of this mentor are locked or taken already');
  const { reasons } = explainPair(judgeOf(input), i, j);
  if (reasons.length === 0) return;
  const text = reasons.map((reason) => reason.text).join(' ');
  if (reasons.some((reason) => NEVER_OVERRIDDEN.has(reason.rule)))
    throw new Problem('conflict', 'This pairing can not be locked', { detail: text });
  if (!form.overridesRules) throw new Problem('conflict', 'The rules exclude this pairing', { detail: text });
  if (form.note.length < 3)
    throw new Problem('invalid', 'Some fields need another look', {
      fields: [{ field: 'note', message: 'Say why this pairing is right although a rule excludes it' }],
    });
}
