/** The effect of rules and criteria on who could be paired, computed from the applicants as they are. */
import { z } from 'zod';
import { MatchingSettings } from './matching-contract';

/** Bins of the distribution of fits: each 5 points of 100 wide; the last one holds 95 to 100. */
export const FIT_BINS = 20;

export const RuleEffect = z.object({
  /** The rule's key in the settings. */
  rule: z.string(),
  label: z.string(),
  /** Pairs that this rule excludes and no other rule does. */
  excludesAlone: z.int(),
  /** How many more mentees could be paired at once without it. */
  gainWithout: z.int(),
});
export type RuleEffect = z.infer<typeof RuleEffect>;

export const RuleEffects = z.object({
  mentees: z.int(),
  mentors: z.int(),
  places: z.int(),
  eligiblePairs: z.int(),
  /** Mentees whom the rules leave without any mentor. */
  menteesWithNone: z.int(),
  /** The most mentees that can be paired at once. */
  pairable: z.int(),
  /** One entry for each active rule. */
  rules: z.array(RuleEffect),
  /** Eligible pairs by fit, in `FIT_BINS` bins. */
  distribution: z.array(z.int()),
});
export type RuleEffects = z.infer<typeof RuleEffects>;

export const EffectsRequest = z.strictObject({ settings: MatchingSettings });
export type EffectsRequest = z.input<typeof EffectsRequest>;

/** What would come of the applications that are in, if they closed now. */
export const Forecast = z.object({
  mentees: z.int(),
  mentors: z.int(),
  places: z.int(),
  pairable: z.int(),
  shortages: z.array(
    z.object({ inCommon: z.string(), mentees: z.int(), mentors: z.int(), places: z.int(), short: z.int() }),
  ),
  /** Practice areas by seekers, most first; one person can seek or offer several. */
  areas: z.array(z.object({ label: z.string(), seekers: z.int(), places: z.int() })),
});
export type Forecast = z.infer<typeof Forecast>;
