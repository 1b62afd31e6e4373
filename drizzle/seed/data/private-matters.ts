/** Things that only coordinators see: whom somebody does not wish to be paired with, and interests they have declared. */
import type { InterestKind } from '../../../shared/profiles/profiles-contract';
import type { CastMember } from './named-people';
import type { Chance } from './random';

const KINDS: readonly InterestKind[] = [
  'family',
  'assessor',
  'reporting-line',
  'other',
  'assessor',
  'family',
  'other',
  'reporting-line',
];

/** Writes a few exclusions and declared interests between mentees and mentors of one practice area. */
export function addPrivateMatters(luck: Chance, cast: readonly CastMember[]): void {
  const mentees = luck.shuffle(cast.filter(({ plan }) => plan.parts.winter2026?.mentee && plan.side === 'mentee'));
  const mentors = luck.shuffle(cast.filter(({ plan }) => plan.parts.winter2026?.places && plan.side === 'mentor'));
  const mentorOf = (mentee: CastMember, skip: number): CastMember | undefined =>
    mentors.filter(({ plan }) => plan.offers.some((area) => mentee.plan.seeks.includes(area)))[skip];

  mentees.slice(0, KINDS.length).forEach((mentee, index) => {
    const mentor = mentorOf(mentee, index % 3);
    const kind = KINDS[index];
    if (!mentor || !kind) return;
    // Either side may be the one who says so.
    const [teller, other] = index % 2 === 0 ? [mentee, mentor] : [mentor, mentee];
    teller.person.private.declaredInterests.push({ email: other.person.email, kind });
  });
  mentees.slice(KINDS.length, KINDS.length + 7).forEach((mentee, index) => {
    const mentor = mentorOf(mentee, index % 4);
    if (!mentor) return;
    const [teller, other] = index % 3 === 2 ? [mentor, mentee] : [mentee, mentor];
    teller.person.private.exclusions.push(other.person.email);
  });
}
