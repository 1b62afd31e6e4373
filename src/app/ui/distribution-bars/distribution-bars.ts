import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { scaleLinear } from 'd3-scale';
import { ChartFigure, ChartTable } from '../chart-figure/chart-figure';

/** How many fall from `from` up to, but not including, `to`; null where too few to show. */
export interface DistributionBin {
  readonly from: number;
  readonly to: number;
  readonly count: number | null;
}

const HEIGHT = 150;

/** A histogram: how many pairings have which fit. */
@Component({
  selector: 'app-distribution-bars',
  imports: [ChartFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './distribution-bars.html',
  styleUrl: './distribution-bars.scss',
})
export class DistributionBars {
  readonly bins = input.required<readonly DistributionBin[]>();
  readonly caption = input.required<string>();
  readonly captionHidden = input(false);
  readonly xLabel = input('fit');
  readonly yLabel = input('pairings');
  readonly note = input('');

  protected readonly height = HEIGHT;
  protected readonly bars = computed(() => {
    const bins = this.bins();
    const most = Math.max(1, ...bins.map((bin) => bin.count ?? 0));
    const y = scaleLinear().domain([0, most]).range([HEIGHT, 18]);
    const step = 100 / Math.max(1, bins.length);
    return bins.map((bin, at) => ({
      ...bin,
      x: at * step + step * 0.06,
      width: step * 0.88,
      middle: (at + 0.5) * step,
      y: bin.count === null ? HEIGHT - 10 : y(bin.count),
    }));
  });
  /** Bins meet at these numbers: every lower edge, and the last upper one. */
  protected readonly edges = computed(() => {
    const bins = this.bins();
    const last = bins[bins.length - 1];
    const values = [...bins.map((bin) => bin.from), ...(last ? [last.to] : [])];
    return values.map((value, at) => ({
      value,
      x: (at * 100) / Math.max(1, bins.length),
      anchor: at === 0 ? 'start' : at === bins.length ? 'end' : 'middle',
    }));
  });
  protected readonly table = computed((): ChartTable => ({
    columns: [this.xLabel(), this.yLabel()],
    rows: this.bins().map((bin) => [`${bin.from} to ${bin.to}`, bin.count ?? 'hidden: too few']),
  }));
}
