import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { ProblemDetails } from '../../../../shared/problems/problems';
import { problemOf } from '../../core/problems';
import { PageHeader } from '../../ui/page-header/page-header';
import { AccountsClient } from '../accounts-client';

/** Opening the link confirms nothing: mail scanners open links too. A person presses the button. */
@Component({
  selector: 'app-confirm-page',
  imports: [MatButton, PageHeader, RouterLink],
  templateUrl: './confirm-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmPage {
  readonly token = input.required<string>();
  private readonly client = inject(AccountsClient);
  protected readonly busy = signal(false);
  protected readonly done = signal('');
  protected readonly problem = signal<ProblemDetails | null>(null);

  protected confirm(): void {
    if (this.busy()) return;
    this.busy.set(true);
    this.client.confirm(this.token()).subscribe({
      next: (outcome) => this.done.set(outcome.message),
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(problemOf(error));
      },
    });
  }
}
