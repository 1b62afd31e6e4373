/** What the certificate of a plan shows, in a sentence for people who were not there. */
import type { PairingPlan } from '../assignment';
import type { BuiltProblem } from './build-problem';

export function proofStatement({ problem, options }: BuiltProblem, plan: PairingPlan): string {
  const subject = options.locked.length + options.barred.length > 0 ? ', with these locks and bars,' : '';
  const checked = 'Checked by separate code from the plan’s prices.';
  switch (plan.aim) {
    case 'best-total':
      return `No plan${subject} has a greater total fit. ${checked}`;
    case 'lift-the-weakest':
      return `No plan${subject} pairs more; among those that pair as many, none has a better weakest pairing; among those, none a greater total fit. ${checked}`;
    default:
      return plan.paired === problem.menteeCount
        ? `Everyone is paired, and no plan${subject} that pairs everyone has a greater total fit. ${checked}`
        : `No plan${subject} pairs more than ${plan.paired}, and none that pairs as many has a greater total fit. ${checked}`;
  }
}
