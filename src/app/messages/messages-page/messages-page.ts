import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatPaginator, type PageEvent } from '@angular/material/paginator';
import { MatSelectModule } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import { debounceTime, Subject } from 'rxjs';
import { MESSAGE_STATE_LABEL, MessageState } from '../../../../shared/messages/messages-contract';
import { MomentPipe } from '../../core/moments';
import { orEmpty } from '../../core/query-inputs';
import { SessionStore } from '../../core/session-store';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { PageHeader } from '../../ui/page-header/page-header';
import { MessagesClient } from '../messages-client';

/** Administrators: what was sent to whom, and in what state it is. */
@Component({
  selector: 'app-messages-page',
  imports: [
    EmptyState,
    MatButton,
    MatFormFieldModule,
    MatInput,
    MatPaginator,
    MatSelectModule,
    MomentPipe,
    PageHeader,
    RouterLink,
  ],
  templateUrl: './messages-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MessagesPage {
  readonly search = input('', { transform: orEmpty });
  readonly state = input('', { transform: orEmpty });
  readonly page = input('1', { transform: orEmpty });

  private readonly client = inject(MessagesClient);
  private readonly router = inject(Router);
  private readonly typed = new Subject<string>();
  protected readonly session = inject(SessionStore);
  protected readonly states = MessageState.options.map((state) => ({ state, label: MESSAGE_STATE_LABEL[state] }));
  protected readonly stateLabel = MESSAGE_STATE_LABEL;
  protected readonly messages = this.client.messages(
    computed(() => ({ search: this.search(), state: this.state(), page: Number(this.page()) || 1 })),
  );

  constructor() {
    this.typed
      .pipe(debounceTime(250), takeUntilDestroyed())
      .subscribe((search) => this.show({ search: search || null, page: null }));
  }

  protected find(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value.trim());
  }

  protected showState(state: string): void {
    this.show({ state: state || null, page: null });
  }

  protected turn(event: PageEvent): void {
    this.show({ page: event.pageIndex + 1 });
  }

  private show(queryParams: Record<string, string | number | null>): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge' });
  }
}
