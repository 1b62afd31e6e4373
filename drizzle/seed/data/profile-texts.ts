/** Puts a profile's texts together from hand-written parts, so that each fits its person and none is written twice. */
import type { CareerStage, MeetingMode } from '../../../shared/profiles/profiles-contract';
import { AREA_WORDS } from './area-words';
import {
  GENERAL_LIMITS,
  GOAL_MEASURE,
  GOAL_OPENING,
  MENTEE_CLOSING,
  MENTEE_LIMITS,
  MENTEE_OPENING,
  MENTOR_CLOSING,
  MENTOR_GOAL,
  MENTOR_OPENING,
  MODE_SENTENCE,
  STYLE_HABIT,
  STYLE_OPENING,
  STUDENT_LIMITS,
} from './common-words';
import type { Chance } from './random';
import type { PracticeAreaSlug } from './tags';
import { TOPIC_WORDS } from './topic-words';

export interface Facts {
  side: 'mentee' | 'mentor' | 'both';
  area: PracticeAreaSlug;
  stage: CareerStage;
  years: number;
  town: string;
  employer: string;
  mode: MeetingMode;
  seeksTopics: readonly string[];
  offersTopics: readonly string[];
}

/** Draws again until the text is new; after many tries the last one is taken as it is (only in very large associations). */
export class TextLedger {
  private readonly seen = new Set<string>();

  unique(draw: () => string): string {
    let text = draw();
    for (let tries = 0; tries < 200 && this.seen.has(text); tries++) text = draw();
    this.seen.add(text);
    return text;
  }
}

const SMALL_NUMBERS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];
const inWords = (count: number): string => SMALL_NUMBERS[count] ?? String(count);

/** Lower-cases the first letter, but leaves abbreviations such as GIS alone. */
const lowerFirst = (text: string): string =>
  /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;

function topicSentence(luck: Chance, topics: readonly string[], kind: 'seek' | 'offer'): string {
  const known = topics.flatMap((slug) => TOPIC_WORDS[slug]?.[kind] ?? []);
  return known.length === 0 ? '' : luck.pick(known);
}

/** At most 120 characters. */
export function writeHeadline(luck: Chance, facts: Facts): string {
  const words = AREA_WORDS[facts.area];
  const title = luck.pick(words.title);
  const work = luck.pick(words.work);
  const forms: Record<CareerStage, readonly string[]> = {
    student: [`Student, drawn to ${work}`, `Surveying student in ${facts.town}, curious about ${work}`],
    graduate: [`Graduate ${lowerFirst(title)}: ${work}`, `Graduate in ${facts.town}; ${work}`, `Early days: ${work}`],
    candidate: [
      `${title}, candidate for chartership; ${work}`,
      `${title}: ${work}`,
      `${title} in ${facts.town}: ${work}`,
    ],
    chartered: [
      `${title}: ${work}`,
      `Chartered surveyor in ${facts.town}; ${work}`,
      `${title} at ${facts.employer}; ${work}`,
    ],
    senior: [
      `Senior surveyor in ${facts.town}; ${work}`,
      `${title} with ${inWords(facts.years)} years in practice: ${work}`,
      `${title}, ${facts.town}: ${work}`,
      `Principal surveyor; ${work}`,
    ],
    returning: [`Back in practice: ${work}`, `${title}, returning after some years away; ${work}`],
  };
  const fitting = forms[facts.stage].filter((text) => text.length <= 120 && !text.includes(' at ;'));
  return luck.pick(fitting.length > 0 ? fitting : [title]);
}

function menteeHopes(luck: Chance, facts: Facts): string {
  const words = AREA_WORDS[facts.area];
  const now = facts.stage === 'graduate' || facts.stage === 'candidate' ? luck.pick(words.now) : '';
  return [
    luck.pick(MENTEE_OPENING[facts.stage]),
    now,
    `I would like to ${luck.pick(words.learn)}.`,
    topicSentence(luck, facts.seeksTopics, 'seek'),
    luck.pick(MENTEE_CLOSING),
  ]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

const TALK: readonly (readonly [lead: string, join: string])[] = [
  ['Ask me about', 'or about'],
  ['I can talk about', 'and about'],
  ['I am at home with', 'and with'],
  ['I have something to say about', 'and about'],
];

function mentorHopes(luck: Chance, facts: Facts): string {
  const [first = '', second = ''] = luck.sample(AREA_WORDS[facts.area].teach, 2);
  const [lead, join] = luck.pick(TALK);
  return [
    luck.pick(MENTOR_OPENING).replace('{years}', inWords(facts.years)),
    luck.happens(0.5) ? `${lead} ${first}.` : `${lead} ${first}, ${join} ${second}.`,
    topicSentence(luck, facts.offersTopics, 'offer'),
    luck.pick(MENTOR_CLOSING),
  ]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

export function writeHopes(luck: Chance, facts: Facts): string {
  if (facts.side === 'mentee') return menteeHopes(luck, facts);
  const offer = mentorHopes(luck, facts);
  if (facts.side === 'mentor') return offer;
  return `${offer}\n\nFor myself, I would like to ${luck.pick(AREA_WORDS[facts.area].learn)}. ${topicSentence(luck, facts.seeksTopics, 'seek')}`.trim();
}

export function writeStyle(luck: Chance, facts: Facts): string {
  const [first = '', second = ''] = luck.sample(STYLE_HABIT, 2);
  const sentences = [luck.pick(STYLE_OPENING), luck.pick(MODE_SENTENCE[facts.mode]), first];
  if (luck.happens(0.4)) sentences.push(second);
  return sentences.join(' ');
}

export function writeLimits(luck: Chance, facts: Facts): string {
  if (facts.side === 'mentee') {
    return luck.sample(facts.stage === 'student' ? STUDENT_LIMITS : MENTEE_LIMITS, 2).join(' ');
  }
  return `${luck.pick(AREA_WORDS[facts.area].limits)} ${luck.pick(GENERAL_LIMITS)}`;
}

/** A mentee's goals for one cycle. */
export function writeMenteeGoals(luck: Chance, facts: Facts): string {
  const [first = '', second = ''] = luck.sample(AREA_WORDS[facts.area].learn, 2);
  const aim = `${luck.pick(GOAL_OPENING)} ${first}.`;
  const also = luck.happens(0.45) ? `I also hope to ${second}.` : topicSentence(luck, facts.seeksTopics, 'seek');
  return [aim, also, luck.pick(GOAL_MEASURE)].filter((sentence) => sentence !== '').join(' ');
}

const MENTOR_OFFER: readonly (readonly [before: string, after: string])[] = [
  ['I would start with', '.'],
  ['We could begin with', ', and see where it leads.'],
  ['If it is about', ', all the better.'],
  ['I have most to give on', '.'],
];

/** What a mentor writes for one cycle. */
export function writeMentorGoals(luck: Chance, facts: Facts): string {
  const talk = luck.pick(AREA_WORDS[facts.area].teach);
  const [before, after] = luck.pick(MENTOR_OFFER);
  return `${luck.pick(MENTOR_GOAL)} ${before} ${talk}${after}`;
}
