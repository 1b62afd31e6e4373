import { CRITERIA, activeCriteria } from '../../../shared/matching/catalogue';
import type { MatchingInput } from '../../../shared/matching/matching-input';
import type { Plan, PlanPerson, PlanReport } from '../../../shared/matching/runs-contract';
import { findCycle } from '../cycles';
import { notFound, Problem, type Context } from '../platform';
import { changedSince } from './changed-since';
import { listApplicants, type ApplicantFacts } from './cycle-facts-queries';
import { listDecisions } from './decisions-queries';
import { toRunLine } from './run-lines';
import { findListedRun, findReport, findRunInput, listPlanPairings, type ListedRun } from './runs-queries';
import { unzipped } from './zipped';

export interface FinishedRun {
  listed: ListedRun;
  report: PlanReport;
  input: MatchingInput;
}

/** A run with a plan; anything else is refused with what it is instead. */
export async function loadFinishedRun(ctx: Context, runId: string): Promise<FinishedRun> {
  const listed = await findListedRun(ctx.db, runId);
  if (!listed) throw notFound('run');
  const report = listed.run.state === 'succeeded' ? await findReport(ctx.db, runId) : null;
  const input = report ? await findRunInput(ctx.db, runId) : null;
  if (!report || !input) throw new Problem('conflict', `Run ${listed.run.number} has no plan`);
  return { listed, report, input: unzipped(input) };
}

/** Everything the plan page shows at once. */
export async function showPlan(ctx: Context, runId: string): Promise<Plan> {
  const { listed, report, input } = await loadFinishedRun(ctx, runId);
  const { run } = listed;
  const cycle = await findCycle(ctx.db, run.cycleId);
  if (!cycle) throw notFound('cycle');
  const facts = new Map((await listApplicants(ctx.db, run.cycleId)).map((each) => [each.applicationId, each]));
  const pairings = await listPlanPairings(ctx.db, runId);
  const decisions = await listDecisions(ctx.db, run.cycleId);
  const person = personOf(facts, input);
  const published = listed.round !== null;
  return {
    run: toRunLine(listed),
    cycleId: run.cycleId,
    report,
    criteria: activeCriteria(run.settings.criteria).map(({ criterion, weight }) => ({
      key: criterion,
      label: CRITERIA[criterion].label,
      short: CRITERIA[criterion].short,
      weight,
    })),
    mentees: input.mentees.map((mentee) => person(mentee, 0)),
    mentors: input.mentors.map((mentor) => person(mentor, mentor.places)),
    pairings: pairings.map((row) => ({
      mentee: row.menteeApplicationId,
      mentor: row.mentorApplicationId,
      fit: row.fit,
      place: row.place,
      scores: row.scores,
      stays: row.stays,
      locked: row.locked,
    })),
    decisions: decisions.map((row) => ({
      mentee: row.menteeApplicationId,
      mentor: row.mentorApplicationId,
      kind: row.kind,
      note: row.note,
      overridesRules: row.overridesRules,
    })),
    changedSince: published ? [] : await changedSince(ctx, { cycle, input, facts, settings: run.settings }),
    mayPublish: !published && ['matching', 'responses', 'under-way'].includes(cycle.phase),
  };
}

type Positioned = MatchingInput['mentees'][number] | MatchingInput['mentors'][number];

/** Names each with the practice area that comes first for them. */
function personOf(
  facts: ReadonlyMap<string, ApplicantFacts>,
  input: MatchingInput,
): (who: Positioned, places: number) => PlanPerson {
  const areas = new Map(input.tags.filter((tag) => tag.kind === 'practice-area').map((tag) => [tag.id, tag.label]));
  return (who, places) => {
    const chosen = 'seeks' in who ? who.seeks : who.offers;
    const tagIds = [...chosen].sort((a, b) => a.priority - b.priority).map((choice) => choice.tagId);
    const fact = facts.get(who.key);
    return {
      applicationId: who.key,
      name: fact?.name ?? 'Erased',
      area: tagIds.map((id) => areas.get(id)).find(Boolean) ?? '',
      region: who.town ? (input.towns[who.town]?.region ?? '') : '',
      employer: who.employer,
      places,
    };
  };
}
