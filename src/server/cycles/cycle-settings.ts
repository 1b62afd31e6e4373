import type { CycleSettings, SettingsHistory } from '../../../shared/cycles/cycles-contract';
import { mayEditSettings } from '../../../shared/cycles/phase-rules';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import { changedFields, recordAudit } from '../audit';
import { inTransaction, notFound, Problem, stale, type Context } from '../platform';
import { findCycle, holdCycle, insertSettingsVersion, listSettingsVersions, updateCycle } from './cycles-queries';

/** The rules, criteria and weights of a cycle, and who saved them last. */
export async function showSettings(ctx: Context, cycleId: string): Promise<CycleSettings> {
  const row = await findCycle(ctx.db, cycleId);
  if (!row) throw notFound('cycle');
  const [latest] = await listSettingsVersions(ctx.db, cycleId, 1);
  return {
    cycleId,
    version: row.settingsVersion,
    settings: row.settings,
    savedBy: latest?.savedBy ?? null,
    savedAt: latest?.savedAt.toISOString() ?? null,
  };
}

export async function showSettingsHistory(ctx: Context, cycleId: string): Promise<SettingsHistory> {
  if (!(await findCycle(ctx.db, cycleId))) throw notFound('cycle');
  const versions = await listSettingsVersions(ctx.db, cycleId);
  return { versions: versions.map((row) => ({ ...row, savedAt: row.savedAt.toISOString() })) };
}

/** Saves a new version; refuses where a colleague saved one meanwhile. */
export async function saveSettings(
  ctx: Context,
  cycleId: string,
  settings: MatchingSettings,
  version: number,
): Promise<CycleSettings> {
  await inTransaction(ctx, async (tx) => {
    const row = await holdCycle(tx.db, cycleId);
    if (!row) throw notFound('cycle');
    if (row.settingsVersion !== version) throw stale(await showSettings(tx, cycleId));
    if (!mayEditSettings(row.phase))
      throw new Problem('conflict', 'Rules and criteria of a cycle that is closing or over stay as they are');
    const fields = changedFields(row.settings, settings);
    if (fields.length === 0) return;
    const next = row.settingsVersion + 1;
    await updateCycle(tx.db, cycleId, { settings, settingsVersion: next });
    await insertSettingsVersion(tx.db, {
      cycleId,
      version: next,
      settings,
      savedBy: tx.actor?.personId ?? null,
      savedAt: tx.now(),
    });
    await recordAudit(tx, { action: 'cycles.save-settings', subjectId: cycleId, cycleId, fields });
  });
  return showSettings(ctx, cycleId);
}
