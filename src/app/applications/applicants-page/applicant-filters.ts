import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { debounceTime, Subject } from 'rxjs';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import {
  ApplicationSide,
  ApplicationStatus,
  type ApplicantsQuery,
  STATUS_LABEL,
} from '../../../../shared/applications/applications-contract';
import { Region, REGION_LABEL } from '../../../../shared/profiles/profiles-contract';
import type { Tag } from '../../../../shared/tags/tags-contract';
import { TagChips } from '../../ui/tag-chips/tag-chips';

export type Filters = Pick<ApplicantsQuery, 'search' | 'side' | 'status' | 'region' | 'tag' | 'flagged'>;

const SIDE_LABEL: Record<ApplicationSide, string> = { mentor: 'Mentors', mentee: 'Mentees' };

/** Search and filters of the applicants table; those that are set stand below as chips that can be removed. */
@Component({
  selector: 'app-applicant-filters',
  imports: [MatFormFieldModule, MatInput, MatSelectModule, TagChips],
  templateUrl: './applicant-filters.html',
  styleUrl: './applicant-filters.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicantFilters {
  readonly filters = input.required<Filters>();
  readonly tags = input.required<readonly Tag[]>();
  /** What changes in the address; null removes. */
  readonly changed = output<Partial<Record<keyof Filters, string | null>>>();

  private readonly typed = new Subject<string>();
  protected readonly sides = ApplicationSide.options.map((key) => ({ key, label: SIDE_LABEL[key] }));
  protected readonly statuses = ApplicationStatus.options
    .filter((key) => key !== 'draft')
    .map((key) => ({ key, label: STATUS_LABEL[key] }));
  protected readonly regions = Region.options.map((key) => ({ key, label: REGION_LABEL[key] }));
  protected readonly chips = computed(() => {
    const { search, side, status, region, tag, flagged } = this.filters();
    const label = this.tags().find((each) => each.id === tag)?.label;
    return [
      ...(search ? [{ key: 'search', label: `“${search}”` }] : []),
      ...(side ? [{ key: 'side', label: SIDE_LABEL[side] }] : []),
      ...(status ? [{ key: 'status', label: STATUS_LABEL[status] }] : []),
      ...(region ? [{ key: 'region', label: REGION_LABEL[region] }] : []),
      ...(tag ? [{ key: 'tag', label: label ?? 'Practice area or topic' }] : []),
      ...(flagged ? [{ key: 'flagged', label: 'With flags' }] : []),
    ];
  });

  constructor() {
    this.typed
      .pipe(debounceTime(250), takeUntilDestroyed())
      .subscribe((search) => this.changed.emit({ search: search || null }));
  }

  protected find(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value.trim());
  }

  protected set(name: keyof Filters, value: string | undefined): void {
    this.changed.emit({ [name]: value ?? null });
  }

  protected remove(name: string): void {
    this.changed.emit({ [name]: null });
  }
}
