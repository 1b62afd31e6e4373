import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatPaginator, type PageEvent } from '@angular/material/paginator';
import { Router } from '@angular/router';
import { debounceTime, Subject } from 'rxjs';
import {
  Invitation,
  type Outcome,
  type PersonLine,
  Role,
  ROLE_LABEL,
} from '../../../../shared/accounts/accounts-contract';
import { asContract, faultOf } from '../../core/form-faults';
import { orEmpty } from '../../core/query-inputs';
import { Notices } from '../../core/notices';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { AccountForm } from '../account-form/account-form';
import { AccountsClient } from '../accounts-client';

const STATE_LABEL: Record<PersonLine['state'], string> = {
  invited: 'Invited or imported',
  registered: 'Address not confirmed',
  confirmed: 'Active',
  disabled: 'Disabled',
};

/** Administrators: people, their roles, invitations. */
@Component({
  selector: 'app-people-page',
  imports: [
    EmptyState,
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatPaginator,
    PageHeader,
    ProblemSummary,
    ReactiveFormsModule,
  ],
  templateUrl: './people-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {
  readonly search = input('', { transform: orEmpty });
  readonly page = input('1', { transform: orEmpty });

  private readonly client = inject(AccountsClient);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly typed = new Subject<string>();

  protected readonly roles = Role.options.map((role) => ({ role, label: ROLE_LABEL[role] }));
  protected readonly stateLabel = STATE_LABEL;
  protected readonly people = this.client.people(
    computed(() => ({ search: this.search(), role: '', page: Number(this.page()) || 1 })),
  );
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', asContract(Invitation.shape.name)],
    email: ['', asContract(Invitation.shape.email)],
    coordinator: false,
    organiser: false,
    administrator: false,
  });
  protected readonly submission = new AccountForm<Outcome>(this.form);
  protected readonly inviting = signal(false);
  protected readonly faultOf = faultOf;

  constructor() {
    this.typed
      .pipe(debounceTime(250), takeUntilDestroyed())
      .subscribe((search) => this.show({ search: search || null, page: null }));
  }

  protected find(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value.trim());
  }

  protected turn(event: PageEvent): void {
    this.show({ page: event.pageIndex + 1 });
  }

  private show(queryParams: Record<string, string | number | null>): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge' });
  }

  protected change(person: PersonLine, role: Role, holds: boolean): void {
    const roles = holds ? [...person.roles, role] : person.roles.filter((each) => each !== role);
    this.client.changeRoles(person.id, roles).subscribe({
      next: () => {
        this.notices.offer(
          `${person.name}: ${holds ? 'given' : 'no longer'} ${ROLE_LABEL[role].toLowerCase()}`,
          'Undo',
          () => this.client.changeRoles(person.id, [...person.roles]).subscribe(() => this.people.reload()),
        );
        this.people.reload();
      },
      error: (error: unknown) => {
        this.notices.tell(error);
        this.people.reload();
      },
    });
  }

  protected invite(): void {
    const { name, email, ...given } = this.form.getRawValue();
    const roles = Role.options.filter((role) => given[role]);
    this.submission.submit(
      () => this.client.invite({ name, email, roles }),
      (outcome) => {
        this.notices.say(outcome.message);
        this.inviting.set(false);
        this.form.reset();
        this.people.reload();
      },
    );
  }
}
