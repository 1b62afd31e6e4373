import { DEFAULT_MATCHING_SETTINGS, type MatchingSettings } from '../../../../shared/matching/matching-contract';
import { withCriterion, withRule } from './settings-changes';
import { faultsOfSettings } from './settings-faults';

const start = DEFAULT_MATCHING_SETTINGS;
const sentences = (change: Partial<MatchingSettings>): [string, string][] => [
  ...faultsOfSettings({ ...start, ...change }),
];

describe('faults of settings', () => {
  it('stand at the path of their field', () => {
    const at = start.rules.findIndex((rule) => rule.rule === 'years-apart');
    const wrong = withRule(start, { rule: 'years-apart', on: true, min: 9, max: 4 });
    expect([...faultsOfSettings(wrong)]).toEqual([[`rules.${at}.max`, 'At most is not less than at least']]);
    expect(faultsOfSettings(start).size).toBe(0);
  });

  it('speak of points where hundredths are stored', () => {
    const at = start.rules.findIndex((rule) => rule.rule === 'minimum-fit');
    const wrong = withRule(start, { rule: 'minimum-fit', on: true, fit: 10_001 });
    expect(faultsOfSettings(wrong).get(`rules.${at}.fit`)).toBe('Between 0 and 100 points');
    expect(sentences({ leftOutBonus: Number.NaN })).toEqual([['leftOutBonus', 'Between 0 and 100 points']]);
    expect(sentences({ loadCharges: [0, -1] })[0]).toEqual(['loadCharges.1', 'Between 0 and 100 points']);
  });

  it('keep the contract’s sentence on the order of charges', () => {
    expect(sentences({ loadCharges: [500, 300] })).toEqual([
      ['loadCharges', 'Each further place costs at least as much as the one before'],
    ]);
  });

  it('are plain where a number is missing', () => {
    const empty = withCriterion(start, { criterion: 'topics', weight: Number.NaN });
    expect([...faultsOfSettings(empty).values()]).toEqual(['A number between 0 and 100']);
    expect(sentences({ seed: 1.5 })).toEqual([['seed', 'A whole number from 0 to 2147483647']]);
  });

  it('name the group of companies that is wrong, all in one field', () => {
    expect(sentences({ employerGroups: [['Aldermoor', 'Aldermoor Rail'], ['Thornfield']] })).toEqual([
      ['employerGroups', '“Thornfield” stands alone on its line; a group has at least two names'],
    ]);
    expect(sentences({ employerGroups: [['Aldermoor', 'x'.repeat(121)]] })).toEqual([
      ['employerGroups', 'A name has at most 120 characters'],
    ]);
  });
});
