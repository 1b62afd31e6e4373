import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import { map, type Observable } from 'rxjs';
import { CycleSettings, SettingsHistory } from '../../../../shared/cycles/cycles-contract';
import type { RuleEffects } from '../../../../shared/matching/effects-contract';
import type { MatchingSettings } from '../../../../shared/matching/matching-contract';

/** HTTP calls of the rules and criteria of one cycle. */
@Injectable({ providedIn: 'root' })
export class RulesClient {
  private readonly http = inject(HttpClient);

  settings(cycleId: Signal<string>) {
    return httpResource(() => `/api/cycles/${cycleId()}/settings`, { parse: CycleSettings.parse });
  }

  history(cycleId: Signal<string>) {
    return httpResource(() => `/api/cycles/${cycleId()}/settings/history`, { parse: SettingsHistory.parse });
  }

  save(cycleId: string, settings: MatchingSettings, version: number): Observable<CycleSettings> {
    return this.http
      .put(`/api/cycles/${cycleId}/settings`, settings, { headers: { 'if-match': `"${version}"` } })
      .pipe(map((saved) => CycleSettings.parse(saved)));
  }

  effects(cycleId: string, settings: MatchingSettings): Observable<RuleEffects> {
    return this.http.post<RuleEffects>(`/api/matching/cycles/${cycleId}/effects`, { settings });
  }
}
