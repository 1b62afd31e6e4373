/** The choices of a profile that are not text: topics, times, languages, employer, wishes. */
import type {
  AboutSection,
  CareerStage,
  LanguageSkill,
  MeetingMode,
  Region,
  Sector,
  Slot,
} from '../../../shared/profiles/profiles-contract';
import type { Blueprint } from './blueprints';
import type { DemoTagChoice } from './demo-shapes';
import { type DemoEmployer, EMPLOYERS } from './employers';
import { townsOf } from './gazetteer';
import type { Chance } from './random';
import type { PracticeAreaSlug } from './tags';
import { TAGS } from './tags';

const ALL_STAGES: readonly CareerStage[] = ['student', 'graduate', 'candidate', 'chartered', 'senior', 'returning'];

interface TopicHabit {
  weight: number;
  /** Stages that seek it. */
  soughtBy: readonly CareerStage[];
  /** Years of practice from which a mentor would offer it. */
  offeredFrom: number;
}

// Topics of a practice area are not here: they are taken up by people of that area only.
const TOPIC_HABITS: Record<string, TopicHabit> = {
  chartership: { weight: 26, soughtBy: ['graduate', 'candidate'], offeredFrom: 8 },
  'first-site-lead': { weight: 14, soughtBy: ['graduate', 'candidate'], offeredFrom: 8 },
  'fieldwork-safety': { weight: 9, soughtBy: ['graduate', 'candidate', 'student'], offeredFrom: 8 },
  tendering: { weight: 10, soughtBy: ['candidate', 'chartered'], offeredFrom: 10 },
  'career-break-return': { weight: 30, soughtBy: ['returning'], offeredFrom: 12 },
  'running-a-practice': { weight: 8, soughtBy: ['candidate', 'chartered', 'returning'], offeredFrom: 12 },
  'leading-a-team': { weight: 16, soughtBy: ['chartered', 'senior'], offeredFrom: 10 },
  'client-conversations': { weight: 14, soughtBy: ['graduate', 'candidate', 'chartered'], offeredFrom: 8 },
  'report-writing': { weight: 12, soughtBy: ['student', 'graduate', 'candidate'], offeredFrom: 8 },
  'expert-witness': { weight: 6, soughtBy: ['chartered', 'senior'], offeredFrom: 15 },
  'work-life-balance': { weight: 9, soughtBy: ['candidate', 'chartered', 'returning'], offeredFrom: 8 },
  'public-service': { weight: 5, soughtBy: ['candidate', 'chartered', 'returning'], offeredFrom: 10 },
  'working-abroad': { weight: 5, soughtBy: ['student', 'graduate'], offeredFrom: 10 },
  programming: { weight: 9, soughtBy: ['student', 'graduate', 'candidate', 'returning'], offeredFrom: 8 },
  'quality-assurance': { weight: 10, soughtBy: ['graduate', 'candidate', 'chartered'], offeredFrom: 8 },
  succession: { weight: 5, soughtBy: ['chartered', 'senior'], offeredFrom: 22 },
  presenting: { weight: 8, soughtBy: ['student', 'graduate', 'candidate', 'chartered'], offeredFrom: 8 },
  'research-and-teaching': { weight: 5, soughtBy: ['student', 'graduate'], offeredFrom: 70 },
  'new-in-ellmark': { weight: 5, soughtBy: ['graduate', 'candidate'], offeredFrom: 70 },
  'rail-and-track': { weight: 4, soughtBy: ['graduate', 'candidate'], offeredFrom: 70 },
};

const topicsOf = (area: PracticeAreaSlug): string[] => TAGS.filter((tag) => tag.parent === area).map((tag) => tag.slug);
const asWeighted = (slugs: readonly string[]) => slugs.map((slug) => [slug, TOPIC_HABITS[slug]?.weight ?? 10] as const);

function drawTopics(luck: Chance, count: number, pool: readonly (readonly [string, number])[]): string[] {
  const chosen = new Set<string>();
  for (let tries = 0; chosen.size < Math.min(count, pool.length) && tries < 60; tries++)
    chosen.add(luck.pickWeighted(pool));
  return [...chosen];
}

export interface Background {
  newcomer: boolean;
  academic: boolean;
  /** Has a practice of their own. */
  independent: boolean;
  /** Works for a private firm, which somebody may take over one day. */
  privateFirm: boolean;
}

const DESK_AREAS: readonly PracticeAreaSlug[] = ['land-valuation', 'planning-and-consents', 'gis-and-data'];
const FIELD_TOPICS = ['first-site-lead', 'fieldwork-safety'];
const OWNER_TOPICS = ['running-a-practice', 'succession'];

const atDesk = (area: PracticeAreaSlug | undefined): boolean => area !== undefined && DESK_AREAS.includes(area);

export function soughtTopics(luck: Chance, plan: Blueprint, who: Background): string[] {
  const general = Object.entries(TOPIC_HABITS)
    .filter(([slug, habit]) => habit.soughtBy.includes(plan.stage) && (slug !== 'new-in-ellmark' || who.newcomer))
    .map(([slug]) => slug)
    .filter((slug) => !FIELD_TOPICS.includes(slug) || !atDesk(plan.seeks[0]))
    .filter((slug) => slug !== 'succession' || who.privateFirm);
  const own = plan.seeks[0] === undefined || luck.happens(0.6) ? [] : luck.sample(topicsOf(plan.seeks[0]), 1);
  return [...new Set([...own, ...drawTopics(luck, luck.between(1, 3), asWeighted(general))])];
}

export function offeredTopics(luck: Chance, plan: Blueprint, who: Background): string[] {
  const general = Object.entries(TOPIC_HABITS)
    .filter(([, habit]) => plan.years >= habit.offeredFrom)
    .map(([slug]) => slug)
    .filter((slug) => who.independent || !OWNER_TOPICS.includes(slug))
    .filter((slug) => !FIELD_TOPICS.includes(slug) || !atDesk(plan.offers[0]));
  if (who.academic) general.push('research-and-teaching');
  if (who.newcomer) general.push('new-in-ellmark');
  if (plan.offers.includes('engineering-setting-out')) general.push('rail-and-track');
  const own = plan.offers.slice(0, 2).flatMap((area) => luck.sample(topicsOf(area), 1));
  return [...new Set([...own, ...drawTopics(luck, luck.between(3, 6), asWeighted(general))])];
}

/** The first tag matters most; priorities fall along the list. */
export function withPriorities(areas: readonly string[], topics: readonly string[]): DemoTagChoice[] {
  const priority = (index: number) => (index === 0 ? 1 : index === 1 ? 2 : 3);
  return [
    ...areas.map((slug, index): DemoTagChoice => ({ slug, priority: priority(index) })),
    ...topics.map((slug, index): DemoTagChoice => ({ slug, priority: priority(index) })),
  ];
}

const WORKDAYS = ['mon', 'tue', 'wed', 'thu', 'fri'] as const;
const on = (
  part: 'morning' | 'midday' | 'afternoon' | 'evening',
  days: readonly (typeof WORKDAYS)[number][] = WORKDAYS,
) => days.map((day): Slot => `${day}-${part}`);

/** Ways in which surveyors keep time free: after work, at lunch, on office days between field days … */
const TIME_HABITS: readonly (readonly [slots: readonly Slot[], weight: number])[] = [
  [on('evening', ['mon', 'tue', 'wed', 'thu']), 26],
  [on('midday'), 24],
  [[...on('afternoon', ['thu', 'fri']), ...on('midday', ['thu', 'fri'])], 16],
  [[...on('morning', ['mon', 'tue']), ...on('midday', ['mon', 'tue', 'wed'])], 14],
  [['sat-morning', 'sat-afternoon', 'fri-evening', 'sun-evening'], 5],
  [[...on('morning'), ...on('afternoon', ['wed', 'fri'])], 15],
];

/** Two habits together, or three, with a few slots taken away: five to eleven slots. */
export function drawAvailability(luck: Chance): Slot[] {
  const slots = new Set<Slot>();
  const habits = luck.happens(0.3) ? 3 : 2;
  for (let tries = 0; tries < habits || slots.size < 6; tries++) {
    for (const slot of luck.pickWeighted(TIME_HABITS)) slots.add(slot);
  }
  const kept = luck.sample([...slots], Math.min(11, Math.max(5, slots.size - luck.between(0, 3))));
  const order = ['mon', 'tue', 'wed', 'thu', 'fri', 'sat', 'sun'];
  const parts = ['morning', 'midday', 'afternoon', 'evening'];
  const rank = (slot: Slot): number => {
    const [day = '', part = ''] = slot.split('-');
    return order.indexOf(day) * 4 + parts.indexOf(part);
  };
  return kept.sort((one, other) => rank(one) - rank(other));
}

/** English is the working language of Ellmark; many grew up with another, and most neighbours read some Danish. */
export function drawLanguages(luck: Chance, origin: string, experienced: boolean): LanguageSkill[] {
  const skills: LanguageSkill[] = [];
  if (origin !== 'en') skills.push({ code: origin, level: 'first' });
  const english = experienced
    ? luck.pickWeighted([
        ['C2', 60],
        ['C1', 36],
        ['B2', 4],
      ] as const)
    : luck.pickWeighted([
        ['C2', 40],
        ['C1', 45],
        ['B2', 15],
      ] as const);
  skills.push({ code: 'en', level: origin === 'en' || luck.happens(0.25) ? 'first' : english });
  if (origin !== 'da' && luck.happens(0.35)) {
    skills.push({ code: 'da', level: luck.pick(['A2', 'B1', 'B2', 'C1'] as const) });
  }
  if (luck.happens(0.18)) {
    const code = luck.pick(['de', 'fr', 'no', 'sv']);
    skills.push({ code, level: luck.pick(['A2', 'B1', 'B2'] as const) });
  }
  return skills;
}

export function drawMode(luck: Chance): MeetingMode {
  return luck.pickWeighted([
    ['both', 74],
    ['remote', 19],
    ['in-person', 7],
  ] as const);
}

export interface Placement {
  employer: string;
  domain: string;
  sector: Sector;
  town: string;
}

function slug(text: string): string {
  return text.replaceAll(/[^a-z0-9]+/g, '');
}

/** An employer that works in the person's area and region; experienced people may have a practice of their own. */
export function drawPlacement(luck: Chance, plan: Blueprint, mailName: string, family: string): Placement {
  const area = plan.offers[0] ?? plan.seeks[0] ?? 'gis-and-data';
  const town = townFor(luck, plan.region);
  if (plan.side !== 'mentee' && plan.years >= 33 && luck.happens(0.5)) {
    return { employer: '', domain: 'ellmark-members.example', sector: 'self-employed', town };
  }
  if (plan.years >= 9 && plan.side === 'mentor' && luck.happens(0.2)) {
    const word = luck.pick(['Survey', 'Land Survey', 'Surveying', 'Measured Survey', 'Consulting']);
    const last = mailName.split('.').at(-1) ?? mailName;
    return { employer: `${family} ${word}`, domain: `${slug(last)}-survey.example`, sector: 'self-employed', town };
  }
  const employer = luck.pick(employersFor(area, plan));
  const written =
    employer.alsoWritten.length > 0 && luck.happens(0.3) ? luck.pick(employer.alsoWritten) : employer.name;
  return { employer: written, domain: employer.domain, sector: employer.sector, town };
}

function employersFor(area: PracticeAreaSlug, plan: Blueprint): DemoEmployer[] {
  if (plan.stage === 'student') {
    const places = EMPLOYERS.filter((each) => each.sector === 'academic');
    const teaching = places.filter((each) => each.areas.includes(area));
    return teaching.length > 0 ? teaching : places.slice(0, 1);
  }
  const ofArea = EMPLOYERS.filter((each) => each.areas.includes(area));
  const near = ofArea.filter((each) => each.regions.includes(plan.region));
  return near.length > 0 ? near : ofArea;
}

function townFor(luck: Chance, region: Region): string {
  const towns = townsOf(region);
  return luck.pickWeighted(towns.map((town, index) => [town.name, index === 0 ? 3 : 1.6] as const));
}

/** A few members work abroad for a while and meet by video. */
const ABROAD: readonly AboutSection['timeZone'][] = [
  'Europe/London',
  'Atlantic/Reykjavik',
  'Africa/Lagos',
  'Asia/Dubai',
  'Asia/Kolkata',
  'America/Halifax',
  'Europe/Helsinki',
  'Europe/Lisbon',
];
export const HOME_ZONE = 'Europe/Copenhagen';

export function drawTimeZone(luck: Chance): string {
  return luck.happens(0.035) ? luck.pick(ABROAD) : HOME_ZONE;
}

/** As a mentor: stages wished for; empty = any. */
export function drawWishedStages(luck: Chance, plan: Blueprint): CareerStage[] {
  if (plan.side === 'mentee' || luck.happens(0.5)) return [];
  const likely = luck.pick([
    ['graduate', 'candidate'],
    ['candidate', 'chartered', 'returning'],
    ['student', 'graduate', 'candidate'],
    ['graduate', 'candidate', 'chartered', 'returning'],
  ] as const);
  return ALL_STAGES.filter((stage) => (likely as readonly CareerStage[]).includes(stage));
}

/** As a mentee: years of practice wished for; null = the cycle's range. */
export function drawWishedYears(luck: Chance, plan: Blueprint): { min: number | null; max: number | null } {
  if (plan.side === 'mentor' || luck.happens(0.35)) return { min: null, max: null };
  const min = Math.max(5, plan.years + luck.pick([3, 5, 5, 8]));
  return { min, max: min + luck.pick([12, 15, 20, 25]) };
}
