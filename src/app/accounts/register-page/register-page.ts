import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { type Outcome, PASSWORD_MIN, Registration } from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

@Component({
  selector: 'app-register-page',
  imports: [MatButton, MatFormFieldModule, MatInput, PageHeader, ProblemSummary, ReactiveFormsModule, RouterLink],
  templateUrl: './register-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RegisterPage {
  private readonly client = inject(AccountsClient);
  protected readonly shortest = PASSWORD_MIN;
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', asContract(Registration.shape.name)],
    email: ['', asContract(Registration.shape.email)],
    password: ['', asContract(Registration.shape.password)],
  });
  protected readonly submission = new AccountForm<Outcome>(this.form);
  protected readonly sent = signal<Outcome | null>(null);
  protected readonly faultOf = faultOf;

  protected register(): void {
    this.submission.submit(
      () => this.client.register(this.form.getRawValue()),
      (outcome) => this.sent.set(outcome),
    );
  }
}
