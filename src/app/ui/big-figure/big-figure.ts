import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** One of the two numbers that matter, at arm's length; a cell of a `.figures` row. More may be projected below. */
@Component({
  selector: 'app-big-figure',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './big-figure.html',
  styleUrl: './big-figure.scss',
  host: { '[class]': 'tone()' },
})
export class BigFigure {
  /** Already formatted: "145", "93 %". */
  readonly value = input.required<string | number>();
  readonly label = input.required<string>();
  readonly detail = input('');
  readonly tone = input<'indigo' | 'madder' | 'woad' | 'lichen' | 'ink'>('indigo');
}
