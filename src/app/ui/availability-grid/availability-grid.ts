import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  forwardRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { ControlValueAccessor, NG_VALUE_ACCESSOR } from '@angular/forms';
import { Day, DAY_PARTS, DayPart, DAYS, Slot, SLOTS } from '../../../../shared/profiles/profiles-contract';

const DAY_IN_WORDS: Record<Day, string> = {
  mon: 'Monday',
  tue: 'Tuesday',
  wed: 'Wednesday',
  thu: 'Thursday',
  fri: 'Friday',
  sat: 'Saturday',
  sun: 'Sunday',
};
const PART_IN_WORDS: Record<DayPart, { readonly name: string; readonly hours: string }> = {
  morning: { name: 'Morning', hours: '7–12' },
  midday: { name: 'Midday', hours: '12–14' },
  afternoon: { name: 'Afternoon', hours: '14–18' },
  evening: { name: 'Evening', hours: '18–22' },
};

/**
 * The week as days × parts of day, for reading or for choosing. As a form control its value is the list of chosen
 * slots in the order of the week. Keyboard: arrow keys move between cells, space or enter changes one.
 */
@Component({
  selector: 'app-availability-grid',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './availability-grid.html',
  styleUrl: './availability-grid.scss',
  providers: [{ provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => AvailabilityGrid), multi: true }],
  host: { '(focusout)': 'left($event)' },
})
export class AvailabilityGrid implements ControlValueAccessor {
  readonly label = input('When you can usually meet');
  /** Shows the value without buttons. */
  readonly readOnly = input(false);
  /** The value where the grid is not bound to a form. */
  readonly slots = input<readonly string[] | null>(null);
  /** Slots of the other side, outlined in their colour, so that the overlap shows. */
  readonly others = input<readonly string[]>([]);
  readonly othersLabel = input('the other side');

  protected readonly parts = DAY_PARTS.map((part) => ({ part, ...PART_IN_WORDS[part] }));
  protected readonly days = DAYS.map((day) => ({ day, name: DAY_IN_WORDS[day], short: DAY_IN_WORDS[day].slice(0, 3) }));
  protected readonly disabled = signal(false);
  protected readonly active = signal<Slot>('mon-morning');
  private readonly written = signal<ReadonlySet<string>>(new Set());
  protected readonly chosen = computed(() => {
    const given = this.slots();
    return given === null ? this.written() : new Set(given);
  });
  protected readonly theirs = computed(() => new Set(this.others()));

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private onChange: (slots: string[]) => void = () => undefined;
  private onTouched: () => void = () => undefined;

  writeValue(slots: readonly string[] | null): void {
    this.written.set(new Set(slots ?? []));
  }

  registerOnChange(onChange: (slots: string[]) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  setDisabledState(disabled: boolean): void {
    this.disabled.set(disabled);
  }

  protected slotOf(day: Day, part: DayPart): Slot {
    return `${day}-${part}`;
  }

  protected toggle(slot: Slot): void {
    if (this.disabled()) return;
    const next = new Set(this.chosen());
    if (!next.delete(slot)) next.add(slot);
    this.written.set(next);
    this.active.set(slot);
    this.onChange(SLOTS.filter((each) => next.has(each)));
  }

  protected move(event: KeyboardEvent, day: number, part: number): void {
    const step = STEPS[event.key];
    if (!step) return;
    event.preventDefault();
    const nextDay = DAYS[Math.min(DAYS.length - 1, Math.max(0, day + step.days))] ?? 'mon';
    const nextPart = DAY_PARTS[Math.min(DAY_PARTS.length - 1, Math.max(0, part + step.parts))] ?? 'morning';
    const slot = this.slotOf(nextDay, nextPart);
    this.active.set(slot);
    this.host.nativeElement.querySelector<HTMLElement>(`[data-slot="${slot}"]`)?.focus();
  }

  protected left(event: FocusEvent): void {
    if (!this.host.nativeElement.contains(event.relatedTarget as Node | null)) this.onTouched();
  }
}

const STEPS: Readonly<Record<string, { readonly days: number; readonly parts: number }>> = {
  ArrowLeft: { days: -1, parts: 0 },
  ArrowRight: { days: 1, parts: 0 },
  ArrowUp: { days: 0, parts: -1 },
  ArrowDown: { days: 0, parts: 1 },
  Home: { days: -6, parts: 0 },
  End: { days: 6, parts: 0 },
};
