import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { Observable } from 'rxjs';
import { type AnswerForm, OwnPairing, OwnPairings, PairingLines } from '../../../shared/pairings/pairings-contract';

/** Every HTTP call of pairings. */
@Injectable({ providedIn: 'root' })
export class PairingsClient {
  private readonly http = inject(HttpClient);

  mine() {
    return httpResource(() => '/api/pairings/mine', { parse: OwnPairings.parse });
  }

  proposal(token: Signal<string>) {
    return httpResource(() => `/api/pairings/proposals/${encodeURIComponent(token())}`, { parse: OwnPairing.parse });
  }

  responses(query: Signal<{ cycleId: string; state: string; search: string }>) {
    return httpResource(
      () => {
        const { cycleId, state, search } = query();
        return { url: `/api/pairings/cycles/${cycleId}`, params: { search, ...(state ? { state } : {}) } };
      },
      { parse: PairingLines.parse },
    );
  }

  answer(pairingId: string, form: AnswerForm): Observable<OwnPairing> {
    return this.http.post<OwnPairing>(`/api/pairings/${pairingId}/answer`, form);
  }

  answerByLink(token: string, form: AnswerForm): Observable<OwnPairing> {
    return this.http.post<OwnPairing>(`/api/pairings/proposals/${encodeURIComponent(token)}/answer`, form);
  }
}
