import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { Observable } from 'rxjs';
import { Forecast } from '../../../shared/matching/effects-contract';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import {
  Alternatives,
  DecisionPrice,
  PairDecisions,
  type PairDecisionForm,
  PairReasons,
  Plan,
  PlanComparison,
  type ProofArrays,
  type PublishOutcome,
  PublishReview,
  type RunLine,
  RunList,
} from '../../../shared/matching/runs-contract';

/** A mentee and a mentor of a run, by application. */
export interface PairOfRun {
  runId: string;
  mentee: string;
  mentor: string;
}

/** Every HTTP call of matching. */
@Injectable({ providedIn: 'root' })
export class MatchingClient {
  private readonly http = inject(HttpClient);

  runs(cycleId: Signal<string>) {
    return httpResource(() => `/api/matching/cycles/${cycleId()}/runs`, { parse: RunList.parse });
  }

  decisions(cycleId: Signal<string>) {
    return httpResource(() => `/api/matching/cycles/${cycleId()}/decisions`, { parse: PairDecisions.parse });
  }

  forecast(cycleId: Signal<string>) {
    return httpResource(() => `/api/matching/cycles/${cycleId()}/forecast`, { parse: Forecast.parse });
  }

  plan(runId: Signal<string>) {
    return httpResource(() => `/api/matching/runs/${runId()}/plan`, { parse: Plan.parse });
  }

  alternatives(of: Signal<{ runId: string; mentee: string } | null>) {
    return httpResource(
      () => {
        const asked = of();
        return asked ? `/api/matching/runs/${asked.runId}/mentees/${asked.mentee}/alternatives` : undefined;
      },
      { parse: Alternatives.parse },
    );
  }

  reasons(of: Signal<PairOfRun | null>) {
    return httpResource(
      () => {
        const pair = of();
        return pair ? `/api/matching/runs/${pair.runId}/pairs/${pair.mentee}/${pair.mentor}` : undefined;
      },
      { parse: PairReasons.parse },
    );
  }

  price(of: Signal<(PairOfRun & { kind: 'lock' | 'bar' }) | null>) {
    return httpResource(
      () => {
        const pair = of();
        return pair
          ? {
              url: `/api/matching/runs/${pair.runId}/pairs/${pair.mentee}/${pair.mentor}/price`,
              params: { kind: pair.kind },
            }
          : undefined;
      },
      { parse: DecisionPrice.parse },
    );
  }

  comparison(runId: Signal<string>, otherId: Signal<string>) {
    return httpResource(() => `/api/matching/runs/${runId()}/compare/${otherId()}`, { parse: PlanComparison.parse });
  }

  review(runId: Signal<string>) {
    return httpResource(() => `/api/matching/runs/${runId()}/review`, { parse: PublishReview.parse });
  }

  startRun(cycleId: string, settings: MatchingSettings | null = null): Observable<RunLine> {
    return this.http.post<RunLine>(`/api/matching/cycles/${cycleId}/runs`, { settings });
  }

  cancelRun(runId: string): Observable<RunLine> {
    return this.http.post<RunLine>(`/api/matching/runs/${runId}/cancel`, {});
  }

  decide(cycleId: string, form: PairDecisionForm): Observable<PairDecisions> {
    return this.http.put<PairDecisions>(`/api/matching/cycles/${cycleId}/decisions`, form);
  }

  proof(runId: string): Observable<ProofArrays> {
    return this.http.get<ProofArrays>(`/api/matching/runs/${runId}/proof`);
  }

  approve(runId: string): Observable<PublishReview> {
    return this.http.post<PublishReview>(`/api/matching/runs/${runId}/approve`, {});
  }

  publish(runId: string, version: number, acknowledgedChanges: boolean): Observable<PublishOutcome> {
    return this.http.post<PublishOutcome>(
      `/api/matching/runs/${runId}/publish`,
      { acknowledgedChanges },
      { headers: { 'if-match': `"${version}"` } },
    );
  }
}
