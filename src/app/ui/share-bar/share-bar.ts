import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shareInWords } from '../format/share-pipe';

/** A share as a short bar with its number: how often a pairing stays, how complete a profile is. */
@Component({
  selector: 'app-share-bar',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './share-bar.html',
  styleUrl: './share-bar.scss',
  host: { '[class]': 'tone()' },
})
export class ShareBar {
  /** 0 to 1. */
  readonly share = input.required<number>();
  readonly tone = input<'lichen' | 'indigo' | 'madder' | 'woad'>('lichen');
  /** Fills its container instead of 40 px. */
  readonly wide = input(false);

  protected readonly percent = computed(() => `${Math.min(100, Math.max(0, this.share() * 100))}%`);
  protected readonly inWords = computed(() => shareInWords(this.share()));
}
