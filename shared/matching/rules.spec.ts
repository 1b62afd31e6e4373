import { describe, expect, it } from 'vitest';
import { matchingInput, menteeInput, mentorInput, settingsWith } from '../../tests/support/matching-people';
import { judgeOf } from './build-problem';
import { explainPair } from './explain-pair';
import type { MatchingInput, MenteeInput } from './matching-input';

const reasons = (input: MatchingInput): string[] =>
  explainPair(judgeOf(input), 0, 0).reasons.map((reason) => reason.rule);
const between = (
  mentee: Partial<MenteeInput>,
  mentor: Parameters<typeof mentorInput>[1],
  change: Partial<MatchingInput> = {},
): string[] => reasons(matchingInput([menteeInput('a', mentee)], [mentorInput('b', mentor)], change));

describe('rules', () => {
  it('let two suitable people through', () => {
    expect(between({}, {})).toEqual([]);
  });

  it('never pair a person with themselves', () => {
    expect(between({ person: 'x' }, { person: 'x', yearsInPractice: 20 })).toEqual(['not-oneself']);
  });

  it.each([
    ['the same employer, written differently', 'Aldermoor Survey Ltd.', 'ALDERMOOR  SURVEY', ['different-employer']],
    ['an unknown employer', '', '', []],
    ['different employers', 'Aldermoor', 'Thornfield', []],
  ])('judge employers: %s', (_case, mine, theirs, expected) => {
    expect(between({ employer: mine }, { employer: theirs })).toEqual(expected);
  });

  it('count companies of one group as one employer', () => {
    const settings = { ...settingsWith({}), employerGroups: [['Aldermoor Survey', 'Aldermoor Rail']] };
    expect(between({ employer: 'Aldermoor Rail' }, { employer: 'Aldermoor Survey' }, { settings })).toEqual([
      'different-employer',
    ]);
  });

  it('respect declared interests and private exclusions of either side', () => {
    expect(between({ declaredInterests: ['person-b'] }, {})).toEqual(['no-declared-interest']);
    expect(between({}, { declaredInterests: ['person-a'] })).toEqual(['no-declared-interest']);
    expect(between({ exclusions: ['person-b'] }, {})).toEqual(['no-private-exclusion']);
    expect(between({}, { exclusions: ['person-a'] })).toEqual(['no-private-exclusion']);
  });

  it('keep earlier pairs apart for as many cycles as asked', () => {
    const earlier = (cyclesAgo: number) => [{ mentee: 'person-a', mentor: 'person-b', cyclesAgo }];
    expect(between({}, {}, { earlier: earlier(3) })).toEqual(['no-earlier-pairing']);
    expect(between({}, {}, { earlier: earlier(4) })).toEqual([]);
  });

  it('never propose a declined pairing again', () => {
    expect(between({}, {}, { declined: [{ mentee: 'person-a', mentor: 'person-b' }] })).toEqual(['not-declined']);
  });

  it.each([
    [2, 5, []],
    [2, 4, ['years-apart']],
    [null, 20, ['years-apart']],
    [2, null, ['years-apart']],
  ])('want three years between %s and %s', (mine, theirs, expected) => {
    expect(between({ yearsInPractice: mine }, { yearsInPractice: theirs })).toEqual(expected);
  });

  it('want at most the difference given', () => {
    const settings = settingsWith({ 'years-apart': { min: 3, max: 10 } });
    expect(between({}, { yearsInPractice: 13 }, { settings })).toEqual(['years-apart']);
    expect(between({}, { yearsInPractice: 12 }, { settings })).toEqual([]);
  });

  it('take the lower of both language levels', () => {
    const speaks = (level: 'A2' | 'B1' | 'first') => ({ languages: [{ code: 'da', level }] });
    expect(between(speaks('first'), speaks('A2'))).toEqual(['common-language']);
    expect(between(speaks('first'), speaks('B1'))).toEqual([]);
    expect(between({ languages: [] }, {})).toEqual(['common-language']);
  });

  it('want a way to meet that both accept, within reach', () => {
    const inPerson = { meetingMode: 'in-person' as const };
    expect(between(inPerson, { meetingMode: 'remote' })).toEqual(['meeting']);
    expect(between({ meetingMode: null }, {})).toEqual(['meeting']);
    // Port Ansel to Greyford is 46 km, to Tarnwick 112 km.
    expect(between(inPerson, { town: 'Greyford' })).toEqual([]);
    expect(between(inPerson, { town: 'Tarnwick' })).toEqual(['meeting']);
    expect(between({ ...inPerson, maxDistanceKm: 30 }, { town: 'Greyford' })).toEqual(['meeting']);
    expect(between({ ...inPerson, town: null }, {})).toEqual(['meeting']);
    expect(between({ town: null }, {})).toEqual([]);
  });

  it('want a common time of the week, each in their own zone', () => {
    expect(between({ availability: ['mon-morning'] }, { availability: ['mon-midday'] })).toEqual(['common-times']);
    // 18–22 in Copenhagen is 12–16 in New York: two hours of midday, two of afternoon.
    const across = { timeZone: 'America/New_York', availability: ['mon-midday' as const] };
    expect(between({ availability: ['mon-evening'] }, across)).toEqual([]);
    expect(between({ availability: [] }, {})).toEqual(['common-times']);
  });

  it('want a sought practice area, the same, a part of it, or what it belongs to', () => {
    const seeks = (tagId: string) => ({ seeks: [{ tagId, priority: 1 as const }] });
    expect(between(seeks('hydrographic'), { offers: ['gis'] })).toEqual(['practice-areas']);
    expect(between(seeks('gis'), { offers: ['remote-sensing'] })).toEqual([]);
    expect(between(seeks('remote-sensing'), { offers: ['gis'] })).toEqual([]);
    expect(between({ seeks: [{ tagId: 'chartership', priority: 1 }] }, { offers: ['chartership'] })).toEqual([
      'practice-areas',
    ]);
  });

  it('respect the stages a mentor wishes for where the rule is on', () => {
    const settings = settingsWith({ 'wished-stages': { on: true } });
    expect(between({}, { wishedStages: ['student'] }, { settings })).toEqual(['wished-stages']);
    expect(between({}, { wishedStages: ['graduate'] }, { settings })).toEqual([]);
    expect(between({}, { wishedStages: [] }, { settings })).toEqual([]);
  });

  it('keep pairs below the minimum fit out', () => {
    const settings = settingsWith({ 'minimum-fit': { on: true, fit: 10_000 } });
    expect(between({}, { languages: [{ code: 'en', level: 'B2' }] }, { settings })).toEqual(['minimum-fit']);
  });

  it('bar one direction of a two-way swap: the more experienced may be the mentor', () => {
    const both = (key: string, yearsInPractice: number) => ({
      mentee: menteeInput(`${key}-mentee`, { person: key, yearsInPractice }),
      mentor: mentorInput(`${key}-mentor`, { person: key, yearsInPractice }),
    });
    const young = both('young', 4);
    const old = both('old', 9);
    const settings = settingsWith({ 'years-apart': { on: false } });
    const input = matchingInput([young.mentee, old.mentee], [young.mentor, old.mentor], { settings });
    const judge = judgeOf({
      ...input,
      mentees: input.mentees.map((mentee) => ({ ...mentee, employer: `${mentee.person} alone` })),
    });
    const rulesOf = (i: number, j: number) => explainPair(judge, i, j).reasons.map((reason) => reason.rule);
    expect(rulesOf(0, 1)).toEqual([]);
    expect(rulesOf(1, 0)).toEqual(['no-two-way-swap']);
  });

  it('give every excluded pair all its reasons, in sentences', () => {
    const { reasons: found, eligible } = explainPair(
      judgeOf(
        matchingInput(
          [menteeInput('a', { employer: 'Thornfield Mapping', yearsInPractice: 9 })],
          [mentorInput('b', { offers: [] })],
        ),
      ),
      0,
      0,
    );
    expect(eligible).toBe(false);
    expect(found.map((reason) => reason.text)).toEqual([
      'Both work for Thornfield Mapping.',
      'The mentor has 10 years, the mentee 9 years in practice.',
      'The mentor offers 0 of the 1 practice areas sought.',
    ]);
  });
});
