import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Forecast } from '../../../../shared/matching/effects-contract';
import { BigFigure } from '../../ui/big-figure/big-figure';
import { DivergingBars } from '../../ui/diverging-bars/diverging-bars';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { counted } from '../../ui/format/plural-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { MatchingClient } from '../matching-client';

/** While applications come in: where places would be short if they closed now, so that mentors can be won in time. */
@Component({
  selector: 'app-forecast-page',
  imports: [BigFigure, DivergingBars, EmptyState, LoadProblem, Loading, PageHeader],
  templateUrl: './forecast-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForecastPage {
  readonly cycleId = input.required<string>();

  protected readonly resource = inject(MatchingClient).forecast(this.cycleId);
  protected readonly forecast = computed(() => (this.resource.hasValue() ? this.resource.value() : null));
  protected readonly bars = computed(() =>
    (this.forecast()?.areas ?? []).map((area) => ({ label: area.label, left: area.seekers, right: area.places })),
  );

  protected titleOf(shortage: Forecast['shortages'][number]): string {
    return (
      shortage.inCommon || (shortage.mentors === 0 ? 'No eligible mentor' : 'Mentees who share the same few mentors')
    );
  }

  protected sentenceOf(shortage: Forecast['shortages'][number]): string {
    const mentees = counted(shortage.mentees, 'mentee', 'mentees');
    if (shortage.mentors === 0) return `${mentees} whom no mentor could have under these rules.`;
    const places = counted(shortage.places, 'place', 'places');
    return `${mentees} for ${places} at ${counted(shortage.mentors, 'mentor', 'mentors')} who could serve any of them.`;
  }
}
