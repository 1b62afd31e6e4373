import { describe, expect, it } from 'vitest';
import { ApplicationForm } from '../../shared/applications/applications-contract';
import { CycleDraft } from '../../shared/cycles/cycles-contract';
import {
  type DemoApplication,
  type DemoCycle,
  demoCycles,
  demoPeople,
  largeAssociation,
} from '../../drizzle/seed/data';
import { personId } from './demo-ids';

const people = new Map(demoPeople().map((person) => [person.email, person]));
const cycles = demoCycles();
const cycle = (key: DemoCycle['key']): DemoCycle => {
  const found = cycles.find((each) => each.key === key);
  if (!found) throw new Error(`no cycle ${key}`);
  return found;
};
const admitted = (applications: readonly DemoApplication[], side: DemoApplication['side']): DemoApplication[] =>
  applications.filter((each) => each.becomes === 'admitted' && each.side === side);
const placesOf = (applications: readonly DemoApplication[]): number =>
  applications.reduce((sum, { places }) => sum + places, 0);

describe('the demo association’s cycles', () => {
  it('are one closed, one in matching, one open, with dates in order', () => {
    expect(cycles.map(({ phase }) => phase)).toEqual(['closed', 'matching', 'open']);
    for (const { draft } of cycles) expect(CycleDraft.parse(draft)).toEqual(draft);
  });

  it('have exactly 156 mentees and 148 places at 83 mentors in winter', () => {
    const { applications } = cycle('winter-2026');
    expect(admitted(applications, 'mentee')).toHaveLength(156);
    expect(admitted(applications, 'mentor')).toHaveLength(83);
    expect(placesOf(admitted(applications, 'mentor'))).toBe(148);
    expect(applications.filter(({ becomes }) => becomes === 'waiting-list').length).toBeGreaterThan(0);
  });

  it('had 120 mentees and 141 places in the summer, each mentee with an outcome', () => {
    const { applications, outcomes } = cycle('summer-2026');
    const mentees = admitted(applications, 'mentee').map(({ personEmail }) => personEmail);
    expect(mentees).toHaveLength(120);
    expect(placesOf(admitted(applications, 'mentor'))).toBe(141);
    expect(outcomes.map(({ menteeEmail }) => menteeEmail)).toEqual(mentees);
    expect(new Set(outcomes.map(({ ending }) => ending))).toEqual(
      new Set(['completed', 'ended-early', 'declined', 'expired']),
    );
  });

  it('have about 25 applications in the open cycle so far', () => {
    const { applications } = cycle('summer-2027');
    expect(applications.length).toBeGreaterThanOrEqual(22);
    expect(applications.length).toBeLessThanOrEqual(30);
  });

  it('have applications that the product accepts, from people who exist, once a side', () => {
    for (const { key, applications } of cycles) {
      expect(new Set(applications.map(({ personEmail, side }) => `${personEmail} ${side}`)).size).toBe(
        applications.length,
      );
      expect(new Set(applications.map(({ goals }) => goals)).size, key).toBe(applications.length);
      const offering = new Set(admitted(applications, 'mentor').map(({ personEmail }) => personEmail));
      for (const application of applications) {
        const { side, places, oneMoreIfAsked, goals, preferredMentors } = application;
        expect(people.has(application.personEmail)).toBe(true);
        ApplicationForm.parse({
          side,
          places,
          oneMoreIfAsked,
          goals,
          preferredMentors: preferredMentors.map(personId),
          consentVersion: 1,
        });
        for (const email of preferredMentors) {
          expect(offering).toContain(email);
          expect(people.get(email)?.wishes.listed).toBe(true);
        }
      }
    }
  });

  it('have nothing in the future that has happened and no application before opening', () => {
    const today = '2027-03-15';
    for (const { draft, applications, outcomes, publishedOn } of demoCycles(undefined, today)) {
      for (const { submittedOn, becomes } of applications) {
        expect(submittedOn >= draft.applicationsOpenOn).toBe(true);
        expect(submittedOn <= today).toBe(true);
        if (becomes === 'admitted') expect(submittedOn <= draft.applicationsCloseOn).toBe(true);
        if (becomes === 'waiting-list') expect(submittedOn > draft.applicationsCloseOn).toBe(true);
      }
      for (const { meetings, hours, endedOn, menteeAnsweredAfterDays } of outcomes) {
        expect(hours * 60).toBeCloseTo(meetings.reduce((sum, { minutes }) => sum + minutes, 0));
        for (const { on } of meetings) expect(on >= draft.startsOn && on <= (endedOn ?? '')).toBe(true);
        expect(menteeAnsweredAfterDays ?? 0).toBeLessThanOrEqual(14);
      }
      if (publishedOn !== null) expect(publishedOn > draft.applicationsCloseOn).toBe(true);
    }
  });

  it('know people who return and people who were mentees before they were mentors', () => {
    const before = admitted(cycle('summer-2026').applications, 'mentee').map(({ personEmail }) => personEmail);
    const winter = cycle('winter-2026').applications;
    const seekAgain = admitted(winter, 'mentee').filter(({ personEmail }) => before.includes(personEmail));
    const nowOffer = admitted(winter, 'mentor').filter(({ personEmail }) => before.includes(personEmail));
    expect(seekAgain.length).toBeGreaterThan(20);
    expect(nowOffer.length).toBeGreaterThan(5);
  });

  it('are the same for the same seed and day', () => {
    expect(demoCycles()).toEqual(cycles);
  });
});

describe('a large association', () => {
  const size = { mentees: 1200, mentors: 700 };
  const large = largeAssociation(5, size);

  it('has as many people as asked for, each with an address of their own', () => {
    const applications = large.cycles.flatMap((each) => each.applications);
    expect(admitted(applications, 'mentee')).toHaveLength(size.mentees);
    expect(admitted(applications, 'mentor')).toHaveLength(size.mentors);
    expect(new Set(large.people.map(({ email }) => email)).size).toBe(large.people.length);
  });

  it('is the same for the same seed', () => {
    expect(largeAssociation(5, size)).toEqual(large);
  });
});
