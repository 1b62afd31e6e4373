/** What the matching thread is asked and what it answers. */
import type { MadePlan } from '../../../shared/matching/make-plan';
import type { NamelessAlternatives } from '../../../shared/matching/plan-questions';
import type { DecisionPrice, PairReasons, ProofArrays } from '../../../shared/matching/runs-contract';
import type { Forecast, RuleEffects } from '../../../shared/matching/effects-contract';

/** A finished run: what it read and what it found, as stored. */
export interface PlanOf {
  runId: string;
  input: Uint8Array;
  plan: Uint8Array;
}

export interface Answers {
  plan: { plan: Uint8Array; report: MadePlan['report']; pairings: MadePlan['pairings'] };
  effects: RuleEffects;
  forecast: Forecast;
  alternatives: NamelessAlternatives | null;
  reasons: PairReasons | null;
  price: DecisionPrice | null;
  proof: ProofArrays;
}

export type Task =
  | { kind: 'plan'; input: Uint8Array }
  | { kind: 'effects'; input: Uint8Array }
  | { kind: 'forecast'; input: Uint8Array }
  | { kind: 'alternatives'; of: PlanOf; mentee: string }
  | { kind: 'reasons'; of: PlanOf; mentee: string; mentor: string }
  | { kind: 'price'; of: PlanOf; mentee: string; mentor: string; decision: 'lock' | 'bar' }
  | { kind: 'proof'; of: PlanOf };

export type ThreadAnswer =
  { id: number; result: unknown } | { id: number; fault: string } | { id: number; share: number; stage: string };
