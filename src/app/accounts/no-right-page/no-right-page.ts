import { ChangeDetectionStrategy, Component, inject, RESPONSE_INIT } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { SessionStore } from '../../core/session-store';
import { PageHeader } from '../../ui/page-header/page-header';

@Component({
  selector: 'app-no-right-page',
  imports: [MatButton, PageHeader, RouterLink],
  template: `
    <div class="page page--narrow">
      <app-page-header title="Your role does not include this page" />
      <p>
        Coordinators, organisers and administrators each have pages of their own. If you need this one for your work,
        ask an administrator of {{ session.association().name }} for the role.
      </p>
      <p><a matButton="filled" routerLink="/">Go to the start page</a></p>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoRightPage {
  protected readonly session = inject(SessionStore);

  constructor() {
    const answer = inject(RESPONSE_INIT, { optional: true });
    if (answer) answer.status = 403;
  }
}
