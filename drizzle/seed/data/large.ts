/** An association of any size with the same kinds of people, for the benchmark and for trying the product at scale. */
import {
  asMentee,
  asMentor,
  type Blueprint,
  type Market,
  menteeBlueprint,
  mentorBlueprint,
  sharePlaces,
} from './blueprints';
import { applicationsOf, DEMO_TODAY, winterDraft } from './cycles';
import type { DemoAssociation } from './demo-shapes';
import { TOWNS } from './gazetteer';
import { type CastMember, STAFF } from './named-people';
import { PersonWriter } from './person-writer';
import { chance } from './random';
import { TAGS } from './tags';

export interface LargeSize {
  mentees: number;
  mentors: number;
}

/** One in nine is a hydrographic surveyor, one in seventeen works underground; mentors of these two are rarer. */
const MENTEE_SHARE: readonly (readonly [Market, number])[] = [
  ['hydrographic', 11],
  ['mine-and-tunnel', 6],
  ['general', 83],
];
const MENTOR_SHARE: readonly (readonly [Market, number])[] = [
  ['hydrographic', 9.5],
  ['mine-and-tunnel', 5.2],
  ['general', 85.3],
];

/**
 * People and one cycle in matching, with `mentees` mentees and `mentors` mentors (1.7 places each on average).
 * Addresses are unique; in very large associations some texts come twice. Linear time.
 */
export function largeAssociation(seed: number, size: LargeSize, today: string = DEMO_TODAY): DemoAssociation {
  const luck = chance(seed).fork('large');
  const writer = new PersonWriter(STAFF);
  const places = sharePlaces(luck, size.mentors, Math.round(size.mentors * 1.7));
  const plans: Blueprint[] = [
    ...Array.from({ length: size.mentees }, () =>
      menteeBlueprint(luck, luck.pickWeighted(MENTEE_SHARE), { winter2026: asMentee() }),
    ),
    ...places.map((count) =>
      mentorBlueprint(luck, luck.pickWeighted(MENTOR_SHARE), { winter2026: asMentor(count, luck.happens(0.3)) }),
    ),
  ];
  const cast: CastMember[] = plans.map((plan) => ({ plan, goals: '', ...writer.write(luck, plan) }));
  const cycle = winterDraft(today);
  return {
    towns: TOWNS,
    tags: TAGS,
    people: [...STAFF.map((person) => structuredClone(person)), ...cast.map(({ person }) => person)],
    cycles: [
      {
        key: 'winter-2026',
        phase: 'matching',
        draft: cycle,
        publishedOn: null,
        applications: applicationsOf(luck.fork('applications'), cast, 'winter2026', cycle, today),
        outcomes: [],
      },
    ],
  };
}
