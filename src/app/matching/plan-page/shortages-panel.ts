import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Plan, ShortageView } from '../../../../shared/matching/runs-contract';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { counted } from '../../ui/format/plural-pipe';
import { ShortageFigure } from '../../ui/shortage-figure/shortage-figure';

type Remedy = ShortageView['remedies'][number];

/** Each group that is short: who seeks, who could serve them, and what would pair one more. */
@Component({
  selector: 'app-shortages-panel',
  imports: [EmptyState, MatButton, ShortageFigure],
  templateUrl: './shortages-panel.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShortagesPanel {
  readonly plan = input.required<Plan>();
  /** A rule to try without, by its key. */
  readonly ruleDropped = output<string>();

  private readonly names = computed(
    () => new Map([...this.plan().mentees, ...this.plan().mentors].map((person) => [person.applicationId, person])),
  );
  protected readonly groups = computed(() => this.plan().report.shortages.map((view) => this.groupOf(view)));

  private groupOf(view: ShortageView) {
    const left = new Set(view.leftOut);
    const person = (key: string) => this.names().get(key);
    return {
      view,
      title:
        view.mentors.length === 0 ? 'No eligible mentor' : view.inCommon || 'Mentees who share the same few mentors',
      people: view.mentees.map((key) => ({ key, name: person(key)?.name ?? '', leftOut: left.has(key) })),
      mentors: view.mentors.map((key) => ({ key, name: person(key)?.name ?? '', places: person(key)?.places ?? 0 })),
      links: view.links.map(([mentee, mentor]) => ({ person: view.mentees[mentee]!, mentor: view.mentors[mentor]! })),
      peopleCaption: counted(view.mentees.length, 'mentee', 'mentees'),
      placesCaption: `${counted(view.places, 'place', 'places')} at ${counted(view.mentors.length, 'mentor', 'mentors')} any of them may have: ${view.short} too few`,
      remedies: view.remedies.map((remedy) => ({ ...remedy, names: this.namesOf(remedy) })),
    };
  }

  private namesOf(remedy: Remedy): string {
    const names = [...new Set(remedy.mentors)].map((key) => this.names().get(key)?.name ?? '');
    const first = names.slice(0, 6).join(', ');
    return names.length > 6 ? `${first} and ${names.length - 6} more` : first;
  }
}
