import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { AddressOnly, type Outcome } from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

@Component({
  selector: 'app-forgotten-page',
  imports: [MatButton, MatFormFieldModule, MatInput, PageHeader, ProblemSummary, ReactiveFormsModule],
  templateUrl: './forgotten-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgottenPage {
  private readonly client = inject(AccountsClient);
  protected readonly form = inject(NonNullableFormBuilder).group({ email: ['', asContract(AddressOnly.shape.email)] });
  protected readonly submission = new AccountForm<Outcome>(this.form);
  protected readonly sent = signal<Outcome | null>(null);
  protected readonly faultOf = faultOf;

  protected send(): void {
    this.submission.submit(
      () => this.client.requestReset(this.form.getRawValue().email),
      (outcome) => this.sent.set(outcome),
    );
  }
}
