import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { type Outcome, PASSWORD_MIN, PasswordReset } from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

@Component({
  selector: 'app-reset-page',
  imports: [MatButton, MatFormFieldModule, MatInput, PageHeader, ProblemSummary, ReactiveFormsModule, RouterLink],
  templateUrl: './reset-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResetPage {
  readonly token = input.required<string>();
  private readonly client = inject(AccountsClient);
  protected readonly shortest = PASSWORD_MIN;
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', asContract(PasswordReset.shape.password)],
  });
  protected readonly submission = new AccountForm<Outcome>(this.form);
  protected readonly done = signal<Outcome | null>(null);
  protected readonly faultOf = faultOf;

  protected save(): void {
    this.submission.submit(
      () => this.client.resetPassword(this.token(), this.form.getRawValue().password),
      (outcome) => this.done.set(outcome),
    );
  }
}
