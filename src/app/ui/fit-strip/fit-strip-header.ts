import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FitCriterion, layOutStrip, stripLength } from './strip-layout';

const LETTER_WIDTH = 6.6;

/** Names the cells of the fit strips below it; each name is cut to its cell and whole in the text alternative. */
@Component({
  selector: 'app-fit-strip-header',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fit-strip-header.html',
  styleUrl: './fit-strip-header.scss',
})
export class FitStripHeader {
  readonly criteria = input.required<readonly Pick<FitCriterion, 'label' | 'short' | 'weight'>[]>();
  readonly width = input(160);

  private readonly placed = computed(() =>
    layOutStrip(
      this.criteria().map((criterion) => criterion.weight),
      this.width(),
    ),
  );
  protected readonly length = computed(() => stripLength(this.placed()));
  protected readonly names = computed(() =>
    this.placed().map((cell, at) => {
      const criterion = this.criteria()[at];
      const name = criterion?.short ?? criterion?.label ?? '';
      return {
        x: cell.x,
        label: criterion?.label ?? '',
        text: name.slice(0, Math.max(1, Math.floor((cell.width - 3) / LETTER_WIDTH))).trim(),
      };
    }),
  );
  protected readonly inWords = computed(() => {
    const labels = this.criteria().map((criterion) => criterion.label);
    return `Fit by criterion: ${labels.join(', ')}`;
  });
}
