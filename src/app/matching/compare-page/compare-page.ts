import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { FitPipe } from '../../ui/format/fit-pipe';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { MatchingClient } from '../matching-client';

/** Two plans of one cycle side by side: who has whom in each, and what differs in what the runs read. */
@Component({
  selector: 'app-compare-page',
  imports: [EmptyState, FitPipe, LoadProblem, Loading, PageHeader, RouterLink],
  templateUrl: './compare-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComparePage {
  readonly cycleId = input.required<string>();
  readonly runId = input.required<string>();
  readonly otherId = input.required<string>();

  protected readonly resource = inject(MatchingClient).comparison(this.runId, this.otherId);
  protected readonly comparison = computed(() => (this.resource.hasValue() ? this.resource.value() : null));
}
