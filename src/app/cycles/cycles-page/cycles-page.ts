import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { PHASE_LABEL } from '../../../../shared/cycles/cycles-contract';
import { DayPipe } from '../../core/moments';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { CyclesClient } from '../cycles-client';

/** Every cycle, the latest first. */
@Component({
  selector: 'app-cycles-page',
  imports: [DayPipe, EmptyState, LoadProblem, Loading, MatButton, PageHeader, RouterLink],
  template: `
    <div class="page">
      <app-page-header title="Cycles" subtitle="Each takes the programme once from applications to closed pairs.">
        <a matButton="filled" routerLink="new">New cycle</a>
      </app-page-header>
      @if (cycles.hasValue()) {
        @if (cycles.value().cycles.length > 0) {
          <section class="card card--flush">
            <div class="table-scroll" tabindex="0" role="region" aria-label="Cycles">
              <table class="data-table">
                <thead>
                  <tr>
                    <th scope="col">Cycle</th>
                    <th scope="col">Phase</th>
                    <th scope="col">Applications</th>
                    <th scope="col">Answers due</th>
                    <th scope="col">Pairs</th>
                  </tr>
                </thead>
                <tbody>
                  @for (cycle of cycles.value().cycles; track cycle.id) {
                    <tr>
                      <th scope="row">
                        <a [routerLink]="[cycle.id]">{{ cycle.name }}</a>
                      </th>
                      <td>{{ phaseLabel[cycle.phase] }}</td>
                      <td>{{ cycle.applicationsOpenOn | day }} – {{ cycle.applicationsCloseOn | day }}</td>
                      <td>{{ cycle.answersDueOn | day }}</td>
                      <td>{{ cycle.startsOn | day }} – {{ cycle.endsOn | day }}</td>
                    </tr>
                  }
                </tbody>
              </table>
            </div>
          </section>
        } @else {
          <app-empty-state
            title="No cycle yet"
            text="Make the first one: name, dates, and the text that applicants agree to."
          />
        }
      } @else if (cycles.error()) {
        <app-load-problem message="The cycles could not be loaded." (retried)="cycles.reload()" />
      } @else {
        <app-loading />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CyclesPage {
  protected readonly cycles = inject(CyclesClient).cycles();
  protected readonly phaseLabel = PHASE_LABEL;
}
