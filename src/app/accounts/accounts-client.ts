import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  type Invitation,
  type InvitationAnswer,
  InvitationView,
  type Outcome,
  PeoplePage,
  type PersonLine,
  type Registration,
  type Role,
  type Session,
  type SignIn,
} from '../../../shared/accounts/accounts-contract';

/** Every HTTP call of accounts. */
@Injectable({ providedIn: 'root' })
export class AccountsClient {
  private readonly http = inject(HttpClient);

  signIn(form: SignIn): Observable<Session> {
    return this.http.post<Session>('/api/accounts/session', form);
  }

  register(form: Registration): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/registrations', form);
  }

  confirm(token: string): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/confirmations', { token });
  }

  requestReset(email: string): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/reset-requests', { email });
  }

  resetPassword(token: string, password: string): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/password-resets', { token, password });
  }

  invitation(token: Signal<string>) {
    return httpResource(() => `/api/accounts/invitations/${encodeURIComponent(token())}`, {
      parse: InvitationView.parse,
    });
  }

  acceptInvitation(form: InvitationAnswer): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/invitation-answers', form);
  }

  people(query: Signal<{ search: string; role: string; page: number }>) {
    return httpResource(
      () => {
        const { search, role, page } = query();
        return { url: '/api/accounts/people', params: { search, page, ...(role ? { role } : {}) } };
      },
      { parse: PeoplePage.parse },
    );
  }

  changeRoles(personId: string, roles: Role[]): Observable<PersonLine> {
    return this.http.put<PersonLine>(`/api/accounts/people/${personId}/roles`, { roles });
  }

  invite(form: Invitation): Observable<Outcome> {
    return this.http.post<Outcome>('/api/accounts/invitations', form);
  }
}
