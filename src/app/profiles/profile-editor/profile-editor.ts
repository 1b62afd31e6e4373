import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { completenessOf } from '../../../../shared/profiles/profile-rules';
import { PageHeader } from '../../ui/page-header/page-header';
import { CompletenessMeter } from '../completeness-panel/completeness-meter';
import { ProfilesClient } from '../profiles-client';
import { AboutForm } from './about-form';
import { InterestsForm } from './interests-form';
import { MeetingForm } from './meeting-form';
import { PracticeForm } from './practice-form';
import { PrivateForm } from './private-form';
import { WishesForm } from './wishes-form';

/** One's own profile, section by section, saved as one types. */
@Component({
  selector: 'app-profile-editor',
  imports: [
    AboutForm,
    CompletenessMeter,
    InterestsForm,
    MatButton,
    MeetingForm,
    PageHeader,
    PracticeForm,
    PrivateForm,
    RouterLink,
    WishesForm,
  ],
  templateUrl: './profile-editor.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProfileEditor {
  private readonly client = inject(ProfilesClient);
  protected readonly stored = this.client.mine();
  /** What the meter counts; fetched again after each save, apart from the forms, which keep what is typed. */
  protected readonly measured = this.client.mine();
  protected readonly tags = this.client.tags();
  protected readonly completeness = computed(() =>
    this.measured.hasValue() ? completenessOf(this.measured.value()) : null,
  );
  protected readonly allTags = computed(() => (this.tags.hasValue() ? this.tags.value().tags : []));

  protected measure(): void {
    this.measured.reload();
  }
}
