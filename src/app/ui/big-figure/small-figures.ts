import { ChangeDetectionStrategy, Component, input } from '@angular/core';

export interface SmallFigure {
  readonly label: string;
  /** Already formatted: "71.4", "3.5 d". */
  readonly value: string | number;
}

/** Several lesser numbers side by side; a cell of a `.figures` row. */
@Component({
  selector: 'app-small-figures',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './small-figures.html',
  styleUrl: './small-figures.scss',
})
export class SmallFigures {
  readonly items = input.required<readonly SmallFigure[]>();
}
