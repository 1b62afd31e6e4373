import { DEFAULT_MATCHING_SETTINGS } from '../../../../shared/matching/matching-contract';
import {
  differencesOf,
  faultsOfSettings,
  groupsToText,
  textToGroups,
  withCriterion,
  withRule,
} from './settings-changes';

const start = DEFAULT_MATCHING_SETTINGS;

describe('changes of settings', () => {
  it('replace one rule or criterion and name it', () => {
    const changed = withCriterion(withRule(start, { rule: 'meeting', on: true, maxKm: 40 }), {
      criterion: 'distance',
      weight: 25,
    });
    expect(differencesOf(start, changed)).toEqual([
      'A way to meet: A way to meet that both accept; in person only within 80 km → A way to meet that both accept; in person only within 40 km',
      'Distance: weight 10 → 25',
    ]);
    expect(differencesOf(start, start)).toEqual([]);
  });

  it('find faults with the path of their field', () => {
    const wrong = withRule(start, { rule: 'years-apart', on: true, min: 9, max: 4 });
    const at = start.rules.findIndex((rule) => rule.rule === 'years-apart');
    expect(faultsOfSettings(wrong).get(`rules.${at}.max`)).toBe('At most is not less than at least');
    expect(faultsOfSettings(start).size).toBe(0);
  });

  it('read groups of companies from lines', () => {
    const groups = [
      ['Aldermoor', 'Aldermoor Rail'],
      ['Thornfield', 'Thornfield Aerial'],
    ];
    expect(textToGroups(groupsToText(groups) + '\n\n')).toEqual(groups);
  });
});
