import { DEFAULT_MATCHING_SETTINGS } from '../../../../shared/matching/matching-contract';
import { differencesOf, groupsToText, sameSettings, textToGroups, withCriterion, withRule } from './settings-changes';

const start = DEFAULT_MATCHING_SETTINGS;

describe('changes of settings', () => {
  it('replace one rule or criterion, leave what they began with, and name it', () => {
    const before = structuredClone(start);
    const changed = withCriterion(withRule(start, { rule: 'meeting', on: true, maxKm: 40 }), {
      criterion: 'distance',
      weight: 25,
    });
    expect(differencesOf(start, changed)).toEqual([
      'A way to meet: A way to meet that both accept; in person only within 80 km → A way to meet that both accept; in person only within 40 km',
      'Distance: weight 10 → 25',
    ]);
    expect(start).toEqual(before);
    expect(sameSettings(start, withRule(changed, { rule: 'meeting', on: true, maxKm: 80 }))).toBe(false);
    expect(differencesOf(start, start)).toEqual([]);
  });

  it('say on and off, and numbers of a rule that stays off', () => {
    const changed = [
      { rule: 'different-employer', on: false } as const,
      { rule: 'years-apart', on: false, min: 3, max: null } as const,
      { rule: 'minimum-fit', on: false, fit: 4000 } as const,
    ].reduce(withRule, start);
    expect(differencesOf(start, changed)).toEqual([
      'Different employer: on → off',
      'Years in practice apart: At least 3 years apart → off',
      'Minimum fit: still off, its numbers changed',
    ]);
  });

  it('say the numbers of a criterion and of what spreads the load', () => {
    const changed = {
      ...withCriterion(start, { criterion: 'years', weight: 8, from: 3, to: 10 }),
      leftOutBonus: 750,
      loadCharges: [0, 350, 600],
      seed: 7,
    };
    expect(differencesOf(start, changed)).toEqual([
      'Years of practice: 5 to 15 years → 3 to 10 years',
      'Bonus for those left out last time: 5.0 → 7.5',
      'Charges for a mentor’s places: 0.0, 3.0, 6.0 → 0.0, 3.5, 6.0',
      'Seed: 1 → 7',
    ]);
  });

  it('read groups of companies from lines', () => {
    const groups = [
      ['Aldermoor', 'Aldermoor Rail'],
      ['Thornfield', 'Thornfield Aerial'],
    ];
    expect(textToGroups(groupsToText(groups) + '\n\n')).toEqual(groups);
  });
});
