import { ChangeDetectionStrategy, Component, forwardRef, inject, input, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { type ControlValueAccessor, FormControl, NG_VALUE_ACCESSOR, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule, type MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { catchError, debounceTime, map, of, switchMap } from 'rxjs';
import type { InterestKind, PeopleFound } from '../../../../shared/profiles/profiles-contract';
import { ProfilesClient } from '../profiles-client';
import { INTEREST_KINDS } from './choices';

type FoundPerson = PeopleFound['people'][number];
interface NamedPerson {
  personId: string;
  name: string;
  kind?: InterestKind;
}

/** Names members by typing part of their name; with a kind where an interest is declared. */
@Component({
  selector: 'app-people-picker',
  imports: [MatAutocompleteModule, MatButton, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule],
  templateUrl: './people-picker.html',
  styleUrl: './tag-picker.scss',
  providers: [{ provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => PeoplePicker), multi: true }],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePicker implements ControlValueAccessor {
  readonly label = input.required<string>();
  readonly withKind = input(false);

  private readonly client = inject(ProfilesClient);
  protected readonly kinds = INTEREST_KINDS;
  protected readonly typed = new FormControl<string | FoundPerson>('', { nonNullable: true });
  protected readonly people = signal<NamedPerson[]>([]);
  private onChange: (people: NamedPerson[]) => void = () => undefined;
  protected onTouched: () => void = () => undefined;

  protected readonly found = toSignal(
    this.typed.valueChanges.pipe(
      debounceTime(250),
      map((text) => (typeof text === 'string' ? text.trim() : '')),
      switchMap((text) => (text.length < 2 ? of([]) : this.client.searchPeople(text).pipe(catchError(() => of([]))))),
    ),
    { initialValue: [] },
  );

  writeValue(people: NamedPerson[] | null): void {
    this.people.set(people ?? []);
  }

  registerOnChange(onChange: (people: NamedPerson[]) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  protected add(event: MatAutocompleteSelectedEvent): void {
    const { personId, name } = event.option.value as FoundPerson;
    this.typed.setValue('');
    if (this.people().some((person) => person.personId === personId)) return;
    this.set([...this.people(), this.withKind() ? { personId, name, kind: 'reporting-line' } : { personId, name }]);
  }

  protected remove(personId: string): void {
    this.set(this.people().filter((person) => person.personId !== personId));
  }

  protected setKind(personId: string, kind: InterestKind): void {
    this.set(this.people().map((person) => (person.personId === personId ? { ...person, kind } : person)));
  }

  private set(people: NamedPerson[]): void {
    this.people.set(people);
    this.onChange(people);
  }
}
