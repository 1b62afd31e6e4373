/** The demo association's three cycles: dates around a given today, applications, outcomes. Plain data. */
import type { CycleDraft } from '../../../shared/cycles/cycles-contract';
import type { PartKey } from './blueprints';
import { dayAfter, daysBetween } from './calendar';
import { DEMO_SEED, demoCast } from './cast';
import { CONSENT_TEXT, INTRODUCTION } from './cycle-texts';
import type { DemoApplication, DemoCycle } from './demo-shapes';
import type { CastMember } from './named-people';
import { demoOutcomes } from './outcomes';
import { TextLedger, writeMenteeGoals, writeMentorGoals } from './profile-texts';
import { type Chance, chance } from './random';

/** The day on which the demo was written; the seed gives the real one. */
export const DEMO_TODAY = '2026-12-01';

type Dates = Omit<CycleDraft, 'name' | 'introduction' | 'consentText' | 'askFirst' | 'autoAdmit' | 'needsApproval'>;

function draft(name: string, key: PartKey, dates: Dates): CycleDraft {
  return {
    name,
    introduction: INTRODUCTION[key],
    consentText: CONSENT_TEXT,
    askFirst: 'both',
    autoAdmit: true,
    needsApproval: false,
    ...dates,
  };
}

const summer2026 = (today: string): CycleDraft =>
  draft('Summer 2026', 'summer2026', {
    applicationsOpenOn: dayAfter(today, -305),
    applicationsCloseOn: dayAfter(today, -275),
    answersDueOn: dayAfter(today, -247),
    startsOn: dayAfter(today, -240),
    checkInOn: dayAfter(today, -150),
    endsOn: dayAfter(today, -62),
  });

export const winterDraft = (today: string): CycleDraft =>
  draft('Winter 2026–27', 'winter2026', {
    applicationsOpenOn: dayAfter(today, -81),
    applicationsCloseOn: dayAfter(today, -50),
    answersDueOn: dayAfter(today, 15),
    startsOn: dayAfter(today, 35),
    checkInOn: dayAfter(today, 122),
    endsOn: dayAfter(today, 211),
  });

const summer2027 = (today: string): CycleDraft =>
  draft('Summer 2027', 'summer2027', {
    applicationsOpenOn: dayAfter(today, -14),
    applicationsCloseOn: dayAfter(today, 21),
    answersDueOn: dayAfter(today, 63),
    startsOn: dayAfter(today, 91),
    checkInOn: dayAfter(today, 196),
    endsOn: dayAfter(today, 301),
  });

/** Mentors who agreed to be listed and offer what the mentee seeks. */
function namedMentors(luck: Chance, mentee: CastMember, mentors: readonly CastMember[]): string[] {
  if (mentee.person.name === 'Amara Nwosu')
    return mentors.filter(({ person }) => person.name === 'Ruth Calloway').map(emailOf);
  if (!luck.happens(0.42)) return [];
  const suiting = mentors.filter(
    ({ plan, person }) =>
      person.wishes.listed &&
      person.email !== mentee.person.email &&
      person.about.employer !== mentee.person.about.employer &&
      plan.offers.includes(mentee.plan.seeks[0] ?? 'gis-and-data') &&
      plan.years >= mentee.plan.years + 3,
  );
  return luck.sample(suiting, luck.between(1, 3)).map(emailOf);
}

const emailOf = ({ person }: CastMember): string => person.email;

/** Most people apply soon after opening or in the last days. */
function submittedOn(luck: Chance, cycle: CycleDraft, today: string, late: boolean): string {
  if (late) return dayAfter(cycle.applicationsCloseOn, luck.between(2, 12));
  const last = cycle.applicationsCloseOn < today ? cycle.applicationsCloseOn : today;
  const window = daysBetween(cycle.applicationsOpenOn, last);
  const part = luck.pickWeighted([
    [luck.between(0, 30), 35],
    [luck.between(30, 75), 30],
    [luck.between(80, 100), 35],
  ] as const);
  return dayAfter(cycle.applicationsOpenOn, Math.floor((window * part) / 100));
}

/** Every application to one cycle: mentors' and mentees', in the order of the cast. */
export function applicationsOf(
  luck: Chance,
  cast: readonly CastMember[],
  key: PartKey,
  cycle: CycleDraft,
  today: string,
): DemoApplication[] {
  const texts = new TextLedger();
  const mentors = cast.filter(({ plan }) => plan.parts[key]?.places && plan.parts[key].becomes === 'admitted');
  const applications: DemoApplication[] = [];
  for (const member of cast) {
    const part = member.plan.parts[key];
    if (!part) continue;
    const common = {
      personEmail: member.person.email,
      submittedOn: submittedOn(luck, cycle, today, part.becomes === 'waiting-list'),
      becomes: part.becomes,
    };
    if (part.places > 0) {
      applications.push({
        ...common,
        side: 'mentor',
        places: part.places,
        oneMoreIfAsked: part.oneMoreIfAsked,
        goals: texts.unique(() => member.goals || writeMentorGoals(luck, member.facts)),
        preferredMentors: [],
      });
    }
    if (part.mentee) {
      applications.push({
        ...common,
        side: 'mentee',
        places: 0,
        oneMoreIfAsked: false,
        goals: texts.unique(() => member.goals || writeMenteeGoals(luck, member.facts)),
        preferredMentors: namedMentors(luck, member, mentors),
      });
    }
  }
  return applications;
}

function closedCycle(luck: Chance, cast: readonly CastMember[], today: string): DemoCycle {
  const cycle = summer2026(today);
  const publishedOn = dayAfter(cycle.answersDueOn, -14);
  const applications = applicationsOf(luck, cast, 'summer2026', cycle, today);
  const mentees = applications.filter(({ side }) => side === 'mentee').map(({ personEmail }) => personEmail);
  const outcomes = demoOutcomes(luck, mentees, { ...cycle, publishedOn });
  return { key: 'summer-2026', phase: 'closed', draft: cycle, publishedOn, applications, outcomes };
}

/**
 * The three cycles, with all dates counted from `today` (`YYYY-MM-DD`), so that the demo is always current:
 * one closed, one in matching, one open for applications.
 */
export function demoCycles(seed: number = DEMO_SEED, today: string = DEMO_TODAY): DemoCycle[] {
  const cast = demoCast(seed);
  const luck = chance(seed).fork('cycles');
  const winter = winterDraft(today);
  const next = summer2027(today);
  return [
    closedCycle(luck.fork('summer 2026'), cast, today),
    {
      key: 'winter-2026',
      phase: 'matching',
      draft: winter,
      publishedOn: null,
      applications: applicationsOf(luck.fork('winter 2026'), cast, 'winter2026', winter, today),
      outcomes: [],
    },
    {
      key: 'summer-2027',
      phase: 'open',
      draft: next,
      publishedOn: null,
      applications: applicationsOf(luck.fork('summer 2027'), cast, 'summer2027', next, today),
      outcomes: [],
    },
  ];
}
