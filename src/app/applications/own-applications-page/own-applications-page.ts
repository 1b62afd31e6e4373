import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { ApplicationLine } from '../application-line';
import { ApplicationsClient } from '../applications-client';

/** A member's applications in all cycles. */
@Component({
  selector: 'app-own-applications-page',
  imports: [ApplicationLine, EmptyState, LoadProblem, Loading, MatButton, PageHeader, RouterLink],
  template: `
    <div class="page page--narrow">
      <app-page-header title="Your applications" subtitle="Where each stands, and what happens next." />
      @if (mine.hasValue()) {
        @if (mine.value().applications.length > 0) {
          <ul class="card line-list plain-list">
            @for (application of mine.value().applications; track application.id) {
              <li><app-application-line [application]="application" /></li>
            }
          </ul>
        } @else {
          <app-empty-state
            title="You have not applied yet"
            text="Cycles that take applications are shown on the start page. A complete profile helps you to be paired."
          >
            <a matButton="filled" routerLink="/">See open cycles</a>
          </app-empty-state>
        }
      } @else if (mine.error()) {
        <app-load-problem message="Your applications could not be loaded." (retried)="mine.reload()" />
      } @else {
        <app-loading />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnApplicationsPage {
  protected readonly mine = inject(ApplicationsClient).mine();
}
