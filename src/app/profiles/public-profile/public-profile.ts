import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import {
  CAREER_STAGE_LABEL,
  MEETING_MODE_LABEL,
  type PublicProfile,
  REGION_LABEL,
  SECTOR_LABEL,
} from '../../../../shared/profiles/profiles-contract';
import { AvailabilityGrid } from '../../ui/availability-grid/availability-grid';
import { PluralPipe } from '../../ui/format/plural-pipe';
import { TagChips } from '../../ui/tag-chips/tag-chips';
import { languageName, levelLabel } from '../profile-editor/choices';

@Component({
  selector: 'app-public-profile',
  imports: [AvailabilityGrid, PluralPipe, TagChips],
  templateUrl: './public-profile.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PublicProfileView {
  readonly profile = input.required<PublicProfile>();

  protected readonly region = computed(() => this.labelled(this.profile().region, REGION_LABEL));
  protected readonly stage = computed(() => this.labelled(this.profile().careerStage, CAREER_STAGE_LABEL));
  protected readonly sector = computed(() => this.labelled(this.profile().sector, SECTOR_LABEL));
  protected readonly mode = computed(() => this.labelled(this.profile().meetingMode, MEETING_MODE_LABEL));
  protected readonly languages = computed(() =>
    this.profile()
      .languages.map((skill) => `${languageName(skill.code)} (${levelLabel(skill.level)})`)
      .join(', '),
  );
  protected readonly offers = computed(() => this.profile().offers.map((label) => ({ key: label, label })));
  protected readonly seeks = computed(() => this.profile().seeks.map((label) => ({ key: label, label })));

  private labelled<K extends string>(key: K | null, labels: Record<K, string>): string {
    return key === null ? '' : labels[key];
  }
}
