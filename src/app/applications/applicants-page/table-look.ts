import { signal } from '@angular/core';
import { z } from 'zod';
import type { ApplicantsQuery } from '../../../../shared/applications/applications-contract';
import { keep, readKept } from '../kept';

export const APPLICANT_COLUMNS = [
  'side',
  'status',
  'places',
  'employer',
  'region',
  'stage',
  'years',
  'areas',
  'completeness',
  'flags',
  'submitted',
] as const;
export type ApplicantColumn = (typeof APPLICANT_COLUMNS)[number];
export type ApplicantSort = NonNullable<ApplicantsQuery['sort']>;

export const COLUMN_LABEL: Record<ApplicantColumn, string> = {
  side: 'Side',
  status: 'Status',
  places: 'Places',
  employer: 'Employer',
  region: 'Region',
  stage: 'Career stage',
  years: 'Years',
  areas: 'Practice areas',
  completeness: 'Completeness',
  flags: 'Flags',
  submitted: 'Sent',
};
/** Columns by which the server sorts. */
export const SORT_OF: Partial<Record<ApplicantColumn, ApplicantSort>> = {
  side: 'side',
  status: 'status',
  employer: 'employer',
  region: 'region',
  years: 'years',
  completeness: 'completeness',
  submitted: 'submitted',
};

const KEY = 'heddle-applicants-table';
const Look = z.object({ columns: z.array(z.enum(APPLICANT_COLUMNS)), compact: z.boolean() });
const DEFAULT: z.output<typeof Look> = {
  columns: ['side', 'status', 'places', 'employer', 'region', 'areas', 'completeness', 'flags'],
  compact: false,
};

/** Which columns a coordinator sees, and how close the rows stand; kept in the browser. */
export class TableLook {
  private readonly look = signal(readKept(KEY, Look) ?? DEFAULT);
  readonly columns = () => this.look().columns;
  readonly compact = () => this.look().compact;

  shows(column: ApplicantColumn): boolean {
    return this.look().columns.includes(column);
  }

  choose(chosen: readonly ApplicantColumn[]): void {
    this.change({ columns: APPLICANT_COLUMNS.filter((column) => chosen.includes(column)) });
  }

  pack(compact: boolean): void {
    this.change({ compact });
  }

  private change(change: Partial<z.output<typeof Look>>): void {
    this.look.update((look) => ({ ...look, ...change }));
    keep(KEY, this.look());
  }
}
