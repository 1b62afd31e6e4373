import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatSliderModule } from '@angular/material/slider';
import { activeCriteria, CRITERIA } from '../../../../shared/matching/catalogue';
import type { CriterionSetting } from '../../../../shared/matching/matching-contract';
import { shareInWords } from '../../ui/format/share-pipe';
import { NumberField } from './number-field';

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
  imports: [MatSliderModule, NumberField],
  templateUrl: './criterion-list.html',
  styleUrl: './rules-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CriterionList {
  readonly criteria = input.required<readonly CriterionSetting[]>();
  readonly faults = input.required<ReadonlyMap<string, string>>();
  readonly locked = input(false);
  readonly changed = output<CriterionSetting>();

  protected readonly entries = computed(() => {
    const active = activeCriteria(this.criteria());
    return this.criteria().map((criterion, at) => {
      const share = active.find((each) => each.criterion === criterion.criterion)?.share;
      return {
        criterion,
        words: CRITERIA[criterion.criterion],
        share: share === undefined ? 'left out' : `${shareInWords(share)} of the fit`,
        fault: this.faults().get(`criteria.${at}.weight`) ?? '',
        fields: (PARAMETERS[criterion.criterion] ?? []).map((parameter) => ({
          ...parameter,
          value: (criterion as unknown as Record<string, number>)[parameter.key] ?? Number.NaN,
          fault: this.faults().get(`criteria.${at}.${parameter.key}`) ?? '',
        })),
      };
    });
  });

  protected weigh(criterion: CriterionSetting, weight: number): void {
    this.changed.emit({ ...criterion, weight });
  }

  protected type(criterion: CriterionSetting, key: string, value: number | null): void {
    this.changed.emit({ ...criterion, [key]: value } as CriterionSetting);
  }
}
