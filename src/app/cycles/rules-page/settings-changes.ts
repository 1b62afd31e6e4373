/** Pure changes of matching settings, and differences between two of them in words. */
import { CRITERIA, RULES, ruleInWords } from '../../../../shared/matching/catalogue';
import {
  AIM_LABEL,
  type CriterionSetting,
  type MatchingSettings,
  type RuleSetting,
} from '../../../../shared/matching/matching-contract';
import { fitInWords } from '../../ui/format/fit-pipe';

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

/** What differs between two settings, a line each. */
export function differencesOf(before: MatchingSettings, after: MatchingSettings): string[] {
  const lines = [...rulesThatDiffer(before, after), ...criteriaThatDiffer(before, after)];
  const further = (label: string, earlier: string, now: string): void => {
    if (earlier !== now) lines.push(`${label}: ${earlier} → ${now}`);
  };
  if (before.aim !== after.aim) lines.unshift(`Aim: ${AIM_LABEL[before.aim]} → ${AIM_LABEL[after.aim]}`);
  further('Bonus for those left out last time', fitInWords(before.leftOutBonus), fitInWords(after.leftOutBonus));
  further('Charges for a mentor’s places', chargesInWords(before), chargesInWords(after));
  if (groupsToText(before.employerGroups) !== groupsToText(after.employerGroups))
    lines.push('Groups of companies changed');
  further('Seed', String(before.seed), String(after.seed));
  return lines;
}

const chargesInWords = (settings: MatchingSettings): string => settings.loadCharges.map(fitInWords).join(', ');

function rulesThatDiffer(before: MatchingSettings, after: MatchingSettings): string[] {
  return after.rules.flatMap((rule) => {
    const earlier = before.rules.find((each) => each.rule === rule.rule);
    if (!earlier || JSON.stringify(earlier) === JSON.stringify(rule)) return [];
    const label = RULES[rule.rule].label;
    if (!earlier.on && !rule.on) return [`${label}: still off, its numbers changed`];
    return [`${label}: ${onOff(earlier)} → ${onOff(rule)}`];
  });
}

/** A rule without parameters has no more words than its name, which stands before already. */
function onOff(rule: RuleSetting): string {
  if (!rule.on) return 'off';
  const words = ruleInWords(rule);
  return words === RULES[rule.rule].label ? 'on' : words;
}

function criteriaThatDiffer(before: MatchingSettings, after: MatchingSettings): string[] {
  return after.criteria.flatMap((criterion) => {
    const earlier = before.criteria.find((each) => each.criterion === criterion.criterion);
    if (!earlier || JSON.stringify(earlier) === JSON.stringify(criterion)) return [];
    const parts: string[] = [];
    if (earlier.weight !== criterion.weight) parts.push(`weight ${earlier.weight} → ${criterion.weight}`);
    const [was, is] = [parametersInWords(earlier), parametersInWords(criterion)];
    if (was !== is) parts.push(`${was} → ${is}`);
    return [`${CRITERIA[criterion.criterion].label}: ${parts.join('; ')}`];
  });
}

function parametersInWords(setting: CriterionSetting): string {
  if (setting.criterion === 'weekly-overlap')
    return `${setting.wanted} wanted ${setting.wanted === 1 ? 'time' : 'times'}`;
  return setting.criterion === 'years' ? `${setting.from} to ${setting.to} years` : '';
}
