import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

export interface TagChip {
  readonly key: string;
  readonly label: string;
  /** Both sides of a pairing have it. */
  readonly shared?: boolean;
  /** 1 (first) to 3. */
  readonly priority?: number;
}

/** Interest tags in a row; shared ones are marked in word and tint, and removable where the page edits them. */
@Component({
  selector: 'app-tag-chips',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './tag-chips.html',
  styleUrl: './tag-chips.scss',
})
export class TagChips {
  readonly tags = input.required<readonly TagChip[]>();
  readonly label = input('Tags');
  readonly removable = input(false);
  /** The key of the tag to remove. */
  readonly removed = output<string>();
}
