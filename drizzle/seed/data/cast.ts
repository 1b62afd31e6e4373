/** The cast of the demo association: everybody, with the part each plays in the three cycles. */
import {
  asMentee,
  asMentor,
  type Blueprint,
  bothBlueprint,
  type Market,
  menteeBlueprint,
  mentorBlueprint,
  type Parts,
  sharePlaces,
} from './blueprints';
import { AMARA_NWOSU, type CastMember, RUTH_CALLOWAY, STAFF } from './named-people';
import { PersonWriter } from './person-writer';
import { addPrivateMatters } from './private-matters';
import { type Chance, chance } from './random';

/** The seed for which the Winter run shows the shortages that the demo is about; tests hold it. */
export const DEMO_SEED = 2026;

interface MarketSize {
  market: Market;
  /** Winter mentees who seek only; how many of them were mentees in Summer 2026 too. */
  mentees: number;
  again: number;
  /** Winter mentors who offer only, with their places; how many were mentors in Summer 2026 too. */
  mentors: number;
  places: number;
  mentorsAgain: number;
  /** Winter mentors who were mentees in Summer 2026. */
  progressed: number;
  /** People of Summer 2026 alone. */
  summerMentees: number;
  summerMentors: number;
  summerPlaces: number;
}

// Winter 2026–27 comes to 156 mentees and 148 places at 83 mentors, with eight people who are both, Amara and Ruth:
// hydrographic 34 for 26 places (8 too few), mine and tunnel 17 for 14 (3 too few), all others 105 for 108.
const MARKETS: readonly MarketSize[] = [
  {
    market: 'hydrographic',
    mentees: 34,
    again: 14,
    mentors: 15,
    places: 26,
    mentorsAgain: 10,
    progressed: 0,
    summerMentees: 3,
    summerMentors: 0,
    summerPlaces: 14,
  },
  {
    market: 'mine-and-tunnel',
    mentees: 17,
    again: 6,
    mentors: 8,
    places: 14,
    mentorsAgain: 5,
    progressed: 0,
    summerMentees: 4,
    summerMentors: 0,
    summerPlaces: 8,
  },
  {
    market: 'general',
    mentees: 96,
    again: 20,
    mentors: 51,
    places: 94,
    mentorsAgain: 38,
    progressed: 9,
    summerMentees: 64,
    summerMentors: 15,
    summerPlaces: 117,
  },
];
const BOTH = 8;
const BOTH_PLACES = 12;

/** Mentors who would take one more if asked; rarer where places are short, so that asking is worth something. */
const ONE_MORE: Record<Market, number> = { hydrographic: 0.2, 'mine-and-tunnel': 0.25, general: 0.3 };

function winterMentees(luck: Chance, size: MarketSize): Blueprint[] {
  return Array.from({ length: size.mentees }, (_, index) =>
    menteeBlueprint(luck, size.market, {
      winter2026: asMentee(),
      ...(index < size.again ? { summer2026: asMentee() } : {}),
    }),
  );
}

function mentorsOfMarket(luck: Chance, size: MarketSize): Blueprint[] {
  const winter = sharePlaces(luck, size.mentors, size.places);
  const summer = sharePlaces(luck, size.mentorsAgain + size.summerMentors, size.summerPlaces);
  const wouldTakeMore = () => luck.happens(ONE_MORE[size.market]);
  const both = winter.map((places, index) => {
    const parts: Parts = { winter2026: asMentor(places, wouldTakeMore()) };
    const before = index < size.mentorsAgain ? summer[index] : undefined;
    if (before !== undefined) parts.summer2026 = asMentor(before, false);
    const mentor = mentorBlueprint(luck, size.market, parts);
    // The last of the list are in their first years as mentors: mentee in one cycle, mentor in the next.
    if (index < size.mentors - size.progressed) return mentor;
    return {
      ...mentor,
      stage: 'chartered' as const,
      years: luck.between(8, 11),
      parts: { ...parts, summer2026: asMentee() },
    };
  });
  const summerOnly = summer
    .slice(size.mentorsAgain)
    .map((places) => mentorBlueprint(luck, size.market, { summer2026: asMentor(places, false) }));
  return [...both, ...summerOnly];
}

function summerMentees(luck: Chance, size: MarketSize): Blueprint[] {
  return Array.from({ length: size.summerMentees }, (_, index) =>
    // Some of them come back for Summer 2027.
    menteeBlueprint(luck, size.market, {
      summer2026: asMentee(),
      ...(size.market === 'general' && index < 7 ? { summer2027: asMentee() } : {}),
    }),
  );
}

function peopleOfBothSides(luck: Chance): Blueprint[] {
  return sharePlaces(luck, BOTH, BOTH_PLACES).map((places) =>
    bothBlueprint(luck, { winter2026: { ...asMentor(places, false), mentee: true } }),
  );
}

/** Late for Winter, withdrawn, or new for Summer 2027. */
function latecomers(luck: Chance): Blueprint[] {
  return [
    menteeBlueprint(luck, 'general', { winter2026: asMentee('waiting-list') }),
    menteeBlueprint(luck, 'hydrographic', { winter2026: asMentee('waiting-list') }),
    mentorBlueprint(luck, 'general', { winter2026: asMentor(1, false, 'waiting-list') }),
    menteeBlueprint(luck, 'general', { winter2026: asMentee('withdrawn') }),
    mentorBlueprint(luck, 'general', { winter2026: asMentor(2, false, 'withdrawn') }),
    ...Array.from({ length: 5 }, () => menteeBlueprint(luck, 'general', { summer2027: asMentee() })),
    menteeBlueprint(luck, 'hydrographic', { summer2027: asMentee() }),
    menteeBlueprint(luck, 'mine-and-tunnel', { summer2027: asMentee() }),
    ...Array.from({ length: 4 }, () =>
      mentorBlueprint(luck, 'general', { summer2027: asMentor(luck.between(1, 2), false) }),
    ),
    mentorBlueprint(luck, 'hydrographic', { summer2027: asMentor(1, true) }),
  ];
}

function incomplete(luck: Chance): Blueprint[] {
  return [
    menteeBlueprint(luck, 'general', { summer2027: asMentee('submitted') }),
    menteeBlueprint(luck, 'general', { summer2027: asMentee('submitted') }),
    menteeBlueprint(luck, 'hydrographic', { summer2027: asMentee('submitted') }),
    mentorBlueprint(luck, 'general', { summer2027: asMentor(2, false, 'submitted') }),
  ];
}

/** Takes away what an applicant in a hurry leaves for later: times, languages, or how to meet. */
function leaveGaps({ person }: CastMember, index: number): void {
  if (index % 2 === 0) person.meeting.availability = [];
  if (index === 1) person.about.languages = [];
  if (index === 2) person.meeting.meetingMode = null;
  if (index === 3) person.practice.sector = null;
  if (index === 3) person.about.languages = [];
  if (index === 1) person.membershipCurrent = false;
}

/** The mentors of Summer 2026 alone who have already offered places for Summer 2027. */
function offerAgain(cast: CastMember[]): void {
  const resting = cast.filter(({ plan }) => plan.parts.summer2026?.places && !plan.parts.winter2026);
  for (const member of resting.slice(0, 3)) member.plan.parts.summer2027 = asMentor(2, false);
}

/** Everybody but the three members of staff. The same seed gives the same cast. */
export function demoCast(seed: number = DEMO_SEED): CastMember[] {
  const luck = chance(seed);
  const writer = new PersonWriter([...STAFF, RUTH_CALLOWAY.person, AMARA_NWOSU.person]);
  const fresh = (part: string, plans: (own: Chance) => Blueprint[]): CastMember[] => {
    const own = luck.fork(part);
    return plans(own).map((plan) => ({ plan, goals: '', ...writer.write(own, plan) }));
  };
  const cast: CastMember[] = [structuredClone(RUTH_CALLOWAY), structuredClone(AMARA_NWOSU)];
  for (const size of MARKETS) {
    cast.push(
      ...fresh(`${size.market} mentees`, (own) => winterMentees(own, size)),
      ...fresh(`${size.market} mentors`, (own) => mentorsOfMarket(own, size)),
      ...fresh(`${size.market} of the summer`, (own) => summerMentees(own, size)),
    );
  }
  cast.push(...fresh('both sides', peopleOfBothSides), ...fresh('latecomers', latecomers));
  const unfinished = fresh('unfinished', incomplete);
  unfinished.forEach(leaveGaps);
  cast.push(...unfinished);
  offerAgain(cast);
  addPrivateMatters(luck.fork('private'), cast);
  return cast;
}
