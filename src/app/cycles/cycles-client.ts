import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  Cycle,
  type CycleDraft,
  CycleList,
  type NewCycle,
  type PhaseMove,
} from '../../../shared/cycles/cycles-contract';

/** Every HTTP call of cycles. */
@Injectable({ providedIn: 'root' })
export class CyclesClient {
  private readonly http = inject(HttpClient);

  cycles() {
    return httpResource(() => '/api/cycles', { parse: CycleList.parse });
  }

  cycle(cycleId: Signal<string | null>) {
    return httpResource(
      () => {
        const id = cycleId();
        return id ? `/api/cycles/${id}` : undefined;
      },
      { parse: Cycle.parse },
    );
  }

  create(cycle: NewCycle): Observable<Cycle> {
    return this.http.post<Cycle>('/api/cycles', cycle);
  }

  edit(cycleId: string, cycle: CycleDraft, version: number): Observable<Cycle> {
    return this.http.put<Cycle>(`/api/cycles/${cycleId}`, cycle, { headers: { 'if-match': `"${version}"` } });
  }

  move(cycleId: string, move: PhaseMove): Observable<Cycle> {
    return this.http.post<Cycle>(`/api/cycles/${cycleId}/phase`, move);
  }
}
