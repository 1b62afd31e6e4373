import { ChangeDetectionStrategy, Component, DOCUMENT, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { type Session, SignIn } from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { safePath } from '../../core/guards';
import { SessionStore } from '../../core/session-store';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

@Component({
  selector: 'app-sign-in-page',
  imports: [MatButton, MatFormFieldModule, MatInput, PageHeader, ProblemSummary, ReactiveFormsModule, RouterLink],
  templateUrl: './sign-in-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  readonly next = input<string>();
  readonly ended = input<string>();

  private readonly client = inject(AccountsClient);
  private readonly document = inject(DOCUMENT);
  protected readonly session = inject(SessionStore);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', asContract(SignIn.shape.email)],
    password: ['', asContract(SignIn.shape.password)],
  });
  protected readonly submission = new AccountForm<Session>(this.form);
  protected readonly faultOf = faultOf;

  protected signIn(): void {
    this.submission.submit(
      () => this.client.signIn(this.form.getRawValue()),
      // A fresh page for the new person: nothing of the visitor's state is carried over.
      () => this.document.location.assign(safePath(this.next())),
    );
  }
}
