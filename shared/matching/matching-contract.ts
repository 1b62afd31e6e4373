/** A cycle's matching settings: the aim, the rules (hard), the criteria (soft) with their weights, and what spreads the load. */
import { z } from 'zod';
import { LanguageLevel } from '../profiles/profiles-contract';

export const Aim = z.enum(['everyone-first', 'best-total', 'lift-the-weakest']);
export type Aim = z.infer<typeof Aim>;
export const AIM_LABEL: Record<Aim, string> = {
  'everyone-first': 'As many pairings as possible, then the best fit',
  'best-total': 'The best total fit, even if somebody is left out for it',
  'lift-the-weakest': 'As many pairings as possible, then the weakest of them as good as it can be',
};

const on = { on: z.boolean() };
const whole = (min: number, max: number, unit: string) =>
  z
    .int(`A whole number of ${unit}`)
    .min(min, `Between ${min} and ${max} ${unit}`)
    .max(max, `Between ${min} and ${max} ${unit}`);

/** Each rule of the catalogue with its parameters. Fits are 0..10000 (shown as 0–100), distances kilometres. */
export const RuleSetting = z.discriminatedUnion('rule', [
  z.strictObject({ rule: z.literal('no-two-way-swap'), ...on }),
  z.strictObject({ rule: z.literal('different-employer'), ...on }),
  z.strictObject({ rule: z.literal('no-declared-interest'), ...on }),
  z.strictObject({ rule: z.literal('no-private-exclusion'), ...on }),
  z.strictObject({ rule: z.literal('no-earlier-pairing'), ...on, cycles: whole(1, 20, 'cycles') }),
  z.strictObject({
    rule: z.literal('years-apart'),
    ...on,
    min: whole(0, 50, 'years'),
    max: whole(1, 70, 'years').nullable(),
  }),
  z.strictObject({ rule: z.literal('common-language'), ...on, level: LanguageLevel }),
  z.strictObject({ rule: z.literal('meeting'), ...on, maxKm: whole(1, 1000, 'kilometres') }),
  z.strictObject({ rule: z.literal('common-times'), ...on, slots: whole(1, 28, 'times') }),
  z.strictObject({ rule: z.literal('practice-areas'), ...on, areas: whole(1, 15, 'areas') }),
  z.strictObject({ rule: z.literal('wished-stages'), ...on }),
  z.strictObject({ rule: z.literal('minimum-fit'), ...on, fit: whole(0, 10_000, 'hundredths') }),
]);
export type RuleSetting = z.infer<typeof RuleSetting>;
/** `not-oneself` and `not-declined` hold in every cycle and have no setting. */
export type RuleKey = RuleSetting['rule'] | 'not-oneself' | 'not-declined';

const weight = { weight: z.number().min(0, 'Between 0 and 100').max(100, 'Between 0 and 100') };
/** Each criterion with its weight; 0 = left out of the fit. */
export const CriterionSetting = z.discriminatedUnion('criterion', [
  z.strictObject({ criterion: z.literal('practice-areas'), ...weight }),
  z.strictObject({ criterion: z.literal('topics'), ...weight }),
  z.strictObject({ criterion: z.literal('weekly-overlap'), ...weight, wanted: whole(1, 28, 'times') }),
  z.strictObject({ criterion: z.literal('distance'), ...weight }),
  z.strictObject({ criterion: z.literal('years'), ...weight, from: whole(0, 70, 'years'), to: whole(0, 70, 'years') }),
  z.strictObject({ criterion: z.literal('language'), ...weight }),
  z.strictObject({ criterion: z.literal('sector'), ...weight }),
  z.strictObject({ criterion: z.literal('preference'), ...weight }),
  z.strictObject({ criterion: z.literal('stages'), ...weight }),
]);
export type CriterionSetting = z.infer<typeof CriterionSetting>;
export type CriterionKey = CriterionSetting['criterion'];

const eachOnce = (keys: readonly string[], expected: number): boolean =>
  keys.length === expected && new Set(keys).size === expected;

export const MatchingSettings = z
  .strictObject({
    aim: Aim,
    rules: z.array(RuleSetting).refine(
      (rules) =>
        eachOnce(
          rules.map((rule) => rule.rule),
          RuleSetting.options.length,
        ),
      'Each rule once',
    ),
    criteria: z
      .array(CriterionSetting)
      .refine(
        (criteria) =>
          eachOnce(
            criteria.map((each) => each.criterion),
            CriterionSetting.options.length,
          ),
        'Each criterion once',
      )
      .refine((criteria) => criteria.some((each) => each.weight > 0), 'Give at least one criterion a weight'),
    /** Added to the weight of every pairing of a mentee who was left out last time; fit units. */
    leftOutBonus: whole(0, 10_000, 'hundredths'),
    /** Charge for a mentor's 1st, 2nd, … place; fit units; the last repeats. */
    loadCharges: z
      .array(whole(0, 10_000, 'hundredths'))
      .min(1)
      .max(6)
      .refine((charges) => charges.every((charge, place) => place === 0 || charge >= charges[place - 1]!), {
        message: 'Each further place costs at least as much as the one before',
      }),
    /** Names that count as one employer, a list for each group of companies. */
    employerGroups: z.array(z.array(z.string().trim().min(1).max(120)).min(2).max(50)).max(200),
    seed: z.int().min(0).max(2_147_483_647),
  })
  .superRefine((settings, check) => {
    const years = settings.criteria.findIndex((each) => each.criterion === 'years' && each.from > each.to);
    if (years >= 0)
      check.addIssue({
        code: 'custom',
        path: ['criteria', years, 'to'],
        message: 'The lower number of years comes first',
      });
    const apart = settings.rules.findIndex(
      (rule) => rule.rule === 'years-apart' && rule.max !== null && rule.min > rule.max,
    );
    if (apart >= 0)
      check.addIssue({ code: 'custom', path: ['rules', apart, 'max'], message: 'At most is not less than at least' });
  });
export type MatchingSettings = z.infer<typeof MatchingSettings>;

/** The default set of a new cycle (common practice, no source); each can be changed per cycle. */
export const DEFAULT_MATCHING_SETTINGS: MatchingSettings = {
  aim: 'everyone-first',
  rules: [
    { rule: 'no-two-way-swap', on: true },
    { rule: 'different-employer', on: true },
    { rule: 'no-declared-interest', on: true },
    { rule: 'no-private-exclusion', on: true },
    { rule: 'no-earlier-pairing', on: true, cycles: 3 },
    { rule: 'years-apart', on: true, min: 3, max: null },
    { rule: 'common-language', on: true, level: 'B1' },
    { rule: 'meeting', on: true, maxKm: 80 },
    { rule: 'common-times', on: true, slots: 1 },
    { rule: 'practice-areas', on: true, areas: 1 },
    { rule: 'wished-stages', on: false },
    { rule: 'minimum-fit', on: false, fit: 3000 },
  ],
  criteria: [
    { criterion: 'practice-areas', weight: 30 },
    { criterion: 'topics', weight: 15 },
    { criterion: 'weekly-overlap', weight: 12, wanted: 4 },
    { criterion: 'distance', weight: 10 },
    { criterion: 'years', weight: 8, from: 5, to: 15 },
    { criterion: 'language', weight: 5 },
    { criterion: 'sector', weight: 5 },
    { criterion: 'preference', weight: 10 },
    { criterion: 'stages', weight: 5 },
  ],
  leftOutBonus: 500,
  loadCharges: [0, 300, 600],
  employerGroups: [],
  seed: 1,
};
