import { AIM_LABEL } from '../../../shared/matching/matching-contract';
import { CRITERIA, ruleInWords } from '../../../shared/matching/catalogue';
import type { PlanComparison } from '../../../shared/matching/runs-contract';
import { Problem, type Context } from '../platform';
import { differences } from './changed-since';
import { findCycle } from '../cycles';
import { listApplicants } from './cycle-facts-queries';
import { toRunLine } from './run-lines';
import { listPlanPairings } from './runs-queries';
import { loadFinishedRun, type FinishedRun } from './show-plan';

/** Two plans of one cycle, person by person, and what differs in what they read. */
export async function comparePlans(ctx: Context, runId: string, otherId: string): Promise<PlanComparison> {
  const [a, b] = [await loadFinishedRun(ctx, runId), await loadFinishedRun(ctx, otherId)];
  if (a.listed.run.cycleId !== b.listed.run.cycleId)
    throw new Problem('conflict', 'Only plans of one cycle can be compared');
  const [before, after] = a.listed.run.number <= b.listed.run.number ? [a, b] : [b, a];
  const cycle = await findCycle(ctx.db, before.listed.run.cycleId);
  const facts = new Map(
    (await listApplicants(ctx.db, before.listed.run.cycleId)).map((each) => [each.applicationId, each]),
  );
  const nameOf = (key: string | null): string => (key === null ? 'Left out' : (facts.get(key)?.name ?? 'Erased'));
  const [placedBefore, placedAfter] = [await placed(ctx, before), await placed(ctx, after)];
  const mentees = [...new Set([...placedBefore.keys(), ...placedAfter.keys()])];
  const moved = mentees.filter((key) => placedBefore.get(key)?.mentor !== placedAfter.get(key)?.mentor);
  const side = (where: Map<string, Placed>, key: string) => {
    const place = where.get(key);
    return place
      ? { mentor: place.mentor, name: nameOf(place.mentor), fit: place.fit }
      : { mentor: null, name: 'Not in this run', fit: null };
  };
  return {
    before: toRunLine(before.listed),
    after: toRunLine(after.listed),
    same: mentees.length - moved.length,
    changed: moved
      .map((key) => ({
        mentee: key,
        name: nameOf(key),
        before: side(placedBefore, key),
        after: side(placedAfter, key),
      }))
      .sort((x, y) => x.name.localeCompare(y.name)),
    because: [
      ...settingsDifferences(before, after),
      ...(cycle
        ? differences(
            {
              cycle: { ...cycle, settings: before.listed.run.settings },
              input: before.input,
              settings: before.listed.run.settings,
              facts,
            },
            after.input,
          ).map((change) => change.text)
        : []),
    ],
  };
}

interface Placed {
  mentor: string | null;
  fit: number | null;
}

async function placed(ctx: Context, { listed, input }: FinishedRun): Promise<Map<string, Placed>> {
  const where = new Map<string, Placed>(input.mentees.map((mentee) => [mentee.key, { mentor: null, fit: null }]));
  for (const row of await listPlanPairings(ctx.db, listed.run.id))
    where.set(row.menteeApplicationId, { mentor: row.mentorApplicationId, fit: row.fit });
  return where;
}

function settingsDifferences(before: FinishedRun, after: FinishedRun): string[] {
  const [a, b] = [before.listed.run.settings, after.listed.run.settings];
  const texts: string[] = [];
  if (a.aim !== b.aim) texts.push(`Aim: ${AIM_LABEL[a.aim]} → ${AIM_LABEL[b.aim]}`);
  for (const rule of b.rules) {
    const earlier = a.rules.find((each) => each.rule === rule.rule);
    if (!earlier || JSON.stringify(earlier) === JSON.stringify(rule)) continue;
    texts.push(`Rule: ${ruleInWords(earlier)} (${onOff(earlier.on)}) → ${ruleInWords(rule)} (${onOff(rule.on)})`);
  }
  for (const criterion of b.criteria) {
    const earlier = a.criteria.find((each) => each.criterion === criterion.criterion);
    if (!earlier || JSON.stringify(earlier) === JSON.stringify(criterion)) continue;
    texts.push(`Criterion ${CRITERIA[criterion.criterion].label}: weight ${earlier.weight} → ${criterion.weight}`);
  }
  if (a.leftOutBonus !== b.leftOutBonus || String(a.loadCharges) !== String(b.loadCharges))
    texts.push('Bonus or charges changed');
  if (a.seed !== b.seed) texts.push(`Seed: ${a.seed} → ${b.seed}`);
  return texts;
}

const onOff = (on: boolean): string => (on ? 'on' : 'off');
