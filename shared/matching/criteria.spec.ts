import { describe, expect, it } from 'vitest';
import { matchingInput, menteeInput, mentorInput, settingsWith } from '../../tests/support/matching-people';
import { judgeOf } from './build-problem';
import { fitOf, MISSING } from './criteria';
import type { CriterionKey } from './matching-contract';
import type { MenteeInput } from './matching-input';

function score(
  criterion: CriterionKey,
  mentee: Partial<MenteeInput>,
  mentor: Parameters<typeof mentorInput>[1],
): number {
  const judge = judgeOf(matchingInput([menteeInput('a', mentee)], [mentorInput('b', mentor)]));
  return judge.criteria.find((each) => each.key === criterion)!.score(0, 0);
}
const seeks = (...choices: [string, 1 | 2 | 3][]) => ({
  seeks: choices.map(([tagId, priority]) => ({ tagId, priority })),
});

describe('criteria', () => {
  it('weigh sought tags 3, 2, 1 and cover children by 0.8 and parents by 0.6', () => {
    expect(score('practice-areas', seeks(['gis', 1]), { offers: ['gis', 'hydrographic'] })).toBe(1);
    expect(score('practice-areas', seeks(['gis', 1]), { offers: ['remote-sensing'] })).toBeCloseTo(0.8, 12);
    expect(score('practice-areas', seeks(['remote-sensing', 1]), { offers: ['gis'] })).toBeCloseTo(0.6, 12);
    expect(score('practice-areas', seeks(['gis', 1], ['hydrographic', 2]), { offers: ['hydrographic'] })).toBeCloseTo(
      2 / 5,
      12,
    );
    expect(score('topics', seeks(['gis', 1]), {})).toBe(MISSING);
    expect(score('practice-areas', seeks(['gis', 1]), { offers: [] })).toBe(MISSING);
  });

  it('count common times up to the number wanted', () => {
    const week = ['mon-morning', 'tue-morning', 'wed-morning', 'thu-morning', 'fri-morning'] as const;
    expect(score('weekly-overlap', { availability: [...week] }, { availability: ['mon-morning'] })).toBe(0.25);
    expect(score('weekly-overlap', { availability: [...week] }, { availability: [...week] })).toBe(1);
    expect(score('weekly-overlap', { availability: [] }, {})).toBe(MISSING);
  });

  it('halve with every 40 km where meeting remotely is not accepted by both', () => {
    const inPerson = { meetingMode: 'in-person' as const };
    expect(score('distance', {}, { town: 'Tarnwick' })).toBe(1);
    expect(score('distance', inPerson, {})).toBe(1);
    // Haversine with the IUGG mean radius gives 46.2 km between Port Ansel and Greyford.
    expect(score('distance', inPerson, { town: 'Greyford' })).toBeCloseTo(2 ** (-46.2 / 40), 2);
    expect(score('distance', inPerson, { town: null })).toBe(MISSING);
  });

  it.each([
    [5, 1],
    [15, 1],
    [20, 0.5],
    [25, 0],
    [40, 0],
    [0, 0.5],
  ])('score %d years of practice against 5–15 with %d', (yearsInPractice, expected) => {
    expect(score('years', {}, { yearsInPractice })).toBeCloseTo(expected, 12);
  });

  it('prefer the mentee’s own range of years', () => {
    expect(score('years', { wishedYearsMin: 20, wishedYearsMax: 30 }, { yearsInPractice: 15 })).toBeCloseTo(0.5, 12);
  });

  it.each([
    ['A2', 0],
    ['B1', 0.4],
    ['B2', 0.7],
    ['C1', 0.9],
    ['C2', 1],
  ] as const)('score the lower level %s with %d', (level, expected) => {
    const first = { languages: [{ code: 'en', level: 'first' as const }] };
    expect(score('language', first, { languages: [{ code: 'en', level }] })).toBe(expected);
  });

  it('follow wishes about sector, mentors and stages', () => {
    expect(score('sector', { wishedSector: 'same' }, { sector: 'public' })).toBe(0);
    expect(score('sector', { wishedSector: 'different' }, { sector: 'public' })).toBe(1);
    expect(score('sector', { wishedSector: 'same' }, { sector: null })).toBe(MISSING);
    expect(score('preference', { preferred: ['person-b'] }, {})).toBe(1);
    expect(score('preference', { preferred: ['x', 'person-b'] }, {})).toBe(0.8);
    expect(score('preference', { preferred: ['x'] }, {})).toBe(0.3);
    expect(score('preference', {}, {})).toBe(0.5);
    expect(score('stages', {}, { wishedStages: ['student'] })).toBe(0);
    expect(score('stages', { careerStage: null }, { wishedStages: ['student'] })).toBe(MISSING);
  });

  it('make a fit of 0..10000 in which missing data count as a half', () => {
    const only = settingsWith(
      {},
      Object.fromEntries(['topics', 'weekly-overlap', 'distance', 'years', 'sector'].map((key) => [key, 0])),
    );
    const settings = settingsWith(
      {},
      { ...Object.fromEntries(only.criteria.map((each) => [each.criterion, 0])), 'practice-areas': 3, topics: 1 },
    );
    const judge = judgeOf(matchingInput([menteeInput('a')], [mentorInput('b')], { settings }));
    expect(fitOf(judge.criteria, 0, 0)).toBe(Math.round(10_000 * ((3 * 1 + 1 * 0.5) / 4)));
  });
});
