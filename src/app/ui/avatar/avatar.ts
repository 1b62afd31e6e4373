import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Which side of a pairing a person stands on; `null` where it does not matter. */
export type Side = 'mentor' | 'mentee';

/** A rounded square with a photo or initials. Decoration: the name always stands beside it in text. */
@Component({
  selector: 'app-avatar',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './avatar.html',
  styleUrl: './avatar.scss',
  host: { 'aria-hidden': 'true', '[class]': 'look()' },
})
export class Avatar {
  readonly name = input.required<string>();
  readonly side = input<Side | null>(null);
  readonly size = input<'small' | 'medium' | 'large'>('medium');
  readonly photoUrl = input<string | null>(null);

  protected readonly initials = computed(() => initialsOf(this.name()));
  protected readonly look = computed(() => `${this.size()} ${this.side() ?? 'neutral'}`);
}

/** First letters of the first and the last word, in the writing system of the name; one letter for a single word. */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/u).filter(Boolean);
  const ends = words.length > 1 ? [words[0], words[words.length - 1]] : words;
  return ends.map((word) => firstLetter(word ?? '')).join('');
}

// Intl.Segmenter keeps a letter and its combining marks together ("Đ", "é" written as two code points).
function firstLetter(word: string): string {
  const bare = word.replace(/^[^\p{L}\p{N}]+/u, '') || word;
  const [first] = new Intl.Segmenter(undefined, { granularity: 'grapheme' }).segment(bare);
  return (first?.segment ?? '').toLocaleUpperCase();
}
