import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { MatSlideToggle } from '@angular/material/slide-toggle';
import { RULES } from '../../../../shared/matching/catalogue';
import type { RuleEffects } from '../../../../shared/matching/effects-contract';
import type { RuleSetting } from '../../../../shared/matching/matching-contract';
import { LanguageLevel } from '../../../../shared/profiles/profiles-contract';
import { counted } from '../../ui/format/plural-pipe';
import { NumberField } from './number-field';

interface Parameter {
  key: string;
  label: string;
  unit: string;
  /** Stored in hundredths, shown in points. */
  hundredths?: true;
  /** Empty means no bound. */
  optional?: true;
}

const PARAMETERS: Partial<Record<RuleSetting['rule'], readonly Parameter[]>> = {
  'no-earlier-pairing': [{ key: 'cycles', label: 'In the last', unit: 'cycles' }],
  'years-apart': [
    { key: 'min', label: 'At least', unit: 'years' },
    { key: 'max', label: 'At most', unit: 'years', optional: true },
  ],
  meeting: [{ key: 'maxKm', label: 'In person only within', unit: 'km' }],
  'common-times': [{ key: 'slots', label: 'At least', unit: 'times' }],
  'practice-areas': [{ key: 'areas', label: 'At least', unit: 'areas' }],
  'minimum-fit': [{ key: 'fit', label: 'At least (0–100)', unit: 'points', hundredths: true }],
};

/** The rules: on or off, their numbers, and what each does on its own. */
@Component({
  selector: 'app-rule-list',
  imports: [MatFormFieldModule, MatSelectModule, MatSlideToggle, NumberField],
  templateUrl: './rule-list.html',
  styleUrl: './rules-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleList {
  readonly rules = input.required<readonly RuleSetting[]>();
  readonly faults = input.required<ReadonlyMap<string, string>>();
  readonly effects = input<RuleEffects | null>(null);
  readonly locked = input(false);
  readonly changed = output<RuleSetting>();

  protected readonly always = [RULES['not-oneself'], RULES['not-declined']];
  protected readonly levels = LanguageLevel.options.map((level) => ({
    level,
    label: level === 'first' ? 'First language' : level,
  }));
  protected readonly entries = computed(() =>
    this.rules().map((rule, at) => {
      const fields = (PARAMETERS[rule.rule] ?? []).map((parameter) => ({
        ...parameter,
        value: (rule as unknown as Record<string, number | null>)[parameter.key] ?? null,
        fault: this.faults().get(`rules.${at}.${parameter.key}`) ?? '',
      }));
      return {
        rule,
        words: RULES[rule.rule],
        effect: rule.on ? this.effectOf(rule.rule) : '',
        fields,
        // A rule that is switched off with a wrong number keeps its field, or nobody would see why saving waits.
        faulty: fields.some((field) => field.fault !== ''),
      };
    }),
  );

  protected switchOn(rule: RuleSetting, on: boolean): void {
    this.changed.emit({ ...rule, on });
  }

  protected type(rule: RuleSetting, key: string, value: number | null): void {
    this.changed.emit({ ...rule, [key]: value } as RuleSetting);
  }

  protected choose(rule: RuleSetting, level: LanguageLevel): void {
    if (rule.rule === 'common-language') this.changed.emit({ ...rule, level });
  }

  private effectOf(key: string): string {
    const effect = this.effects()?.rules.find((each) => each.rule === key);
    if (!effect) return '';
    const alone = `excludes ${counted(effect.excludesAlone, 'pair', 'pairs')} that nothing else excludes`;
    return effect.gainWithout > 0 ? `${alone}; without it ${effect.gainWithout} more could be paired` : alone;
  }
}
