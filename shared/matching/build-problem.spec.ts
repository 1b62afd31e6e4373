import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { matchingInput, menteeInput, mentorInput, settingsWith } from '../../tests/support/matching-people';
import { solve, verify } from '../assignment';
import { buildProblem, eligibleFit, mergedRows } from './build-problem';
import { canonicalInput, type MatchingInput } from './matching-input';
import { ruleEffects } from './rule-effects';

const areas = ['gis', 'hydrographic', 'remote-sensing'];
const randomInput = fc
  .record({
    mentees: fc.array(fc.record({ area: fc.nat(2), years: fc.nat(12), last: fc.boolean() }), { maxLength: 8 }),
    mentors: fc.array(fc.record({ area: fc.nat(2), years: fc.nat(20), places: fc.nat(3) }), { maxLength: 6 }),
  })
  .map(({ mentees, mentors }) =>
    matchingInput(
      mentees.map((each, at) =>
        menteeInput(`e${at}`, {
          seeks: [{ tagId: areas[each.area]!, priority: 1 }],
          yearsInPractice: each.years,
          leftOutLastTime: each.last,
        }),
      ),
      mentors.map((each, at) =>
        mentorInput(`r${at}`, { offers: [areas[each.area]!], yearsInPractice: each.years, places: each.places }),
      ),
    ),
  );

function reversed(input: MatchingInput): MatchingInput {
  return { ...input, mentees: [...input.mentees].reverse(), mentors: [...input.mentors].reverse() };
}

function plannedPairs(input: MatchingInput): string[] {
  const canonical = canonicalInput(input);
  const built = buildProblem(canonical);
  const plan = solve(built.problem, built.options);
  expect(verify(built.problem, plan, built.options)).toEqual({ ok: true, faults: [] });
  return [...plan.mentorOf]
    .map((mentor, i) => (mentor < 0 ? '' : `${canonical.mentees[i]!.key}-${canonical.mentors[mentor]!.key}`))
    .filter(Boolean)
    .sort();
}

describe('building the problem', () => {
  it('gives the equal plan whatever the order of rows', () => {
    fc.assert(
      fc.property(randomInput, (input) => {
        expect(plannedPairs(reversed(input))).toEqual(plannedPairs(input));
      }),
      { numRuns: 100, seed: 11 },
    );
  });

  it('adds the bonus of those left out last time to the weight, not to the fit', () => {
    const input = matchingInput([menteeInput('a'), menteeInput('b', { leftOutLastTime: true })], [mentorInput('m')]);
    const { problem, judge } = buildProblem(input);
    const fit = eligibleFit(judge, 0, 0);
    expect([...problem.fit]).toEqual([fit, fit + 500]);
    expect([...solve(problem).mentorOf]).toEqual([-1, 0]);
  });

  it('keeps a lock that overrides the rules, and only that pair', () => {
    const decisions = [{ mentee: 'a', mentor: 'm', kind: 'lock' as const, overridesRules: true }];
    const input = matchingInput([menteeInput('a', { yearsInPractice: 10 })], [mentorInput('m'), mentorInput('n')], {
      decisions,
    });
    const built = buildProblem(input);
    expect([...built.problem.target]).toEqual([0]);
    expect([...solve(built.problem, built.options).mentorOf]).toEqual([0]);
  });

  it('has room for no answer to an equality-monitoring question', () => {
    const keys = Object.keys({ ...menteeInput('a'), ...mentorInput('b') }).join(' ');
    expect(keys).not.toMatch(/gender|sex|ethnic|religion|belief|disab|orientation|birth|\bage\b|monitoring/i);
  });
});

describe('effects of rules', () => {
  it('count what each rule excludes alone, and what its absence would gain', () => {
    const input = matchingInput(
      [menteeInput('a', { employer: 'One' }), menteeInput('b', { employer: 'Two' })],
      [mentorInput('m', { employer: 'One' }), mentorInput('n', { employer: 'Three', offers: ['hydrographic'] })],
    );
    const effects = ruleEffects(input);
    expect(effects).toMatchObject({
      mentees: 2,
      mentors: 2,
      places: 2,
      eligiblePairs: 1,
      menteesWithNone: 1,
      pairable: 1,
    });
    const byRule = Object.fromEntries(effects.rules.map((rule) => [rule.rule, [rule.excludesAlone, rule.gainWithout]]));
    expect(byRule['different-employer']).toEqual([1, 0]);
    expect(byRule['practice-areas']).toEqual([2, 1]);
    expect(byRule['common-language']).toEqual([0, 0]);
    expect(effects.distribution.reduce((sum, count) => sum + count, 0)).toBe(1);
  });

  it('agree with building the problem without the rule', () => {
    fc.assert(
      fc.property(randomInput, (input) => {
        const effects = ruleEffects(input);
        const without = { ...input, settings: settingsWith({ 'practice-areas': { on: false } }) };
        const gain = effects.rules.find((rule) => rule.rule === 'practice-areas')!.gainWithout;
        expect(effects.eligiblePairs).toBe(buildProblem(input).problem.target.length);
        expect(effects.pairable + gain).toBe(solve(buildProblem(without).problem).paired);
      }),
      { numRuns: 100, seed: 12 },
    );
  });

  it('merge rows in order', () => {
    const a = { rowStart: Int32Array.of(0, 2), target: Int32Array.of(0, 3), fit: Int32Array.of(1, 2) };
    const b = { rowStart: Int32Array.of(0, 2), target: Int32Array.of(1, 4), fit: Int32Array.of(3, 4) };
    expect([...mergedRows(a, b).target]).toEqual([0, 1, 3, 4]);
    expect([...mergedRows(a, b).fit]).toEqual([1, 3, 2, 4]);
  });
});
