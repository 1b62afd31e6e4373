import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, output } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { Alternatives, Plan } from '../../../../shared/matching/runs-contract';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { FitBars } from '../../ui/fit-bars/fit-bars';
import { FitPipe } from '../../ui/format/fit-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { MatchingClient } from '../matching-client';
import { whereabouts } from './plan-view';

type Option = Alternatives['options'][number];
const FIRST_OPTIONS = 6;

/** One mentee: the pairing and its reasons, everyone else it could be, and the price of each lock, bar and other choice. */
@Component({
  selector: 'app-pair-inspector',
  imports: [FitBars, FitPipe, LoadProblem, Loading, MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule],
  templateUrl: './pair-inspector.html',
  styles: `
    .head {
      flex-wrap: nowrap;
      align-items: start;
    }

    .lost {
      color: var(--madder);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairInspector {
  readonly plan = input.required<Plan>();
  /** Application of the mentee. */
  readonly mentee = input.required<string>();
  readonly closed = output<void>();
  readonly decided = output<void>();

  private readonly client = inject(MatchingClient);
  private readonly notices = inject(Notices);
  protected readonly note = new FormControl('', { nonNullable: true });

  private readonly runId = computed(() => this.plan().run.id);
  protected readonly alternatives = this.client.alternatives(
    computed(() => ({ runId: this.runId(), mentee: this.mentee() })),
  );
  protected readonly person = computed(
    () => this.plan().mentees.find((person) => person.applicationId === this.mentee()) ?? null,
  );
  protected readonly where = computed(() => {
    const person = this.person();
    return person ? whereabouts(person) : '';
  });
  protected readonly current = computed(
    () => this.plan().pairings.find((pairing) => pairing.mentee === this.mentee())?.mentor ?? null,
  );
  /** The mentor whose reasons are shown: the one of the plan, or the one looked at among the others. */
  protected readonly looked = linkedSignal<string | null>(() => this.current());
  protected readonly reasons = this.client.reasons(
    computed(() => {
      const mentor = this.looked();
      return mentor ? { runId: this.runId(), mentee: this.mentee(), mentor } : null;
    }),
  );
  protected readonly lookedName = computed(
    () => this.plan().mentors.find((person) => person.applicationId === this.looked())?.name ?? '',
  );
  protected readonly parts = computed(() =>
    this.reasons.hasValue()
      ? this.reasons.value().criteria.map((part) => ({ ...part, short: part.label.slice(0, 5) }))
      : [],
  );
  protected readonly decision = computed(
    () =>
      this.plan().decisions.find((each) => each.mentee === this.mentee() && each.mentor === this.looked())?.kind ??
      null,
  );
  protected readonly standby = computed(() => {
    const standby = this.plan().report.standbys[this.mentee()];
    return standby
      ? (this.plan().mentors.find((person) => person.applicationId === standby.mentor)?.name ?? null)
      : null;
  });
  private readonly showAll = linkedSignal({ source: this.mentee, computation: () => false });
  private readonly others = computed(() =>
    this.alternatives.hasValue() ? this.alternatives.value().options.filter((option) => !option.current) : [],
  );
  protected readonly options = computed(() => (this.showAll() ? this.others() : this.others().slice(0, FIRST_OPTIONS)));
  protected readonly hiddenCount = computed(() => this.others().length - this.options().length);
  protected readonly barPrice = computed(() =>
    this.alternatives.hasValue() ? this.alternatives.value().barring : null,
  );
  protected readonly lookedOption = computed(
    () => this.others().find((option) => option.mentor === this.looked()) ?? null,
  );

  protected readonly refusal = linkedSignal<string | null, string>({ source: this.looked, computation: () => '' });

  protected showMore(): void {
    this.showAll.set(true);
  }

  /** "plan −3.1", "one fewer paired", "no loss" */
  protected priceInWords(price: Pick<Option, 'pairsLost' | 'fitLost'>): string {
    if (price.pairsLost > 0) return price.pairsLost === 1 ? 'one fewer paired' : `${price.pairsLost} fewer paired`;
    if (price.fitLost === 0) return 'no loss';
    const points = Math.abs(price.fitLost / 100).toFixed(1);
    return price.fitLost > 0 ? `plan −${points}` : `plan +${points}`;
  }

  protected decide(kind: 'lock' | 'bar' | 'none', overridesRules = false): void {
    const mentor = this.looked();
    if (!mentor) return;
    const form = { mentee: this.mentee(), mentor, kind, note: this.note.value, overridesRules };
    this.client.decide(this.plan().cycleId, form).subscribe({
      next: () => {
        this.note.reset();
        this.refusal.set('');
        this.notices.say(
          kind === 'none'
            ? 'Released. The next run is free again.'
            : `${kind === 'lock' ? 'Locked' : 'Barred'}. The next run keeps this.`,
        );
        this.decided.emit();
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.refusal.set(
          [problem.title, problem.detail, ...(problem.fields ?? []).map((fault) => fault.message)]
            .filter(Boolean)
            .join('. '),
        );
      },
    });
  }
}
