import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { ApplicationLine } from '../application-line';
import { ApplicationsClient } from '../applications-client';

const OVER = new Set(['closed', 'cancelled']);

/** On a member's home: the applications of cycles that are not over. */
@Component({
  selector: 'app-applications-panel',
  imports: [ApplicationLine, LoadProblem, RouterLink],
  template: `
    @if (mine.hasValue()) {
      @if (current().length > 0) {
        <section class="card stack" aria-labelledby="your-applications">
          <div class="spread">
            <h2 id="your-applications">Your applications</h2>
            <a routerLink="/applications">All applications</a>
          </div>
          <ul class="line-list plain-list">
            @for (application of current(); track application.id) {
              <li><app-application-line [application]="application" /></li>
            }
          </ul>
        </section>
      }
    } @else if (mine.error()) {
      <app-load-problem message="Your applications could not be loaded." (retried)="mine.reload()" />
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicationsPanel {
  protected readonly mine = inject(ApplicationsClient).mine();
  protected readonly current = computed(() =>
    this.mine.hasValue() ? this.mine.value().applications.filter((each) => !OVER.has(each.phase)) : [],
  );
}
