import { ChangeDetectionStrategy, Component, effect, inject, input, output, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import type { MeetingMode, MentoringProfile, Slot } from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { AvailabilityGrid } from '../../ui/availability-grid/availability-grid';
import { MODES } from './choices';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';

@Component({
  selector: 'app-meeting-form',
  imports: [AvailabilityGrid, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule, SectionCard],
  template: `
    <app-section-card
      key="meeting"
      heading="How and when"
      seenBy="Seen by the people you are proposed to, and by coordinators."
      [saver]="saver"
    >
      <form class="stack" [formGroup]="form" aria-label="How and when">
        <div class="form-grid">
          <mat-form-field>
            <mat-label>How to meet</mat-label>
            <mat-select formControlName="meetingMode">
              <mat-option [value]="null">Not said</mat-option>
              @for (mode of modes; track mode.key) {
                <mat-option [value]="mode.key">{{ mode.label }}</mat-option>
              }
            </mat-select>
          </mat-form-field>
          <mat-form-field>
            <mat-label>How far you would travel, in km</mat-label>
            <input matInput type="number" inputmode="numeric" min="0" max="1000" formControlName="maxDistanceKm" />
            <mat-hint>Empty: as far as the cycle's rule says</mat-hint>
            <mat-error>{{ faultOf(form.controls.maxDistanceKm) }}</mat-error>
          </mat-form-field>
        </div>
        <app-availability-grid formControlName="availability" label="Times that usually suit you, in your time zone" />
      </form>
    </app-section-card>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeetingForm {
  readonly profile = input.required<MentoringProfile>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  protected readonly modes = MODES;
  protected readonly faultOf = faultOf;
  protected readonly form = this.fb.group({
    meetingMode: this.fb.control<MeetingMode | null>(null),
    maxDistanceKm: this.fb.control<number | null>(null),
    availability: this.fb.control<Slot[]>([]),
  });
  protected readonly saver = new SectionSaver(
    'meeting',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.form.patchValue(content, { emitEvent: false }),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const { meeting, versions } = this.profile();
      untracked(() => this.saver.start(meeting, versions.meeting));
    });
  }
}
