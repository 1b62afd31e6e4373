import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { CycleSettings } from '../../../../shared/cycles/cycles-contract';
import type { MatchingSettings } from '../../../../shared/matching/matching-contract';
import { MomentPipe } from '../../core/moments';
import { differencesOf } from './settings-changes';

/** A colleague saved meanwhile: what they changed, what one changed oneself, and whose settings stay. */
@Component({
  selector: 'app-stale-notice',
  imports: [MatButton, MomentPipe],
  templateUrl: './stale-notice.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StaleNotice {
  readonly theirs = input.required<CycleSettings>();
  readonly mine = input.required<MatchingSettings>();
  /** What both started from. */
  readonly before = input.required<CycleSettings>();
  readonly busy = input(false);
  /** Nothing that is typed can be saved while a field is wrong. */
  readonly faulty = input(false);
  readonly saveMine = output<void>();
  readonly takeTheirs = output<void>();

  protected readonly sides = computed(() => [
    { title: 'They changed', lines: differencesOf(this.before().settings, this.theirs().settings) },
    { title: 'You changed', lines: differencesOf(this.before().settings, this.mine()) },
  ]);
}
