import { ChangeDetectionStrategy, Component, computed, input, model, output } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import type { ApplicantLine } from '../../../../shared/applications/applications-contract';
import { CAREER_STAGE_LABEL, REGION_LABEL } from '../../../../shared/profiles/profiles-contract';
import { MomentPipe } from '../../core/moments';
import { ShareBar } from '../../ui/share-bar/share-bar';
import { StatusBadge } from '../status-badge';
import { type ApplicantColumn, type ApplicantSort, COLUMN_LABEL, SORT_OF, TableLook } from './table-look';

/** One page of applicants: sorted by its heads, chosen by its check boxes, opened by its names. */
@Component({
  selector: 'app-applicants-table',
  imports: [MatCheckbox, MomentPipe, ShareBar, StatusBadge],
  templateUrl: './applicants-table.html',
  styleUrl: './applicants-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicantsTable {
  readonly lines = input.required<readonly ApplicantLine[]>();
  readonly look = input.required<TableLook>();
  readonly sort = input.required<ApplicantSort>();
  readonly direction = input.required<'asc' | 'desc'>();
  readonly chosen = model.required<ReadonlyMap<string, ApplicantLine>>();
  readonly sorted = output<{ sort: ApplicantSort; direction: 'asc' | 'desc' }>();
  readonly opened = output<ApplicantLine>();

  protected readonly regionLabel = REGION_LABEL;
  protected readonly stageLabel = CAREER_STAGE_LABEL;
  protected readonly heads = computed(() =>
    this.look()
      .columns()
      .map((key: ApplicantColumn) => ({
        key,
        label: COLUMN_LABEL[key],
        sort: SORT_OF[key],
        number: key === 'places' || key === 'years',
      })),
  );
  protected readonly all = computed(() => this.lines().every((line) => this.chosen().has(line.id)));
  protected readonly some = computed(() => this.lines().some((line) => this.chosen().has(line.id)));

  protected by(sort: ApplicantSort): void {
    const turned = this.sort() === sort && this.direction() === 'asc';
    this.sorted.emit({ sort, direction: turned ? 'desc' : 'asc' });
  }

  protected ariaSort(sort: ApplicantSort): 'ascending' | 'descending' | 'none' {
    if (this.sort() !== sort) return 'none';
    return this.direction() === 'asc' ? 'ascending' : 'descending';
  }

  protected arrow(sort: ApplicantSort): string {
    if (this.sort() !== sort) return '';
    return this.direction() === 'asc' ? '↑' : '↓';
  }

  protected choose(line: ApplicantLine, chosen: boolean): void {
    this.change([line], chosen);
  }

  protected chooseAll(chosen: boolean): void {
    this.change(this.lines(), chosen);
  }

  private change(lines: readonly ApplicantLine[], chosen: boolean): void {
    const next = new Map(this.chosen());
    for (const line of lines) {
      if (chosen) next.set(line.id, line);
      else next.delete(line.id);
    }
    this.chosen.set(next);
  }
}
