import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { filter, interval } from 'rxjs';
import { RUN_STATE_LABEL, type PairDecisions, type RunLine } from '../../../../shared/matching/runs-contract';
import { CycleStore } from '../../core/cycle-store';
import { MomentPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { FitPipe } from '../../ui/format/fit-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProgressPanel } from '../../ui/progress-panel/progress-panel';
import { MatchingClient } from '../matching-client';

/** How often the list is asked for anew: quickly while a run works, slowly for what colleagues start. */
const BUSY_MS = 700;
const CALM_TICKS = 12;

type Decision = PairDecisions['decisions'][number];

/** Runs of a cycle: start, watch, stop, open; and the locks and bars that the next run will keep. */
@Component({
  selector: 'app-runs-page',
  imports: [EmptyState, FitPipe, LoadProblem, Loading, MatButton, MomentPipe, PageHeader, ProgressPanel, RouterLink],
  templateUrl: './runs-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunsPage {
  readonly cycleId = input.required<string>();

  private readonly client = inject(MatchingClient);
  private readonly notices = inject(Notices);
  private readonly store = inject(CycleStore);
  protected readonly stateLabel = RUN_STATE_LABEL;
  protected readonly runs = this.client.runs(this.cycleId);
  protected readonly decisions = this.client.decisions(this.cycleId);

  private readonly list = computed(() => (this.runs.hasValue() ? this.runs.value().runs : []));
  protected readonly working = computed(
    () => this.list().find((run) => run.state === 'queued' || run.state === 'running') ?? null,
  );
  protected readonly finished = computed(() => this.list().filter((run) => run !== this.working()));
  /** The two latest plans, for comparing. */
  protected readonly comparable = computed(() =>
    this.list()
      .filter((run) => run.state === 'succeeded')
      .slice(0, 2),
  );

  private readonly finishedCount = computed(() => (this.runs.hasValue() ? this.finished().length : null));

  constructor() {
    // The frame around this page counts runs too.
    let before: number | null = null;
    effect(() => {
      const now = this.finishedCount();
      if (before !== null && now !== null && now !== before) this.store.reload();
      before = now ?? before;
    });
    interval(BUSY_MS)
      .pipe(
        filter((tick) => this.working() !== null || tick % CALM_TICKS === 0),
        filter(() => !this.runs.isLoading()),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.runs.reload());
  }

  protected start(): void {
    this.client.startRun(this.cycleId()).subscribe({
      next: () => this.runs.reload(),
      error: (error: unknown) => this.notices.tell(error),
    });
  }

  protected cancel(run: RunLine): void {
    this.client.cancelRun(run.id).subscribe({
      next: () => this.runs.reload(),
      error: (error: unknown) => this.notices.tell(error),
    });
  }

  protected release(decision: Decision): void {
    const { mentee, mentor, kind, note, overridesRules } = decision;
    const decide = (wanted: 'none' | 'lock' | 'bar') =>
      this.client.decide(this.cycleId(), { mentee, mentor, kind: wanted, note, overridesRules });
    const reload = { next: () => this.decisions.reload(), error: (error: unknown) => this.notices.tell(error) };
    decide('none').subscribe({
      next: () => {
        this.decisions.reload();
        this.notices.offer(`${kind === 'lock' ? 'Lock' : 'Bar'} released`, 'Undo', () =>
          decide(kind).subscribe(reload),
        );
      },
      error: reload.error,
    });
  }

  protected secondsOf(run: RunLine): number | null {
    if (!run.startedAt) return null;
    return Math.max(0, Math.round((Date.now() - Date.parse(run.startedAt)) / 1000));
  }
}
