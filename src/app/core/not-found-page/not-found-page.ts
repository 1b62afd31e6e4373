import { ChangeDetectionStrategy, Component, inject, RESPONSE_INIT } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'app-not-found-page',
  imports: [MatButton, RouterLink],
  template: `
    <div class="page page--narrow">
      <h1 tabindex="-1">This page does not exist</h1>
      <p>The address may be mistyped, or what was here has been moved or withdrawn.</p>
      <p><a matButton="filled" routerLink="/">Go to the start page</a></p>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {
  constructor() {
    const answer = inject(RESPONSE_INIT, { optional: true });
    if (answer) answer.status = 404;
  }
}
