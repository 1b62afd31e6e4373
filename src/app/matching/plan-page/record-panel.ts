import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type PairingProblem, verify } from '../../../../shared/assignment';
import { AIM_LABEL } from '../../../../shared/matching/matching-contract';
import { CRITERIA, ruleInWords } from '../../../../shared/matching/catalogue';
import type { Plan, ProofArrays } from '../../../../shared/matching/runs-contract';
import { unpackPlan } from '../../../../shared/matching/stored-plan';
import { MomentPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { counted } from '../../ui/format/plural-pipe';
import { MatchingClient } from '../matching-client';

const STAGE_LABEL: Record<string, string> = {
  build: 'Weighing every pair',
  solve: 'Finding the plan',
  verify: 'Checking the proof',
  shortages: 'Explaining shortages',
  tradeOff: 'Trade-off curve',
  standbys: 'Standbys',
  steadiness: 'Steadiness',
};

/** What the plan rests on: settings, hash, timings, and the proof, which this browser can check by itself. */
@Component({
  selector: 'app-record-panel',
  imports: [MatButton, MomentPipe],
  templateUrl: './record-panel.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordPanel {
  readonly plan = input.required<Plan>();

  private readonly client = inject(MatchingClient);
  private readonly notices = inject(Notices);
  protected readonly checking = signal(false);
  protected readonly verdict = signal<{ ok: boolean; text: string } | null>(null);

  protected readonly record = computed(() => this.plan().report.record);
  protected readonly aim = computed(() => AIM_LABEL[this.record().settings.aim]);
  protected readonly rules = computed(() =>
    this.record()
      .settings.rules.filter((rule) => rule.on)
      .map(ruleInWords),
  );
  protected readonly weights = computed(() =>
    this.record()
      .settings.criteria.filter((each) => each.weight > 0)
      .map((each) => `${CRITERIA[each.criterion].label} ${each.weight}`),
  );
  protected readonly timings = computed(() =>
    Object.entries(this.record().timings).map(([stage, milliseconds]) => ({
      label: STAGE_LABEL[stage] ?? stage,
      text: milliseconds < 1000 ? `${Math.round(milliseconds)} ms` : `${(milliseconds / 1000).toFixed(1)} s`,
    })),
  );

  /** Runs the same checks in this browser, on the arrays of the stored plan. */
  protected check(): void {
    this.checking.set(true);
    this.client.proof(this.plan().run.id).subscribe({
      next: (arrays) => {
        this.checking.set(false);
        this.verdict.set(verdictOf(arrays, this.plan()));
      },
      error: (error: unknown) => {
        this.checking.set(false);
        this.notices.tell(error);
      },
    });
  }
}

function verdictOf({ problem: plain, options, plan: stored }: ProofArrays, plan: Plan): { ok: boolean; text: string } {
  const problem: PairingProblem = {
    menteeCount: plain.menteeCount,
    mentorCount: plain.mentorCount,
    capacity: Int32Array.from(plain.capacity),
    rowStart: Int32Array.from(plain.rowStart),
    target: Int32Array.from(plain.target),
    fit: Int32Array.from(plain.fit),
    ...(plain.loadCharge ? { loadCharge: Int32Array.from(plain.loadCharge) } : {}),
    ...(plain.placesTaken ? { placesTaken: Int32Array.from(plain.placesTaken) } : {}),
  };
  const { ok, faults } = verify(problem, unpackPlan(stored), options);
  if (!ok)
    return {
      ok,
      text: `The proof does not hold: ${faults.join('; ')}. Do not publish this plan; tell your administrator.`,
    };
  if (stored.paired !== plan.report.paired)
    return { ok: false, text: 'The proof holds for another number of pairings than this page shows.' };
  return {
    ok,
    text: `Checked in this browser: ${counted(plain.target.length, 'eligible pair', 'eligible pairs')} looked at, every price holds.`,
  };
}
