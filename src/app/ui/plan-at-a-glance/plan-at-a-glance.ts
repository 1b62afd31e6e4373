import { _IdGenerator } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { fitInWords } from '../format/fit-pipe';
import { counted, PluralPipe } from '../format/plural-pipe';
import { bundlePlan } from './plan-bundles';
import { layOutPlan, PlacedMentee, PlanGroup, ROWS } from './plan-layout';
import { PlanTable } from './plan-table';

export type { PlanGroup, PlanMentee, PlanPlace } from './plan-layout';

// Marks are sized for this width and do not grow beyond; narrower cards get the bundled picture.
const REFERENCE_WIDTH = 1080;

/**
 * The whole plan in one picture: mentees above, places below, one thread a pairing. Pointing at or moving to a mark
 * follows its thread; choosing a group is left to the page. Narrow, or with very many threads, it is bundled by group.
 */
@Component({
  selector: 'app-plan-at-a-glance',
  imports: [PlanTable, PluralPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './plan-at-a-glance.html',
  styleUrl: './plan-at-a-glance.scss',
})
export class PlanAtAGlance {
  readonly groups = input.required<readonly PlanGroup[]>();
  /** Key of the group to which the page has filtered. */
  readonly chosenGroup = input<string | null>(null);
  readonly threadLimit = input(600);
  readonly heading = input('Plan at a glance');
  /** The key of the mentee whose thread was chosen by click or Enter. */
  readonly selected = output<string>();
  /** The key of the group that was chosen; null when the chosen one was chosen again. */
  readonly groupChosen = output<string | null>();

  protected readonly rows = ROWS;
  protected readonly id = inject(_IdGenerator).getId('plan-');
  protected readonly layout = computed(() => layOutPlan(this.groups()));
  protected readonly bundled = computed(() => bundlePlan(this.groups()));
  protected readonly tooMany = computed(
    () => this.layout().threads.length > this.threadLimit() || this.layout().mentees.length > 2 * this.threadLimit(),
  );
  protected readonly radius = computed(() =>
    Math.max(0.7, Math.min(4.5, (0.43 * this.layout().pitch * REFERENCE_WIDTH) / 100)),
  );
  /** The line of hollow marks, thin enough to leave them hollow. */
  protected readonly rim = computed(() => Math.min(1.2, this.radius() * 0.45));
  protected readonly summary = computed(() => {
    const mentees = this.layout().mentees.length;
    const places = this.layout().places.length;
    const left = this.layout().mentees.filter((mentee) => mentee.mentorKey === null).length;
    return `${counted(mentees, 'mentee', 'mentees')}, ${counted(places, 'place', 'places')}, ${left} left out`;
  });

  private readonly followedKey = signal<string | null>(null);
  protected readonly followed = computed(() => this.menteeOf(this.followedKey()));
  protected readonly followedThread = computed(
    () => this.layout().threads.find((thread) => thread.menteeKey === this.followedKey()) ?? null,
  );
  protected readonly followedPlace = computed(
    () =>
      this.layout().places.find((place) => place.menteeKey !== null && place.menteeKey === this.followedKey()) ?? null,
  );
  protected readonly followedInWords = computed(() => {
    const mentee = this.followed();
    return mentee ? pairingInWords(mentee) : '';
  });
  protected readonly activeId = computed(() => {
    const at = this.layout().mentees.findIndex((mentee) => mentee.key === this.followedKey());
    return at < 0 ? null : this.optionId(at);
  });

  protected readonly nobody = computed(() => this.layout().mentees.length + this.layout().places.length === 0);
  protected readonly hint = computed(() => {
    if (this.nobody()) return 'Nobody is in this plan yet.';
    const short = this.groups().filter((group) => group.short > 0);
    if (short.length === 0) return 'No group is short of places.';
    return `Short of places: ${short.map((group) => `${group.label}, ${group.short} too few`).join('; ')}.`;
  });

  protected groupInWords(at: number): string {
    const row = this.bundled().rows[at];
    if (!row) return '';
    const short = row.short > 0 ? `, ${row.short} too few places` : '';
    return `${row.label}: ${counted(row.mentees, 'mentee', 'mentees')}, ${counted(row.places, 'place', 'places')}${short}`;
  }

  protected optionId(at: number): string {
    return `${this.id}-${at}`;
  }

  protected inWords(mentee: PlacedMentee): string {
    return pairingInWords(mentee);
  }

  protected follow(event: PointerEvent | MouseEvent): void {
    this.followedKey.set(this.nearest(event));
  }

  protected letGo(): void {
    this.followedKey.set(null);
  }

  protected choose(event: MouseEvent): void {
    const key = this.nearest(event);
    if (key !== null) this.selected.emit(key);
  }

  protected chooseGroup(key: string): void {
    this.groupChosen.emit(key === this.chosenGroup() ? null : key);
  }

  protected enter(): void {
    if (this.followedKey() === null) this.followedKey.set(this.layout().mentees[0]?.key ?? null);
  }

  protected move(event: KeyboardEvent): void {
    const mentees = this.layout().mentees;
    const at = mentees.findIndex((mentee) => mentee.key === this.followedKey());
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      const mentee = mentees[at];
      if (mentee) this.selected.emit(mentee.key);
      return;
    }
    const next = this.target(event.key, at);
    if (next === null) return;
    event.preventDefault();
    this.followedKey.set(mentees[Math.min(mentees.length - 1, Math.max(0, next))]?.key ?? null);
  }

  /** Left and right go from mentee to mentee, up and down from group to group. */
  private target(key: string, at: number): number | null {
    const mentees = this.layout().mentees;
    switch (key) {
      case 'ArrowLeft':
        return at - 1;
      case 'ArrowRight':
        return at + 1;
      case 'Home':
        return 0;
      case 'End':
        return mentees.length - 1;
      case 'ArrowDown':
        return this.firstOfGroup((mentees[at]?.group ?? -1) + 1) ?? at;
      case 'ArrowUp':
        return this.firstOfGroup((mentees[at]?.group ?? 1) - 1) ?? at;
      default:
        return null;
    }
  }

  private firstOfGroup(group: number): number | null {
    const at = this.layout().mentees.findIndex((mentee) => mentee.group === group);
    return at < 0 ? null : at;
  }

  /** The mentee of the mark nearest to the pointer: of the upper row in the upper half, of the lower in the lower. */
  private nearest(event: MouseEvent): string | null {
    const box = (event.currentTarget as SVGElement).getBoundingClientRect();
    if (box.width === 0) return null;
    const x = ((event.clientX - box.left) / box.width) * 100;
    const upper = event.clientY - box.top < (ROWS.mentees + ROWS.places) / 2;
    const marks = upper
      ? this.layout().mentees.map((mentee) => ({ x: mentee.x, key: mentee.key as string | null }))
      : this.layout().places.map((place) => ({ x: place.x, key: place.menteeKey }));
    let best: { key: string | null; distance: number } = { key: null, distance: 2 };
    for (const mark of marks) {
      const distance = Math.abs(mark.x - x);
      if (distance < best.distance) best = { key: mark.key, distance };
    }
    return best.key;
  }

  private menteeOf(key: string | null): PlacedMentee | null {
    return this.layout().mentees.find((mentee) => mentee.key === key) ?? null;
  }
}

function pairingInWords(mentee: PlacedMentee): string {
  if (mentee.mentorKey === null) return `${mentee.name}, left out`;
  const fit = mentee.fit === null ? '' : `, fit ${fitInWords(mentee.fit)}`;
  return `${mentee.name} with ${mentee.mentorName ?? 'a mentor of another group'}${fit}`;
}
