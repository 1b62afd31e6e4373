import { ChangeDetectionStrategy, Component, computed, forwardRef, inject, input, output, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { type ControlValueAccessor, FormControl, NG_VALUE_ACCESSOR, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule, type MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import type { TagChoice, TagPriority } from '../../../../shared/profiles/profiles-contract';
import { folded, searchTags } from '../../../../shared/tags/tag-search';
import type { Tag, TagKind } from '../../../../shared/tags/tags-contract';
import { Notices } from '../../core/notices';
import { ProfilesClient } from '../profiles-client';

interface ChosenTag {
  choice: TagChoice;
  label: string;
  kind: string;
}

const KIND_LABEL: Record<TagKind, string> = { 'practice-area': 'practice area', topic: 'topic' };
const PRIORITIES: readonly { key: TagPriority; label: string }[] = [
  { key: 1, label: 'Very important' },
  { key: 2, label: 'Important' },
  { key: 3, label: 'Good to have' },
];

/** Chooses tags by typing (synonyms are found), each with a priority; what is not there can be suggested. */
@Component({
  selector: 'app-tag-picker',
  imports: [MatAutocompleteModule, MatButton, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule],
  templateUrl: './tag-picker.html',
  styleUrl: './tag-picker.scss',
  providers: [{ provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => TagPicker), multi: true }],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TagPicker implements ControlValueAccessor {
  readonly label = input.required<string>();
  readonly hint = input('');
  readonly tags = input.required<readonly Tag[]>();
  readonly suggested = output<Tag>();

  private readonly client = inject(ProfilesClient);
  private readonly notices = inject(Notices);
  protected readonly priorities = PRIORITIES;
  protected readonly kindLabel = KIND_LABEL;
  protected readonly typed = new FormControl<string | Tag>('', { nonNullable: true });
  private readonly text = toSignal(this.typed.valueChanges, { initialValue: '' });
  private readonly choices = signal<TagChoice[]>([]);
  private onChange: (choices: TagChoice[]) => void = () => undefined;
  protected onTouched: () => void = () => undefined;

  protected readonly chosen = computed((): ChosenTag[] => {
    const known = new Map(this.tags().map((tag) => [tag.id, tag]));
    return this.choices().map((choice) => {
      const tag = known.get(choice.tagId);
      return { choice, label: tag?.label ?? 'A retired tag', kind: tag ? KIND_LABEL[tag.kind] : '' };
    });
  });
  protected readonly found = computed(() => {
    const text = this.text();
    if (typeof text !== 'string') return [];
    const taken = new Set(this.choices().map((choice) => choice.tagId));
    return searchTags(this.tags(), text)
      .filter((tag) => !taken.has(tag.id))
      .slice(0, 12);
  });
  protected readonly maySuggest = computed(() => {
    const text = this.text();
    if (typeof text !== 'string' || text.trim().length < 2) return '';
    return this.tags().some((tag) => folded(tag.label) === folded(text.trim())) ? '' : text.trim();
  });

  writeValue(choices: TagChoice[] | null): void {
    this.choices.set(choices ?? []);
  }

  registerOnChange(onChange: (choices: TagChoice[]) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  protected add(event: MatAutocompleteSelectedEvent): void {
    this.take(event.option.value as Tag);
  }

  protected suggest(label: string, kind: TagKind): void {
    this.client.suggestTag({ label, kind }).subscribe({
      next: (tag) => {
        this.suggested.emit(tag);
        this.take(tag);
        this.notices.say(
          `“${tag.label}” is suggested. You can use it at once; others can when a coordinator has approved it.`,
        );
      },
      error: (error: unknown) => this.notices.tell(error),
    });
  }

  protected remove(tagId: string): void {
    this.set(this.choices().filter((choice) => choice.tagId !== tagId));
  }

  protected prioritise(tagId: string, priority: TagPriority): void {
    this.set(this.choices().map((choice) => (choice.tagId === tagId ? { tagId, priority } : choice)));
  }

  private take(tag: Tag): void {
    this.typed.setValue('');
    this.set([...this.choices(), { tagId: tag.id, priority: this.choices().length < 2 ? 1 : 2 }]);
  }

  private set(choices: TagChoice[]): void {
    this.choices.set(choices);
    this.onChange(choices);
  }
}
