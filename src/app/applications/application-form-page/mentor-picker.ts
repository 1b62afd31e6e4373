import { ChangeDetectionStrategy, Component, computed, forwardRef, input, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { type ControlValueAccessor, FormControl, NG_VALUE_ACCESSOR, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule, type MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { ListedMentor } from '../../../../shared/applications/applications-contract';
import { REGION_LABEL } from '../../../../shared/profiles/profiles-contract';
import { folded } from '../../../../shared/tags/tag-search';

export interface NamedMentor {
  personId: string;
  name: string;
}
const MOST = 3;
const SHOWN = 20;

/** Names up to three listed mentors in order of preference, found by name, practice area, region or headline. */
@Component({
  selector: 'app-mentor-picker',
  imports: [MatAutocompleteModule, MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule],
  templateUrl: './mentor-picker.html',
  providers: [{ provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => MentorPicker), multi: true }],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MentorPicker implements ControlValueAccessor {
  readonly mentors = input.required<readonly ListedMentor[]>();
  readonly inputId = input.required<string>();

  protected readonly typed = new FormControl<string | ListedMentor>('', { nonNullable: true });
  private readonly text = toSignal(this.typed.valueChanges, { initialValue: '' });
  protected readonly chosen = signal<NamedMentor[]>([]);
  protected readonly full = computed(() => this.chosen().length >= MOST);
  protected readonly found = computed(() => {
    const text = this.text();
    const wanted = typeof text === 'string' ? folded(text.trim()) : '';
    const taken = new Set(this.chosen().map((each) => each.personId));
    return this.mentors()
      .filter((mentor) => !taken.has(mentor.personId) && this.words(mentor).includes(wanted))
      .slice(0, SHOWN);
  });
  private onChange: (mentors: NamedMentor[]) => void = () => undefined;
  protected onTouched: () => void = () => undefined;

  writeValue(mentors: NamedMentor[] | null): void {
    this.chosen.set(mentors ?? []);
  }

  registerOnChange(onChange: (mentors: NamedMentor[]) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  protected add(event: MatAutocompleteSelectedEvent): void {
    const { personId, name } = event.option.value as ListedMentor;
    this.typed.setValue('');
    this.set([...this.chosen(), { personId, name }]);
  }

  protected remove(personId: string): void {
    this.set(this.chosen().filter((each) => each.personId !== personId));
  }

  protected detail(mentor: ListedMentor): string {
    const region = mentor.region ? [REGION_LABEL[mentor.region]] : [];
    return [...mentor.practiceAreas.slice(0, 2), ...region].join(', ');
  }

  private words(mentor: ListedMentor): string {
    return folded([mentor.name, mentor.headline, this.detail(mentor), ...mentor.practiceAreas].join(' '));
  }

  private set(mentors: NamedMentor[]): void {
    this.chosen.set(mentors);
    this.onChange(mentors);
  }
}
