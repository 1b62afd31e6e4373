import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialog, MatDialogModule } from '@angular/material/dialog';
import {
  CAREER_STAGE_LABEL,
  INTEREST_KIND_LABEL,
  MEETING_MODE_LABEL,
  REGION_LABEL,
  SECTOR_LABEL,
} from '../../../../shared/profiles/profiles-contract';
import { completenessOf } from '../../../../shared/profiles/profile-rules';
import { MomentPipe } from '../../core/moments';
import { AvailabilityGrid } from '../../ui/availability-grid/availability-grid';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { TagChips } from '../../ui/tag-chips/tag-chips';
import { ApplicationsClient } from '../applications-client';
import { StatusBadge } from '../status-badge';

export interface DrawerData {
  readonly cycleId: string;
  readonly applicationId: string;
  readonly name: string;
}

const languageNames = new Intl.DisplayNames('en', { type: 'language' });

/** One application whole, beside the table: what was sent, the profile, and its private part. */
@Component({
  selector: 'app-applicant-drawer',
  imports: [AvailabilityGrid, LoadProblem, Loading, MatButton, MatDialogModule, MomentPipe, StatusBadge, TagChips],
  templateUrl: './applicant-drawer.html',
  styleUrl: './applicant-drawer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicantDrawer {
  protected readonly data = inject<DrawerData>(MAT_DIALOG_DATA);
  protected readonly applicant = inject(ApplicationsClient).applicant(this.data.cycleId, this.data.applicationId);
  protected readonly detail = computed(() => (this.applicant.hasValue() ? this.applicant.value() : null));
  protected readonly missing = computed(() => {
    const detail = this.detail();
    return detail ? completenessOf(detail.profile).missing : [];
  });
  protected readonly languages = computed(() =>
    (this.detail()?.profile.about.languages ?? [])
      .map(({ code, level }) => `${languageNames.of(code) ?? code} (${level === 'first' ? 'first language' : level})`)
      .join(', '),
  );
  protected readonly regionLabel = REGION_LABEL;
  protected readonly stageLabel = CAREER_STAGE_LABEL;
  protected readonly sectorLabel = SECTOR_LABEL;
  protected readonly modeLabel = MEETING_MODE_LABEL;
  protected readonly interestLabel = INTEREST_KIND_LABEL;

  protected readonly said = computed(() => {
    const own = this.detail()?.profile.private;
    return own !== undefined && (own.adjustments !== '' || own.exclusions.length + own.declaredInterests.length > 0);
  });

  protected names(people: readonly { name: string }[]): string {
    return people.map((person) => person.name).join(', ');
  }

  protected chips(labels: readonly string[]) {
    return labels.map((label) => ({ key: label, label }));
  }
}

/** Opens at the right edge, over the whole height; on a phone over the whole page. */
export function openDrawer(dialog: MatDialog, data: DrawerData): void {
  dialog.open<ApplicantDrawer, DrawerData>(ApplicantDrawer, {
    data,
    width: 'min(620px, 100vw)',
    maxWidth: '100vw',
    height: '100dvh',
    maxHeight: '100dvh',
    position: { top: '0', right: '0' },
    autoFocus: 'first-heading',
  });
}
