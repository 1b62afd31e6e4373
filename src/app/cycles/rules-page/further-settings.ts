import { ChangeDetectionStrategy, Component, input, linkedSignal, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { MatchingSettings } from '../../../../shared/matching/matching-contract';
import { NumberField } from './number-field';
import { groupsToText, textToGroups } from './settings-changes';

/** What spreads the load and breaks ties: bonus, charges, seed, and which companies are one employer. */
@Component({
  selector: 'app-further-settings',
  imports: [MatFormFieldModule, MatInput, NumberField],
  templateUrl: './further-settings.html',
  styleUrl: './rules-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FurtherSettings {
  readonly settings = input.required<MatchingSettings>();
  readonly faults = input.required<ReadonlyMap<string, string>>();
  readonly locked = input(false);
  readonly changed = output<Partial<MatchingSettings>>();

  /** As it was typed, with its blank lines and commas, as long as it means the groups of the settings. */
  protected readonly groups = linkedSignal<string[][], string>({
    source: () => this.settings().employerGroups,
    computation: (groups, previous) => {
      const text = groupsToText(groups);
      return previous !== undefined && groupsToText(textToGroups(previous.value)) === text ? previous.value : text;
    },
  });

  protected typeCharge(place: number, value: number): void {
    this.changed.emit({
      loadCharges: this.settings().loadCharges.map((charge, at) => (at === place ? value : charge)),
    });
  }

  protected typeGroups(event: Event): void {
    const text = (event.target as HTMLTextAreaElement).value;
    this.groups.set(text);
    this.changed.emit({ employerGroups: textToGroups(text) });
  }

  /** "1st place", "3rd place on" */
  protected chargeLabel(place: number, last: boolean): string {
    const ordinal = ['1st', '2nd', '3rd', '4th', '5th', '6th'][place];
    return last ? `${ordinal} place on` : `${ordinal} place`;
  }

  /** The sentence of one place; that of their order stands at the last. */
  protected chargeFault(place: number, last: boolean): string {
    return this.faults().get(`loadCharges.${place}`) ?? (last ? this.faults().get('loadCharges') : '') ?? '';
  }
}
