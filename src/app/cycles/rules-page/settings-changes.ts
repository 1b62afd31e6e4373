/** Pure changes of matching settings, and differences between two of them in words. */
import { CRITERIA, RULES, ruleInWords } from '../../../../shared/matching/catalogue';
import {
  AIM_LABEL,
  type CriterionSetting,
  MatchingSettings,
  type RuleSetting,
} from '../../../../shared/matching/matching-contract';

export const withRule = (settings: MatchingSettings, changed: RuleSetting): MatchingSettings => ({
  ...settings,
  rules: settings.rules.map((rule) => (rule.rule === changed.rule ? changed : rule)),
});

export const withCriterion = (settings: MatchingSettings, changed: CriterionSetting): MatchingSettings => ({
  ...settings,
  criteria: settings.criteria.map((each) => (each.criterion === changed.criterion ? changed : each)),
});

/** A group a line, names separated by commas. */
export const groupsToText = (groups: readonly (readonly string[])[]): string =>
  groups.map((group) => group.join(', ')).join('\n');

export const textToGroups = (text: string): string[][] =>
  text
    .split('\n')
    .map((line) =>
      line
        .split(',')
        .map((name) => name.trim())
        .filter(Boolean),
    )
    .filter((group) => group.length > 0);

export const sameSettings = (a: MatchingSettings, b: MatchingSettings): boolean =>
  JSON.stringify(a) === JSON.stringify(b);

/** Sentences beside fields, by the path of the field ("rules.5.min"). */
export function faultsOfSettings(settings: MatchingSettings): ReadonlyMap<string, string> {
  const result = MatchingSettings.safeParse(settings);
  if (result.success) return new Map();
  return new Map(result.error.issues.map((issue) => [issue.path.join('.'), issue.message]));
}

const onOff = (rule: RuleSetting): string => (rule.on ? ruleInWords(rule) : 'off');

/** What differs between two settings, a line each. */
export function differencesOf(before: MatchingSettings, after: MatchingSettings): string[] {
  const lines: string[] = [];
  if (before.aim !== after.aim) lines.push(`Aim: ${AIM_LABEL[before.aim]} → ${AIM_LABEL[after.aim]}`);
  for (const rule of after.rules) {
    const earlier = before.rules.find((each) => each.rule === rule.rule);
    if (earlier && JSON.stringify(earlier) !== JSON.stringify(rule))
      lines.push(`${RULES[rule.rule].label}: ${onOff(earlier)} → ${onOff(rule)}`);
  }
  for (const criterion of after.criteria) {
    const earlier = before.criteria.find((each) => each.criterion === criterion.criterion);
    if (!earlier || JSON.stringify(earlier) === JSON.stringify(criterion)) continue;
    const label = CRITERIA[criterion.criterion].label;
    lines.push(
      earlier.weight === criterion.weight
        ? `${label}: its numbers changed`
        : `${label}: weight ${earlier.weight} → ${criterion.weight}`,
    );
  }
  if (before.leftOutBonus !== after.leftOutBonus)
    lines.push(`Bonus: ${before.leftOutBonus / 100} → ${after.leftOutBonus / 100}`);
  if (String(before.loadCharges) !== String(after.loadCharges)) lines.push('Charges for further places changed');
  if (groupsToText(before.employerGroups) !== groupsToText(after.employerGroups))
    lines.push('Groups of companies changed');
  if (before.seed !== after.seed) lines.push(`Seed: ${before.seed} → ${after.seed}`);
  return lines;
}
