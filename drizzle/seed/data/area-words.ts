/** Sentence parts for each practice area, from which profiles are put together. All hand-written. */
import { LAND_WORDS } from './area-words-land';
import { MEASURING_WORDS } from './area-words-measuring';
import type { PracticeAreaSlug } from './tags';

export interface AreaWords {
  /** What somebody of this area calls themselves. */
  title: readonly string[];
  /** Noun phrases: what the days are spent on. */
  work: readonly string[];
  /** Follows "I would like to" or "I want to". */
  learn: readonly string[];
  /** Follows "I can talk about", "Ask me about". */
  teach: readonly string[];
  /** Whole sentences: what a mentor of this area leaves to others. */
  limits: readonly string[];
  /** Whole sentences: where a mentee of this area stands today. */
  now: readonly string[];
}

export const AREA_WORDS: Record<PracticeAreaSlug, AreaWords> = { ...LAND_WORDS, ...MEASURING_WORDS };
