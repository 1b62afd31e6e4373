import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A table behind a chart: heads, and rows whose first cell names the row. */
export interface ChartTable {
  readonly columns: readonly string[];
  readonly rows: readonly (readonly (string | number)[])[];
}

/** The frame of every chart: caption above, the drawing, a note, and the same numbers as a table. */
@Component({
  selector: 'app-chart-figure',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './chart-figure.html',
  styleUrl: './chart-figure.scss',
})
export class ChartFigure {
  readonly caption = input.required<string>();
  /** Keeps the caption for screen readers where a heading beside the chart says the same. */
  readonly captionHidden = input(false);
  readonly note = input('');
  readonly table = input.required<ChartTable>();
}
