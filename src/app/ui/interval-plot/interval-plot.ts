import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { scaleLinear } from 'd3-scale';
import { ChartFigure, ChartTable } from '../chart-figure/chart-figure';
import { shareInWords } from '../format/share-pipe';

/** A share with its 95 % interval, all 0 to 1; or a group that is too small to show. */
export type IntervalRow =
  | {
      readonly kind: 'shown';
      readonly label: string;
      readonly count: number;
      readonly of: number;
      readonly share: number;
      readonly low: number;
      readonly high: number;
    }
  | { readonly kind: 'hidden'; readonly label: string; readonly because: string };

/** A dot and its 95 % line for each group, with the counts beside it. */
@Component({
  selector: 'app-interval-plot',
  imports: [ChartFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './interval-plot.html',
  styleUrl: './interval-plot.scss',
})
export class IntervalPlot {
  readonly rows = input.required<readonly IntervalRow[]>();
  readonly caption = input.required<string>();
  readonly captionHidden = input(false);
  readonly note = input('Lines are 95 % intervals. Overlapping lines are no evidence of a difference.');

  // starts at a round share below the lowest line, and always ends at 100 %
  private readonly from = computed(() => {
    const lows = this.rows().map((row) => (row.kind === 'shown' ? row.low : 1));
    return Math.min(0.8, Math.floor(Math.min(1, ...lows) * 5) / 5);
  });
  private readonly scale = computed(() => scaleLinear().domain([this.from(), 1]).range([2, 97]));
  protected readonly ticks = computed(() =>
    this.scale()
      .ticks(4)
      .map((tick) => ({ x: this.scale()(tick), text: shareInWords(tick) })),
  );
  protected readonly lines = computed(() =>
    this.rows().map((row) =>
      row.kind === 'hidden'
        ? row
        : { ...row, x: this.scale()(row.share), x1: this.scale()(row.low), x2: this.scale()(row.high) },
    ),
  );
  protected readonly table = computed((): ChartTable => ({
    columns: ['Group', 'Count', 'Share', '95 % interval'],
    rows: this.rows().map((row) =>
      row.kind === 'hidden'
        ? [row.label, row.because, '–', '–']
        : [
            row.label,
            `${row.count} of ${row.of}`,
            shareInWords(row.share),
            `${shareInWords(row.low)} to ${shareInWords(row.high)}`,
          ],
    ),
  }));
}
