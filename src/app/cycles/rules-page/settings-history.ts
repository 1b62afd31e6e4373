import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SettingsHistory as History } from '../../../../shared/cycles/cycles-contract';
import { MomentPipe } from '../../core/moments';
import { differencesOf } from './settings-changes';

/** Every version saved, newest first, with what changed against the one before. */
@Component({
  selector: 'app-settings-history',
  imports: [MomentPipe],
  template: `
    <ul class="plain-list line-list">
      @for (version of lines(); track version.version) {
        <li>
          <b>Version {{ version.version }}</b> · {{ version.savedBy ?? 'the system' }} · {{ version.savedAt | moment }}
          @for (line of version.changes; track line) {
            <p class="muted">{{ line }}</p>
          } @empty {
            <p class="muted">{{ version.first ? 'The settings this cycle began with' : 'Nothing differs' }}</p>
          }
        </li>
      } @empty {
        <li class="muted">Nobody has changed them since the cycle was made.</li>
      }
    </ul>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettingsHistory {
  readonly versions = input.required<History['versions']>();

  protected readonly lines = computed(() => {
    const newestFirst = [...this.versions()].sort((one, other) => other.version - one.version);
    return newestFirst.map((version, at) => {
      const before = newestFirst[at + 1];
      return {
        ...version,
        first: !before,
        changes: before ? differencesOf(before.settings, version.settings) : [],
      };
    });
  });
}
