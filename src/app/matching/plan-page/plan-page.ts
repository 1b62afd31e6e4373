import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import type { MatchingSettings } from '../../../../shared/matching/matching-contract';
import type { PlanPerson } from '../../../../shared/matching/runs-contract';
import { Notices } from '../../core/notices';
import { orEmpty } from '../../core/query-inputs';
import { BigFigure } from '../../ui/big-figure/big-figure';
import { SmallFigures } from '../../ui/big-figure/small-figures';
import { fitInWords } from '../../ui/format/fit-pipe';
import { counted } from '../../ui/format/plural-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { PlanAtAGlance } from '../../ui/plan-at-a-glance/plan-at-a-glance';
import { TradeOffCurve } from '../../ui/trade-off-curve/trade-off-curve';
import { MatchingClient } from '../matching-client';
import { LeftOutList } from './left-out-list';
import { PairInspector } from './pair-inspector';
import { PairingsTable } from './pairings-table';
import { found, inGroup, pairingRows, planGroups } from './plan-view';
import { RecordPanel } from './record-panel';
import { ShortagesPanel } from './shortages-panel';

const TABS = ['pairings', 'left-out', 'shortages', 'trade-off', 'record'] as const;
type Tab = (typeof TABS)[number];

/** A plan: figures, picture, pairings, who is left out and why, the trade-off, the proof. What is chosen is in the address. */
@Component({
  selector: 'app-plan-page',
  imports: [
    BigFigure,
    LeftOutList,
    LoadProblem,
    Loading,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PageHeader,
    PairInspector,
    PairingsTable,
    PlanAtAGlance,
    RecordPanel,
    RouterLink,
    ShortagesPanel,
    SmallFigures,
    TradeOffCurve,
  ],
  templateUrl: './plan-page.html',
  styleUrl: './plan-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanPage {
  readonly cycleId = input.required<string>();
  readonly runId = input.required<string>();
  readonly tab = input('', { transform: orEmpty });
  readonly mentee = input('', { transform: orEmpty });
  readonly group = input('', { transform: orEmpty });
  readonly find = input('', { transform: orEmpty });

  private readonly client = inject(MatchingClient);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  protected readonly resource = this.client.plan(this.runId);
  protected readonly plan = computed(() => (this.resource.hasValue() ? this.resource.value() : null));

  protected readonly groups = computed(() => {
    const plan = this.plan();
    return plan ? planGroups(plan) : [];
  });
  protected readonly shownPerson = computed(() => {
    const members = inGroup(this.groups(), this.group() || null);
    const text = this.find();
    return (person: PlanPerson): boolean =>
      (members === null || members.has(person.applicationId)) && (text === '' || found(person, text));
  });
  private readonly allRows = computed(() => {
    const plan = this.plan();
    return plan ? pairingRows(plan) : [];
  });
  protected readonly rows = computed(() => {
    const members = inGroup(this.groups(), this.group() || null);
    const text = this.find();
    return this.allRows().filter(
      (row) =>
        (members === null || members.has(row.pairing.mentee)) &&
        (text === '' || found(row.mentee, text) || found(row.mentor, text)),
    );
  });
  protected readonly tabs = computed(() => {
    const report = this.plan()?.report;
    if (!report) return [];
    return [
      { tab: 'pairings' as const, label: `Pairings ${report.paired}` },
      { tab: 'left-out' as const, label: `Left out ${report.leftOut.length}` },
      { tab: 'shortages' as const, label: `Shortages ${report.shortages.length}` },
      { tab: 'trade-off' as const, label: 'Trade-off' },
      { tab: 'record' as const, label: 'Record and proof' },
    ];
  });
  protected readonly here = computed((): Tab => TABS.find((tab) => tab === this.tab()) ?? 'pairings');
  protected readonly subtitle = computed(() => {
    const report = this.plan()?.report;
    if (!report) return '';
    const seconds = Object.values(report.record.timings).reduce((sum, each) => sum + each, 0) / 1000;
    return [
      counted(report.mentees, 'mentee', 'mentees'),
      `${counted(report.places, 'place', 'places')} at ${counted(report.mentors, 'mentor', 'mentors')}`,
      counted(report.eligiblePairs, 'eligible pair', 'eligible pairs'),
      `worked out in ${seconds < 10 ? seconds.toFixed(2) : Math.round(seconds)} s`,
    ].join(' · ');
  });
  protected readonly leftOutDetail = computed(() => {
    const shortages = this.plan()?.report.shortages ?? [];
    if (shortages.length === 0) return 'nobody for want of places';
    const named = shortages
      .slice(0, 3)
      .map(
        (view) =>
          `${view.inCommon || (view.mentors.length === 0 ? 'no eligible mentor' : 'few mentors')} ${view.short}`,
      );
    return `${counted(shortages.length, 'shortage', 'shortages')}: ${named.join(', ')}`;
  });
  protected readonly smallFigures = computed(() => {
    const report = this.plan()?.report;
    if (!report) return [];
    return [
      { label: 'Mean fit', value: fitInWords(report.meanFit) },
      { label: 'Weakest', value: fitInWords(report.weakestFit) },
      ...(report.steady === null ? [] : [{ label: 'Steady', value: report.steady }]),
    ];
  });
  protected readonly curve = computed(() =>
    (this.plan()?.report.tradeOff ?? [])
      .filter((point) => point.pairs > 0)
      .map((point) => ({ paired: point.pairs, meanFit: point.totalFit / point.pairs })),
  );

  protected go(queryParams: Record<string, string | null>): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }

  protected type(event: Event): void {
    this.go({ find: (event.target as HTMLInputElement).value || null });
  }

  protected open(mentee: string): void {
    this.go({ mentee });
  }

  protected showShortage(position: number): void {
    void this.router.navigate([], {
      queryParams: { tab: 'shortages' },
      queryParamsHandling: 'merge',
      fragment: `shortage-${position}`,
    });
  }

  protected runAgain(): void {
    this.start(null);
  }

  /** A trial: the cycle's settings stay as they are. */
  protected tryWithout(rule: string): void {
    const settings = this.plan()?.report.record.settings;
    if (!settings) return;
    const trial: MatchingSettings = {
      ...settings,
      rules: settings.rules.map((each) => (each.rule === rule ? { ...each, on: false } : each)),
    };
    this.start(trial);
  }

  private start(settings: MatchingSettings | null): void {
    this.client.startRun(this.cycleId(), settings).subscribe({
      next: () => void this.router.navigate(['/cycles', this.cycleId(), 'matching']),
      error: (error: unknown) => this.notices.tell(error),
    });
  }

  protected print(): void {
    globalThis.print();
  }
}
