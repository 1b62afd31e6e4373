import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { scaleLinear } from 'd3-scale';
import { ChartFigure, ChartTable } from '../chart-figure/chart-figure';

/** Seekers and places of one group; null where the group is too small to show. */
export interface DivergingRow {
  readonly label: string;
  readonly left: number | null;
  readonly right: number | null;
}

const HIDDEN = 'hidden: too few people';

/** Two counts a group, back to back: mentees who seek to the left (round), places offered to the right (square). */
@Component({
  selector: 'app-diverging-bars',
  imports: [ChartFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './diverging-bars.html',
  styleUrl: './diverging-bars.scss',
})
export class DivergingBars {
  readonly rows = input.required<readonly DivergingRow[]>();
  readonly caption = input.required<string>();
  readonly captionHidden = input(false);
  readonly leftLabel = input('mentees who seek');
  readonly rightLabel = input('places offered');
  readonly note = input('');

  private readonly scale = computed(() => {
    const most = Math.max(1, ...this.rows().flatMap((row) => [row.left ?? 0, row.right ?? 0]));
    // in per cent of one half, leaving room for the number beside the longest bar
    return scaleLinear().domain([0, most]).range([0, 84]);
  });
  protected readonly bars = computed(() =>
    this.rows().map((row) => ({
      ...row,
      hidden: row.left === null || row.right === null,
      leftWidth: this.scale()(row.left ?? 0),
      rightWidth: this.scale()(row.right ?? 0),
      short: row.left !== null && row.right !== null && row.left > row.right,
    })),
  );
  protected readonly table = computed((): ChartTable => ({
    columns: ['Group', this.leftLabel(), this.rightLabel()],
    rows: this.rows().map((row) => [row.label, row.left ?? HIDDEN, row.right ?? HIDDEN]),
  }));
  protected readonly hiddenInWords = HIDDEN;
}
