import { HttpClient } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { Role, Session } from '../../../shared/accounts/accounts-contract';

const NOBODY: Session = {
  person: null,
  association: { name: '', timeZone: 'UTC', locale: 'en-GB', contactEmail: '', towns: [] },
  localMailbox: false,
  demo: false,
};

/** Who is signed in, and the association; known before the first page is drawn. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly http = inject(HttpClient);
  private readonly session = signal<Session>(NOBODY);

  readonly person = computed(() => this.session().person);
  readonly association = computed(() => this.session().association);
  readonly localMailbox = computed(() => this.session().localMailbox);
  readonly demo = computed(() => this.session().demo);
  readonly locale = computed(() => this.association().locale);

  hasRole(role: Role): boolean {
    return this.person()?.roles.includes(role) ?? false;
  }

  /** Asks the server; where it does not answer, the page is drawn for a visitor. */
  async load(): Promise<void> {
    await firstValueFrom(this.http.get<Session>('/api/accounts/session')).then(
      (session) => this.session.set(session),
      () => undefined,
    );
  }

  /** Takes over what signing in or out answered. */
  replace(session: Session): void {
    this.session.set(session);
  }
}
