/** The thread in which runs and questions are worked out, so that requests stay quick meanwhile. */
import { parentPort } from 'node:worker_threads';
import { makePlan } from '../../../shared/matching/make-plan';
import {
  alternativesOf,
  openPlan,
  priceOfDecision,
  proofOf,
  reasonsOf,
  type OpenPlan,
} from '../../../shared/matching/plan-questions';
import { forecastOf } from '../../../shared/matching/forecast';
import { ruleEffects } from '../../../shared/matching/rule-effects';
import { packPlan } from '../../../shared/matching/stored-plan';
import type { PlanOf, Task, ThreadAnswer } from './matching-tasks';
import { unzipped, zipped } from './zipped';

const MOST_OPEN_PLANS = 3;
/** The last plans asked about, so that the next question about one needs no building. Frozen data: never stale. */
const open = new Map<string, OpenPlan>();

function opened({ runId, input, plan }: PlanOf): OpenPlan {
  const known = open.get(runId) ?? openPlan(unzipped(input), unzipped(plan));
  open.delete(runId);
  open.set(runId, known);
  for (const oldest of open.keys()) {
    if (open.size <= MOST_OPEN_PLANS) break;
    open.delete(oldest);
  }
  return known;
}

function work(task: Task, progress: (share: number, stage: string) => void): unknown {
  switch (task.kind) {
    case 'plan': {
      const made = makePlan(unzipped(task.input), { report: progress, now: () => Date.now() });
      return { plan: zipped(packPlan(made.plan)), report: made.report, pairings: made.pairings };
    }
    case 'effects':
      return ruleEffects(unzipped(task.input));
    case 'forecast':
      return forecastOf(unzipped(task.input));
    case 'alternatives':
      return alternativesOf(opened(task.of), task.mentee);
    case 'reasons':
      return reasonsOf(opened(task.of), task.mentee, task.mentor);
    case 'price':
      return priceOfDecision(opened(task.of), task.mentee, task.mentor, task.decision);
    case 'proof':
      return proofOf(opened(task.of));
  }
}

parentPort?.on('message', ({ id, task }: { id: number; task: Task }) => {
  const answer = (message: ThreadAnswer): void => parentPort?.postMessage(message);
  try {
    const result = work(task, (share, stage) => answer({ id, share, stage }));
    answer({ id, result });
  } catch (error) {
    answer({ id, fault: error instanceof Error ? error.message : String(error) });
  }
});
