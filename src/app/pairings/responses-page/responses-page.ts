import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { Router } from '@angular/router';
import { debounceTime, Subject } from 'rxjs';
import { PAIRING_STATE_LABEL, type PairingLine, PairingState } from '../../../../shared/pairings/pairings-contract';
import { MomentPipe } from '../../core/moments';
import { orEmpty } from '../../core/query-inputs';
import { AnswerThreads } from '../../ui/answer-threads/answer-threads';
import { BigFigure } from '../../ui/big-figure/big-figure';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { FitPipe } from '../../ui/format/fit-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { PairingsClient } from '../pairings-client';

/** Coordinators: every proposal of the cycle, who has answered what, and which wait. */
@Component({
  selector: 'app-responses-page',
  imports: [
    AnswerThreads,
    BigFigure,
    EmptyState,
    FitPipe,
    LoadProblem,
    Loading,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    MomentPipe,
    PageHeader,
  ],
  templateUrl: './responses-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResponsesPage {
  readonly cycleId = input.required<string>();
  readonly state = input('', { transform: orEmpty });
  readonly search = input('', { transform: orEmpty });

  private readonly router = inject(Router);
  private readonly client = inject(PairingsClient);
  private readonly typed = new Subject<string>();
  protected readonly states = PairingState.options.map((state) => ({ state, label: PAIRING_STATE_LABEL[state] }));
  protected readonly stateLabel = PAIRING_STATE_LABEL;
  protected readonly shown = this.client.responses(
    computed(() => ({ cycleId: this.cycleId(), state: this.state(), search: this.search() })),
  );
  private readonly all = this.client.responses(computed(() => ({ cycleId: this.cycleId(), state: '', search: '' })));
  protected readonly counts = computed(() => {
    const lines = this.all.hasValue() ? this.all.value().pairings : [];
    const of = (...states: PairingState[]): number => lines.filter((line) => states.includes(line.state)).length;
    return {
      total: lines.length,
      accepted: of('under-way', 'completed', 'ended-early'),
      pending: of('pending'),
      ended: of('declined', 'expired', 'withdrawn'),
    };
  });

  constructor() {
    this.typed
      .pipe(debounceTime(250), takeUntilDestroyed())
      .subscribe((search) => this.show({ search: search || null }));
  }

  protected type(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value.trim());
  }

  protected show(queryParams: Record<string, string | null>): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge' });
  }

  protected reasons(line: PairingLine): string[] {
    return [
      line.menteeReason ? `${line.mentee.name}: ${line.menteeReason}` : '',
      line.mentorReason ? `${line.mentor.name}: ${line.mentorReason}` : '',
    ].filter(Boolean);
  }
}
