import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import {
  InvitationAnswer,
  type Outcome,
  PASSWORD_MIN,
  ROLE_LABEL,
} from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

@Component({
  selector: 'app-invitation-page',
  imports: [MatButton, MatFormFieldModule, MatInput, PageHeader, ProblemSummary, ReactiveFormsModule, RouterLink],
  templateUrl: './invitation-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationPage {
  readonly token = input.required<string>();
  private readonly client = inject(AccountsClient);
  protected readonly shortest = PASSWORD_MIN;
  protected readonly invitation = this.client.invitation(this.token);
  protected readonly roles = computed(() =>
    this.invitation.hasValue()
      ? this.invitation
          .value()
          .roles.map((role) => ROLE_LABEL[role].toLowerCase())
          .join(', ')
      : '',
  );
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', asContract(InvitationAnswer.shape.name)],
    email: [''],
    password: ['', asContract(InvitationAnswer.shape.password)],
  });
  protected readonly submission = new AccountForm<Outcome>(this.form);
  protected readonly done = signal<Outcome | null>(null);
  protected readonly faultOf = faultOf;

  protected accept(): void {
    const { name, email, password } = this.form.getRawValue();
    this.submission.submit(
      () => this.client.acceptInvitation({ token: this.token(), name, password, ...(email ? { email } : {}) }),
      (outcome) => this.done.set(outcome),
    );
  }
}
