import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FitCriterion, layOutStrip, stripLength, weightShares } from './strip-layout';

const HEIGHT = 18;

/** How a pairing's fit is made up: one cell per criterion, as wide as its weight, filled as high as its score. */
@Component({
  selector: 'app-fit-strip',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fit-strip.html',
  styleUrl: './fit-strip.scss',
})
export class FitStrip {
  readonly criteria = input.required<readonly FitCriterion[]>();
  /** Length in CSS pixels; the same for the header, so that the cells line up. */
  readonly width = input(160);

  protected readonly height = HEIGHT;
  protected readonly placed = computed(() =>
    layOutStrip(
      this.criteria().map((criterion) => criterion.weight),
      this.width(),
    ),
  );
  protected readonly length = computed(() => stripLength(this.placed()));
  protected readonly cells = computed(() =>
    this.placed().map((cell, at) => {
      const criterion = this.criteria()[at];
      const score = Math.min(1, Math.max(0, criterion?.score ?? 0));
      // a score of nothing still shows a foot, so that "nothing" and "no cell" differ
      const fill = Math.max(1.5, score * HEIGHT);
      return { ...cell, fill, y: HEIGHT - fill, missing: criterion?.missing === true, weak: score < 0.5 };
    }),
  );
  protected readonly inWords = computed(() => stripInWords(this.criteria()));
}

/** The strip as text: "Practice areas 92 of 100, weight 28 %; Topics 60 of 100 …". */
export function stripInWords(criteria: readonly FitCriterion[]): string {
  const shares = weightShares(criteria);
  return criteria
    .map((criterion, at) => {
      const score = criterion.missing ? 'not stated, counted as 50' : `${Math.round(criterion.score * 100)} of 100`;
      return `${criterion.label} ${score}, weight ${Math.round((shares[at] ?? 0) * 100)} %`;
    })
    .join('; ');
}
