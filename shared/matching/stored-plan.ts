/** A plan as plain arrays, for storing it and for checking it elsewhere. */
import type { Cover, PairingPlan } from '../assignment';
import type { ProofArrays } from './runs-contract';

export type StoredPlan = ProofArrays['plan'];

const plainCover = ({ mentees, mentors }: Cover): { mentees: number[]; mentors: number[] } => ({
  mentees: [...mentees],
  mentors: [...mentors],
});
const typedCover = ({ mentees, mentors }: { mentees: number[]; mentors: number[] }): Cover => ({
  mentees: Int32Array.from(mentees),
  mentors: Int32Array.from(mentors),
});

export function packPlan(plan: PairingPlan): StoredPlan {
  return {
    aim: plan.aim,
    method: plan.method,
    mentorOf: [...plan.mentorOf],
    paired: plan.paired,
    totalFit: plan.totalFit,
    totalCharge: plan.totalCharge,
    weakestFit: plan.weakestFit,
    menteePrice: [...plan.menteePrice],
    mentorPrice: [...plan.mentorPrice],
    lift: plan.lift
      ? {
          threshold: plan.lift.threshold,
          cardinalityCover: plainCover(plan.lift.cardinalityCover),
          thresholdCover: plainCover(plan.lift.thresholdCover),
        }
      : null,
  };
}

export function unpackPlan(stored: StoredPlan): PairingPlan {
  return {
    ...stored,
    mentorOf: Int32Array.from(stored.mentorOf),
    menteePrice: Float64Array.from(stored.menteePrice),
    mentorPrice: Float64Array.from(stored.mentorPrice),
    lift: stored.lift
      ? {
          threshold: stored.lift.threshold,
          cardinalityCover: typedCover(stored.lift.cardinalityCover),
          thresholdCover: typedCover(stored.lift.thresholdCover),
        }
      : undefined,
  };
}
