import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/**
 * The mark of Heddle: a woad and a madder thread that meet in an indigo knot.
 * Without a label it is decoration beside a word that says the name.
 */
@Component({
  selector: 'app-brand-mark',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './brand-mark.html',
  styleUrl: './brand-mark.scss',
})
export class BrandMark {
  /** Height in CSS pixels. */
  readonly size = input(24);
  /** What a screen reader says; empty for decoration. */
  readonly label = input('');
}
