import type { Cycle, CycleCounts, CycleList, CycleSummary, CycleToApply } from '../../../shared/cycles/cycles-contract';
import { checklistOf, isPublic, nextPhase, previousPhase } from '../../../shared/cycles/phase-rules';
import { findAssociation } from '../accounts';
import { hasRole, notFound, type Context } from '../platform';
import { countCycle, findCycle, listCycles, type CycleRow } from './cycles-queries';

const toSummary = (row: CycleRow): CycleSummary => ({
  id: row.id,
  phase: row.phase,
  name: row.name,
  introduction: row.introduction,
  ...datesOf(row),
});

const datesOf = (row: CycleRow) => ({
  applicationsOpenOn: row.applicationsOpenOn,
  applicationsCloseOn: row.applicationsCloseOn,
  answersDueOn: row.answersDueOn,
  startsOn: row.startsOn,
  checkInOn: row.checkInOn,
  endsOn: row.endsOn,
});

/** Cycles that the visitor may know of, the latest first. */
export async function showCycles(ctx: Context): Promise<CycleList> {
  const all = hasRole(ctx.actor, 'coordinator');
  return { cycles: (await listCycles(ctx.db)).filter((row) => all || isPublic(row.phase)).map(toSummary) };
}

/** A cycle with the consent text that applicants agree to. */
export async function showCycleToApply(ctx: Context, cycleId: string): Promise<CycleToApply> {
  const row = await findCycle(ctx.db, cycleId);
  if (!row || !(isPublic(row.phase) || hasRole(ctx.actor, 'coordinator'))) throw notFound('cycle');
  return { ...toSummary(row), consentText: row.consentText, consentVersion: row.consentVersion };
}

/** Everything a coordinator works with. */
export async function showCycle(ctx: Context, cycleId: string): Promise<Cycle> {
  const row = await findCycle(ctx.db, cycleId);
  if (!row) throw notFound('cycle');
  const counts = await countsOf(ctx, row);
  return {
    ...toSummary(row),
    consentText: row.consentText,
    consentVersion: row.consentVersion,
    askFirst: row.askFirst,
    autoAdmit: row.autoAdmit,
    needsApproval: row.needsApproval,
    version: row.version,
    settingsVersion: row.settingsVersion,
    counts,
    next: nextPhase(row.phase),
    previous: previousPhase(row.phase),
    checklist: checklistOf(row.phase, row, counts, await today(ctx)),
  };
}

export async function countsOf(ctx: Context, row: CycleRow): Promise<CycleCounts> {
  return {
    ...(await countCycle(ctx.db, row.id)),
    activeRules: row.settings.rules.filter((rule) => rule.on).length,
    activeCriteria: row.settings.criteria.filter((criterion) => criterion.weight > 0).length,
  };
}

/** The day it is for the association. */
export async function today(ctx: Context): Promise<string> {
  const association = await findAssociation(ctx.db);
  return new Intl.DateTimeFormat('en-CA', { timeZone: association?.timeZone ?? 'UTC' }).format(ctx.now());
}
