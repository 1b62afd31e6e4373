import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { FitPipe } from '../format/fit-pipe';
import { PlanGroup } from './plan-layout';

/** The plan at a glance as tables: the groups, and every pairing once it is opened. */
@Component({
  selector: 'app-plan-table',
  imports: [FitPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './plan-table.html',
  styleUrl: './plan-table.scss',
})
export class PlanTable {
  readonly groups = input.required<readonly PlanGroup[]>();

  // thousands of rows are drawn only for those who ask for them
  protected readonly open = signal(false);
  protected readonly rows = computed(() =>
    this.groups().map((group) => ({
      label: group.label,
      mentees: group.mentees.length,
      leftOut: group.mentees.filter((mentee) => mentee.mentorKey === null).length,
      places: group.places.length,
      unfilled: group.places.filter((place) => place.menteeKey === null).length,
      short: group.short,
    })),
  );
  protected readonly pairings = computed(() => {
    const mentors = new Map(
      this.groups().flatMap((group) => group.places.map((place) => [place.key, place.name] as const)),
    );
    return this.groups().flatMap((group) =>
      group.mentees.map((mentee) => ({
        key: mentee.key,
        group: group.label,
        mentee: mentee.name,
        mentor: mentee.mentorKey === null ? 'left out' : (mentors.get(mentee.mentorKey) ?? ''),
        fit: mentee.fit,
      })),
    );
  });
}
