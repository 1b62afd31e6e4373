import { ChangeDetectionStrategy, Component, effect, inject, input, output, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { MentoringProfile, PrivateSection } from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { PeoplePicker } from './people-picker';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';

@Component({
  selector: 'app-private-form',
  imports: [MatFormFieldModule, MatInput, PeoplePicker, ReactiveFormsModule, SectionCard],
  template: `
    <app-section-card
      key="private"
      heading="Private to coordinators"
      seenBy="Never shown to anyone but coordinators. The people you name here are not told."
      [saver]="saver"
    >
      <form class="stack" [formGroup]="form" aria-label="Private to coordinators">
        <app-people-picker formControlName="exclusions" label="People I do not wish to be paired with" />
        <app-people-picker
          formControlName="declaredInterests"
          label="Declared interests: people I report to, am related to, or assess"
          [withKind]="true"
        />
        @if (faultOf(form.controls.exclusions) || faultOf(form.controls.declaredInterests); as fault) {
          <p class="notice notice--error">{{ fault }}</p>
        }
        <mat-form-field>
          <mat-label>Adjustments I need</mat-label>
          <textarea matInput rows="3" formControlName="adjustments"></textarea>
          <mat-hint>For example step-free meeting places, or captions in calls</mat-hint>
          <mat-error>{{ faultOf(form.controls.adjustments) }}</mat-error>
        </mat-form-field>
      </form>
    </app-section-card>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PrivateForm {
  readonly profile = input.required<MentoringProfile>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  protected readonly faultOf = faultOf;
  protected readonly form = this.fb.group({
    exclusions: this.fb.control<PrivateSection['exclusions']>([]),
    declaredInterests: this.fb.control<PrivateSection['declaredInterests']>([]),
    adjustments: '',
  });
  protected readonly saver = new SectionSaver(
    'private',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.form.patchValue(content, { emitEvent: false }),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const profile = this.profile();
      untracked(() => this.saver.start(profile.private, profile.versions.private));
    });
  }
}
