import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FitCriterion, weightShares } from '../fit-strip/strip-layout';

/** The same numbers as the fit strip, spelled out: criterion, bar, score of 100, weight. */
@Component({
  selector: 'app-fit-bars',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fit-bars.html',
  styleUrl: './fit-bars.scss',
})
export class FitBars {
  readonly criteria = input.required<readonly FitCriterion[]>();

  protected readonly rows = computed(() => {
    const shares = weightShares(this.criteria());
    return this.criteria().map((criterion, at) => ({
      label: criterion.label,
      missing: criterion.missing === true,
      score: Math.round(criterion.score * 100),
      weight: Math.round((shares[at] ?? 0) * 100),
    }));
  });
}
