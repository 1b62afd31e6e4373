import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { faultOf } from '../../core/form-faults';
import type { MentoringProfile, TagChoice } from '../../../../shared/profiles/profiles-contract';
import type { Tag } from '../../../../shared/tags/tags-contract';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';
import { TagPicker } from './tag-picker';

@Component({
  selector: 'app-interests-form',
  imports: [MatFormFieldModule, ReactiveFormsModule, SectionCard, TagPicker],
  template: `
    <app-section-card
      key="interests"
      heading="Interest tags"
      seenBy="Seen by the people you are proposed to, and by coordinators. Pairings follow them."
      [saver]="saver"
    >
      <form class="stack" [formGroup]="form" aria-label="Interest tags">
        <app-tag-picker
          formControlName="seeks"
          label="As a mentee I seek"
          hint="What you would like help with; the most important first"
          [tags]="all()"
          (suggested)="added($event)"
        />
        <app-tag-picker
          formControlName="offers"
          label="As a mentor I offer"
          hint="What you can help others with"
          [tags]="all()"
          (suggested)="added($event)"
        />
        @if (faultOf(form.controls.offers) || faultOf(form.controls.seeks); as fault) {
          <p class="notice notice--error">{{ fault }}</p>
        }
      </form>
    </app-section-card>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InterestsForm {
  readonly profile = input.required<MentoringProfile>();
  readonly tags = input.required<readonly Tag[]>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly own = signal<readonly Tag[]>([]);
  protected readonly faultOf = faultOf;
  protected readonly all = computed(() => [...this.tags(), ...this.own()]);
  protected readonly form = this.fb.group({
    seeks: this.fb.control<TagChoice[]>([]),
    offers: this.fb.control<TagChoice[]>([]),
  });
  protected readonly saver = new SectionSaver(
    'interests',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.form.patchValue(content, { emitEvent: false }),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const { interests, versions } = this.profile();
      untracked(() => this.saver.start(interests, versions.interests));
    });
  }

  protected added(tag: Tag): void {
    this.own.update((tags) => [...tags, tag]);
  }
}
