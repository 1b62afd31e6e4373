import type { z } from 'zod';
import type { Cycle, CycleDraft, NewCycle } from '../../../shared/cycles/cycles-contract';
import { mayEdit } from '../../../shared/cycles/phase-rules';
import { DEFAULT_MATCHING_SETTINGS, type MatchingSettings } from '../../../shared/matching/matching-contract';
import { changedFields, recordAudit } from '../audit';
import { inTransaction, notFound, Problem, stale, violatedConstraint, type Context } from '../platform';
import { findCycle, holdCycle, insertCycle, insertSettingsVersion, updateCycle } from './cycles-queries';
import { showCycle } from './show-cycles';

/** Makes a draft; its rules and criteria are the default set, those of an earlier cycle, or the given ones. */
export async function createCycle(
  ctx: Context,
  { copyFrom, ...draft }: z.output<typeof NewCycle>,
  settings?: MatchingSettings,
): Promise<Cycle> {
  const id = await inTransaction(ctx, async (tx) => {
    const source = copyFrom ? await findCycle(tx.db, copyFrom) : null;
    if (copyFrom && !source) throw oneFault('copyFrom', 'This cycle does not exist any more');
    const chosen = settings ?? source?.settings ?? DEFAULT_MATCHING_SETTINGS;
    const savedBy = tx.actor?.personId ?? null;
    const row = await insertCycle(tx.db, { ...draft, settings: chosen, createdBy: savedBy, createdAt: tx.now() });
    await insertSettingsVersion(tx.db, { cycleId: row.id, version: 1, settings: chosen, savedBy, savedAt: tx.now() });
    await recordAudit(tx, { action: 'cycles.create', subjectId: row.id, cycleId: row.id });
    return row.id;
  }).catch(refuseNameTwice);
  return showCycle(ctx, id);
}

/** Saves name, dates and texts. A changed consent text is a new version: earlier consents keep the one they were given to. */
export async function editCycle(ctx: Context, cycleId: string, draft: CycleDraft, version: number): Promise<Cycle> {
  await inTransaction(ctx, async (tx) => {
    const row = await holdCycle(tx.db, cycleId);
    if (!row) throw notFound('cycle');
    if (row.version !== version) throw stale(await showCycle(tx, cycleId));
    if (!mayEdit(row.phase)) throw new Problem('conflict', 'A cycle that is closed or cancelled stays as it is');
    const fields = changedFields(row, draft as Partial<typeof row>);
    if (fields.length === 0) return;
    const newConsent = draft.consentText !== row.consentText && row.phase !== 'draft';
    await updateCycle(tx.db, cycleId, {
      ...draft,
      ...(newConsent ? { consentVersion: row.consentVersion + 1 } : {}),
    });
    await recordAudit(tx, { action: 'cycles.edit', subjectId: cycleId, cycleId, fields });
  }).catch(refuseNameTwice);
  return showCycle(ctx, cycleId);
}

function refuseNameTwice(error: unknown): never {
  if (violatedConstraint(error) === 'cycles_name') throw oneFault('name', 'Another cycle has this name');
  throw error;
}

const oneFault = (field: string, message: string): Problem =>
  new Problem('invalid', 'Some fields need another look', { fields: [{ field, message }] });
