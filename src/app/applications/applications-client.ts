import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  type AdmissionDecision,
  type AdmissionOutcome,
  ApplicantDetail,
  ApplicantsPage,
  type ApplicantsQuery,
  ApplicationDesk,
  type ApplicationForm,
  type ImportPreview,
  type ImportRequest,
  type ImportResult,
  ListedMentors,
  type OwnApplication,
  OwnApplications,
} from '../../../shared/applications/applications-contract';
import { TagList } from '../../../shared/tags/tags-contract';

const inCycle = (cycleId: string, rest: string): string => `/api/applications/cycles/${cycleId}/${rest}`;

/** Every HTTP call of applications, with the vocabulary that filters choose from. */
@Injectable({ providedIn: 'root' })
export class ApplicationsClient {
  private readonly http = inject(HttpClient);

  mine() {
    return httpResource(() => '/api/applications/mine', { parse: OwnApplications.parse });
  }

  desk(cycleId: Signal<string>) {
    return httpResource(() => inCycle(cycleId(), 'mine'), { parse: ApplicationDesk.parse });
  }

  listedMentors(cycleId: Signal<string>) {
    return httpResource(() => inCycle(cycleId(), 'listed-mentors'), { parse: ListedMentors.parse });
  }

  /** `version` of what is changed; 0 where nothing was sent yet. */
  apply(cycleId: string, form: ApplicationForm, version: number): Observable<OwnApplication> {
    return this.http.put<OwnApplication>(inCycle(cycleId, form.side), form, {
      headers: { 'If-Match': `"${version}"` },
    });
  }

  withdraw(applicationId: string): Observable<OwnApplication> {
    return this.http.post<OwnApplication>(`/api/applications/${applicationId}/withdraw`, {});
  }

  applicants(cycleId: Signal<string>, query: Signal<ApplicantsQuery>) {
    return httpResource(() => ({ url: inCycle(cycleId(), 'applicants'), params: parametersOf(query()) }), {
      parse: ApplicantsPage.parse,
    });
  }

  /** Where the browser fetches the same applicants as a file. */
  exportAddress(cycleId: string, query: ApplicantsQuery): string {
    return `${inCycle(cycleId, 'applicants.csv')}?${new URLSearchParams(parametersOf(query)).toString()}`;
  }

  applicant(cycleId: string, applicationId: string) {
    return httpResource(() => inCycle(cycleId, `applicants/${applicationId}`), { parse: ApplicantDetail.parse });
  }

  decide(cycleId: string, decision: AdmissionDecision): Observable<AdmissionOutcome> {
    return this.http.post<AdmissionOutcome>(inCycle(cycleId, 'decisions'), decision);
  }

  previewImport(cycleId: string, file: ImportRequest): Observable<ImportPreview> {
    return this.http.post<ImportPreview>(inCycle(cycleId, 'import/preview'), file);
  }

  importFile(cycleId: string, file: ImportRequest): Observable<ImportResult> {
    return this.http.post<ImportResult>(inCycle(cycleId, 'import'), file);
  }

  tags() {
    return httpResource(() => '/api/tags', { parse: TagList.parse });
  }
}

function parametersOf(query: ApplicantsQuery): Record<string, string> {
  const entries = Object.entries(query).filter(([, value]) => value !== undefined && value !== '');
  return Object.fromEntries(entries.map(([name, value]) => [name, String(value)]));
}
