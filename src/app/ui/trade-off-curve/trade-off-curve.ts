import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { scaleLinear } from 'd3-scale';
import { curveMonotoneX, line } from 'd3-shape';
import { ChartFigure, ChartTable } from '../chart-figure/chart-figure';
import { fitInWords } from '../format/fit-pipe';

/** The best mean fit (0 to 10000) that any plan with that many paired can have. */
export interface TradeOffPoint {
  readonly paired: number;
  readonly meanFit: number;
}

const HEIGHT = 190;
const TOP = 12;

/** Mean fit against the number paired: what pairing fewer would gain. */
@Component({
  selector: 'app-trade-off-curve',
  imports: [ChartFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trade-off-curve.html',
  styleUrl: './trade-off-curve.scss',
})
export class TradeOffCurve {
  readonly points = input.required<readonly TradeOffPoint[]>();
  /** The number paired of the plan that is looked at. */
  readonly current = input<number | null>(null);
  readonly caption = input('Mean fit against the number paired');
  readonly captionHidden = input(false);
  readonly note = input('Pair fewer, and those paired fit better.');

  protected readonly height = HEIGHT;
  protected readonly top = TOP;

  private readonly sorted = computed(() => [...this.points()].sort((a, b) => a.paired - b.paired));
  // x in per cent of the plotting area, y in CSS pixels
  private readonly x = computed(() => {
    const points = this.sorted();
    const first = points[0]?.paired ?? 0;
    const last = points[points.length - 1]?.paired ?? 1;
    return scaleLinear()
      .domain(first === last ? [first - 1, last + 1] : [first, last])
      .range([2, 97]);
  });
  private readonly y = computed(() => {
    const fits = this.sorted().map((point) => point.meanFit / 100);
    const low = Math.min(...fits, 100);
    const high = Math.max(...fits, 0);
    const span = Math.max(2, high - low);
    // more air below than above: the words of the current point stand there
    return scaleLinear()
      .domain(fits.length > 0 ? [low - span * 0.3, high + span * 0.1] : [0, 100])
      .nice(4)
      .range([HEIGHT, TOP]);
  });

  /** The curve in a box of 100 × HEIGHT that is stretched to the figure's width. */
  protected readonly path = computed(() => {
    const x = this.x();
    const y = this.y();
    const draw = line<TradeOffPoint>()
      .x((point) => x(point.paired))
      .y((point) => y(point.meanFit / 100))
      .curve(curveMonotoneX);
    return draw(this.sorted()) ?? '';
  });
  protected readonly xTicks = computed(() =>
    this.x()
      .ticks(4)
      .filter(Number.isInteger)
      .map((tick) => ({ at: this.x()(tick), text: String(tick) })),
  );
  protected readonly yTicks = computed(() =>
    this.y()
      .ticks(4)
      .map((tick) => ({ at: this.y()(tick), text: String(tick) })),
  );
  protected readonly here = computed(() => {
    const point = this.sorted().find((each) => each.paired === this.current());
    if (!point) return null;
    const x = this.x()(point.paired);
    return {
      x,
      y: this.y()(point.meanFit / 100),
      anchor: x > 60 ? 'end' : x < 30 ? 'start' : 'middle',
      text: `this plan: ${point.paired}, mean ${fitInWords(point.meanFit)}`,
    };
  });
  protected readonly table = computed((): ChartTable => ({
    columns: ['Mentees paired', 'Mean fit'],
    rows: this.sorted().map((point) => [
      point.paired === this.current() ? `${point.paired} (this plan)` : point.paired,
      fitInWords(point.meanFit),
    ]),
  }));
}
