import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FIT_BINS, type RuleEffects } from '../../../../shared/matching/effects-contract';
import { DistributionBars } from '../../ui/distribution-bars/distribution-bars';
import { grouped } from '../../ui/format/plural-pipe';

/** Narrow cards show half as many bars, each twice as wide. */
const JOINED = 2;
const BAR_POINTS = (100 / FIT_BINS) * JOINED;

/** What the settings do to the applicants as they are; the last numbers stay while new ones are computed. */
@Component({
  selector: 'app-effect-panel',
  imports: [DistributionBars],
  template: `
    <h2>Effect</h2>
    <p class="muted" aria-live="polite">{{ state() }}</p>
    @if (effects(); as found) {
      <dl class="pairs">
        <dt>Can be paired at once</dt>
        <dd>
          <b>{{ found.pairable }} of {{ found.mentees }} mentees</b>
        </dd>
        <dt>Places</dt>
        <dd>{{ found.places }} at {{ found.mentors }} mentors</dd>
        <dt>Eligible pairs</dt>
        <dd>{{ count(found.eligiblePairs) }}</dd>
        <dt>Mentees with no eligible mentor</dt>
        <dd>{{ found.menteesWithNone }}</dd>
      </dl>
      <app-distribution-bars [bins]="bins()" caption="Eligible pairs by fit" yLabel="pairs" />
    }
  `,
  styles: ':host { display: grid; gap: var(--space-3); grid-template-columns: minmax(0, 1fr); }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EffectPanel {
  readonly effects = input.required<RuleEffects | null>();
  readonly state = input.required<string>();

  protected readonly count = grouped;
  protected readonly bins = computed(() => {
    const counts = this.effects()?.distribution ?? [];
    return Array.from({ length: FIT_BINS / JOINED }, (_, at) => ({
      from: at * BAR_POINTS,
      to: (at + 1) * BAR_POINTS,
      count: counts.slice(at * JOINED, (at + 1) * JOINED).reduce((sum, each) => sum + each, 0),
    }));
  });
}
