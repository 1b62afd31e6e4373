import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSliderModule } from '@angular/material/slider';
import { CRITERIA } from '../../../../shared/matching/catalogue';
import type { CriterionSetting } from '../../../../shared/matching/matching-contract';

const PARAMETERS: Partial<
  Record<CriterionSetting['criterion'], readonly { key: string; label: string; unit: string }[]>
> = {
  'weekly-overlap': [{ key: 'wanted', label: 'Wanted', unit: 'times' }],
  years: [
    { key: 'from', label: 'From', unit: 'years' },
    { key: 'to', label: 'To', unit: 'years' },
  ],
};

/** The criteria: a weight each, shown as the share of the whole. */
@Component({
  selector: 'app-criterion-list',
  imports: [MatFormFieldModule, MatInput, MatSliderModule],
  templateUrl: './criterion-list.html',
  styleUrl: './rules-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CriterionList {
  readonly criteria = input.required<readonly CriterionSetting[]>();
  readonly faults = input.required<ReadonlyMap<string, string>>();
  readonly locked = input(false);
  readonly changed = output<CriterionSetting>();

  protected readonly total = computed(() => this.criteria().reduce((sum, each) => sum + (each.weight || 0), 0));
  protected readonly entries = computed(() =>
    this.criteria().map((criterion, at) => ({
      criterion,
      words: CRITERIA[criterion.criterion],
      share: this.total() > 0 ? Math.round((100 * criterion.weight) / this.total()) : 0,
      fault: this.faults().get(`criteria.${at}.weight`) ?? '',
      fields: (PARAMETERS[criterion.criterion] ?? []).map((parameter) => ({
        ...parameter,
        value: String((criterion as unknown as Record<string, number>)[parameter.key] ?? ''),
        fault: this.faults().get(`criteria.${at}.${parameter.key}`) ?? '',
      })),
    })),
  );

  protected weigh(criterion: CriterionSetting, weight: number): void {
    this.changed.emit({ ...criterion, weight });
  }

  protected type(criterion: CriterionSetting, key: string, event: Event): void {
    const text = (event.target as HTMLInputElement).value.trim();
    this.changed.emit({ ...criterion, [key]: Number(text || 'NaN') } as CriterionSetting);
  }
}
