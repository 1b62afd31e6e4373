import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { linkVertical } from 'd3-shape';
import { ChartFigure, ChartTable } from '../chart-figure/chart-figure';
import { counted } from '../format/plural-pipe';

export interface ShortagePerson {
  readonly key: string;
  readonly name: string;
  readonly leftOut: boolean;
}

export interface ShortageMentor {
  readonly key: string;
  readonly name: string;
  readonly places: number;
}

/** One person's way to one mentor who could serve them. */
export interface ShortageLink {
  readonly person: string;
  readonly mentor: string;
}

const PEOPLE_Y = 14;
const MENTOR_TOP = 118;
const HEIGHT = 144;
// The picture is laid out in per cent; sizes in pixels are chosen for a card on a phone, and the style sheet enlarges
// marks that had to be small where there is room.
const NARROW_CARD = 270;
const LARGEST_DOT = 6.5;
const LARGEST_PLACE = 12;

/** The people of one shortage above, the mentors who could serve them below with their places, thin links between. */
@Component({
  selector: 'app-shortage-figure',
  imports: [ChartFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './shortage-figure.html',
  styleUrl: './shortage-figure.scss',
})
export class ShortageFigure {
  readonly people = input.required<readonly ShortagePerson[]>();
  readonly mentors = input.required<readonly ShortageMentor[]>();
  readonly links = input.required<readonly ShortageLink[]>();
  /** "26 mentees who seek hydrographic work". */
  readonly peopleCaption = input('');
  /** "18 places at the 11 mentors any of them may have: 8 too few". */
  readonly placesCaption = input('');

  protected readonly height = HEIGHT;
  protected readonly mentorTop = MENTOR_TOP;
  protected readonly peopleY = PEOPLE_Y;

  private readonly ordered = computed(() => [
    ...this.people().filter((person) => !person.leftOut),
    ...this.people().filter((person) => person.leftOut),
  ]);
  protected readonly radius = computed(() => markSize(this.ordered().length, 0.4, LARGEST_DOT));
  protected readonly dots = computed(() =>
    this.ordered().map((person, at, all) => ({ ...person, x: spread(at, all.length) })),
  );
  private readonly placeCount = computed(() => this.mentors().reduce((sum, mentor) => sum + mentor.places, 0));
  protected readonly side = computed(() => markSize(this.placeCount() + this.mentors().length, 0.7, LARGEST_PLACE));
  protected readonly smallDots = computed(() => this.radius() < LARGEST_DOT);
  protected readonly smallPlaces = computed(() => this.side() < LARGEST_PLACE);
  protected readonly blocks = computed(() => {
    const columns = this.placeCount() + this.mentors().length;
    const step = 100 / Math.max(1, columns);
    let column = 0;
    return this.mentors().map((mentor) => {
      const left = (column + 0.5) * step;
      column += mentor.places + 1;
      return {
        ...mentor,
        left: left - step * 0.15,
        width: (mentor.places + 0.3) * step,
        middle: left + (mentor.places * step) / 2,
        places: Array.from({ length: mentor.places }, (_, place) => left + (place + 0.5) * step),
      };
    });
  });
  protected readonly threads = computed(() => {
    const xOfPerson = new Map(this.dots().map((dot) => [dot.key, dot.x]));
    const xOfMentor = new Map(this.blocks().map((block) => [block.key, block.middle]));
    const draw = linkVertical<unknown, [number, number]>();
    return this.links().flatMap((link) => {
      const from = xOfPerson.get(link.person);
      const to = xOfMentor.get(link.mentor);
      if (from === undefined || to === undefined) return [];
      return [draw({ source: [from, PEOPLE_Y + LARGEST_DOT], target: [to, MENTOR_TOP] }) ?? ''];
    });
  });
  protected readonly caption = computed(
    () =>
      `${counted(this.people().length, 'mentee', 'mentees')}, ${counted(this.placeCount(), 'place', 'places')} at ` +
      counted(this.mentors().length, 'mentor', 'mentors'),
  );
  protected readonly table = computed((): ChartTable => {
    const names = new Map(this.mentors().map((mentor) => [mentor.key, mentor.name]));
    return {
      columns: ['Mentee', 'In the plan', 'Mentors who could serve them'],
      rows: this.ordered().map((person) => [
        person.name,
        person.leftOut ? 'left out' : 'paired',
        this.links()
          .filter((link) => link.person === person.key)
          .map((link) => names.get(link.mentor) ?? '')
          .join(', ') || 'none',
      ]),
    };
  });
}

/** Middle of the column `at` of `count`, in per cent. */
function spread(at: number, count: number): number {
  return ((at + 0.5) * 100) / Math.max(1, count);
}

/** A mark as large as its column allows, but not larger than `largest` nor smaller than 1.5 px. */
function markSize(columns: number, part: number, largest: number): number {
  return Math.max(1.5, Math.min(largest, (part * NARROW_CARD) / Math.max(1, columns)));
}
