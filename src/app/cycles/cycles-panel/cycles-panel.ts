import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type CyclePhase, type CycleSummary, PHASE_LABEL } from '../../../../shared/cycles/cycles-contract';
import { DayPipe } from '../../core/moments';
import { CyclesClient } from '../cycles-client';

/** Where the work of a phase waits, and what it is. */
const WORK: Partial<Record<CyclePhase, { path: string; text: string }>> = {
  draft: { path: '', text: 'Finish the draft and open it' },
  open: { path: 'applications', text: 'Applications are coming in' },
  'applications-closed': { path: 'applications', text: 'Decide on applications, then start matching' },
  matching: { path: 'matching', text: 'Run the matching, review the plan, publish' },
  responses: { path: 'pairings', text: 'Answers are coming in' },
  'under-way': { path: 'pairings', text: 'Pairs are meeting' },
  closing: { path: '', text: 'Close the cycle' },
};

/** On the home page of coordinators: cycles in work and what waits in each. */
@Component({
  selector: 'app-cycles-panel',
  imports: [DayPipe, RouterLink],
  template: `
    <section class="card stack" aria-labelledby="work-heading">
      <h2 id="work-heading">Cycles in work</h2>
      @if (entries().length > 0) {
        <ul class="plain-list line-list">
          @for (entry of entries(); track entry.cycle.id) {
            <li class="spread">
              <span class="cluster">
                <a [routerLink]="entry.link"
                  ><b>{{ entry.cycle.name }}</b></a
                >
                <span class="muted">{{ entry.text }}</span>
              </span>
              <span class="muted">{{ phaseLabel[entry.cycle.phase] }} · ends {{ entry.cycle.endsOn | day }}</span>
            </li>
          }
        </ul>
      } @else {
        <p class="muted">None. <a routerLink="/cycles/new">Make a new cycle</a></p>
      }
    </section>
  `,
  styles: ':host { display: contents; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CyclesPanel {
  private readonly cycles = inject(CyclesClient).cycles();
  protected readonly phaseLabel = PHASE_LABEL;
  protected readonly entries = computed(() =>
    (this.cycles.hasValue() ? this.cycles.value().cycles : []).flatMap((cycle) => entryOf(cycle)),
  );
}

function entryOf(cycle: CycleSummary): { cycle: CycleSummary; link: string[]; text: string }[] {
  const work = WORK[cycle.phase];
  return work ? [{ cycle, link: ['/cycles', cycle.id, ...(work.path ? [work.path] : [])], text: work.text }] : [];
}
