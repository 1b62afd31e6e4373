import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterLink, RouterOutlet } from '@angular/router';
import { filter, map } from 'rxjs';
import { PHASE_LABEL } from '../../../../shared/cycles/cycles-contract';
import { type Station, stationsOf } from '../../../../shared/cycles/phase-rules';
import { CycleStore } from '../../core/cycle-store';
import { problemOf } from '../../core/problems';
import { SessionStore } from '../../core/session-store';
import { CycleRibbon, type RibbonStation } from '../../ui/cycle-ribbon/cycle-ribbon';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';

/** Where the work of each station is done, below the cycle's own address. */
const WORK: Record<Station['key'], string | null> = {
  applications: 'applications',
  rules: 'rules',
  matching: 'matching',
  responses: 'pairings',
  pairs: null,
  close: null,
};

/** The frame of a cycle's pages: where it stands, as a strip of cloth that leads to the work of each station. */
@Component({
  selector: 'app-cycle-frame',
  imports: [CycleRibbon, EmptyState, LoadProblem, Loading, RouterLink, RouterOutlet],
  templateUrl: './cycle-frame.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleFrame {
  readonly cycleId = input.required<string>();

  private readonly router = inject(Router);
  private readonly session = inject(SessionStore);
  protected readonly store = inject(CycleStore);
  protected readonly phaseLabel = PHASE_LABEL;
  private readonly url = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map((event) => event.urlAfterRedirects),
    ),
    { initialValue: this.router.url },
  );
  protected readonly here = computed(() => {
    const part = this.url().split(/[?#]/)[0]!.split('/')[3];
    return Object.entries(WORK).find(([, path]) => path !== null && path === part)?.[0] ?? null;
  });
  protected readonly stations = computed((): RibbonStation[] => {
    const cycle = this.store.cycle();
    if (!cycle) return [];
    return stationsOf(cycle.phase, cycle, cycle.counts).map((station) => {
      const path = WORK[station.key];
      return {
        key: station.key,
        label: station.label,
        state: station.state,
        count: station.count,
        note: station.day ? `${station.day.what} ${this.dayInWords(station.day.on)}` : '',
        link: path ? ['/cycles', cycle.id, path] : null,
      };
    });
  });
  protected readonly missing = computed(() => {
    const error = this.store.resource.error();
    return error !== undefined && ['not-found', 'invalid'].includes(problemOf(error).code);
  });

  constructor() {
    effect(() => this.store.open(this.cycleId()));
  }

  private dayInWords(day: string): string {
    return new Intl.DateTimeFormat(this.session.locale(), { day: 'numeric', month: 'short', timeZone: 'UTC' }).format(
      new Date(`${day}T00:00:00Z`),
    );
  }
}
