import { describe, expect, it } from 'vitest';
import { NewPassword } from '../../shared/accounts/accounts-contract';
import {
  AboutSection,
  InterestsSection,
  MeetingSection,
  PracticeSection,
  PrivateSection,
  WishesSection,
} from '../../shared/profiles/profiles-contract';
import signIns from '../../drizzle/seed/demo-sign-ins.json';
import { demoPeople, EMPLOYERS, TAGS, TOWNS } from '../../drizzle/seed/data';
import { personId, tagId } from './demo-ids';

const people = demoPeople();
const texts = (pick: (person: (typeof people)[number]) => string): string[] =>
  people.map(pick).filter((text) => text !== '');
const repeated = (values: readonly string[]): string[] =>
  values.filter((value, index) => values.indexOf(value) !== index);

describe('the people of the demo association', () => {
  it('have profiles that the product accepts, section by section', () => {
    for (const person of people) {
      expect(AboutSection.parse(person.about)).toEqual(person.about);
      expect(PracticeSection.parse(person.practice)).toEqual(person.practice);
      expect(MeetingSection.parse(person.meeting)).toEqual(person.meeting);
      expect(WishesSection.parse(person.wishes)).toEqual(person.wishes);
      const withIds = (choices: typeof person.interests.offers) =>
        choices.map(({ slug, priority }) => ({ tagId: tagId(slug), priority }));
      InterestsSection.parse({ offers: withIds(person.interests.offers), seeks: withIds(person.interests.seeks) });
      PrivateSection.parse({
        adjustments: person.private.adjustments,
        exclusions: person.private.exclusions.map((email) => ({ personId: personId(email), name: email })),
        declaredInterests: person.private.declaredInterests.map(({ email, kind }) => ({
          personId: personId(email),
          name: email,
          kind,
        })),
      });
    }
  });

  it('have addresses, names and membership numbers of their own', () => {
    expect(repeated(people.map(({ email }) => email))).toEqual([]);
    expect(repeated(people.map(({ name }) => name))).toEqual([]);
    expect(repeated(people.flatMap(({ membershipNumber }) => membershipNumber ?? []))).toEqual([]);
    for (const { email } of people) expect(email).toMatch(/^[a-z0-9]+(\.[a-z0-9]+)*@[a-z0-9-]+\.example$/);
  });

  it('never say the same as someone else', () => {
    expect(repeated(texts(({ wishes }) => wishes.hopes))).toEqual([]);
    expect(repeated(texts(({ wishes }) => wishes.style))).toEqual([]);
    expect(repeated(texts(({ about }) => about.headline))).toEqual([]);
  });

  it('name only tags, towns and people that exist', () => {
    const slugs = new Set(TAGS.map(({ slug }) => slug));
    const towns = new Map(TOWNS.map((town) => [town.name, town.region]));
    const known = new Set(people.map(({ email }) => email));
    for (const person of people) {
      for (const { slug } of [...person.interests.offers, ...person.interests.seeks]) expect(slugs).toContain(slug);
      expect(towns.get(person.about.town ?? '')).toBe(person.about.region);
      for (const email of person.private.exclusions) expect(known).toContain(email);
      for (const { email } of person.private.declaredInterests) expect(known).toContain(email);
    }
  });

  it('come from many places: diacritics, apostrophes and single names', () => {
    expect(people.filter(({ name }) => name.normalize('NFD') !== name).length).toBeGreaterThan(60);
    expect(people.some(({ name }) => /['’]/.test(name))).toBe(true);
    expect(people.some(({ name }) => !name.includes(' '))).toBe(true);
    expect(new Set(people.map(({ about }) => about.timeZone)).size).toBeGreaterThan(4);
  });

  it('include a few unfinished profiles and a few private matters', () => {
    const unfinished = people.filter(
      ({ meeting, about }) => meeting.availability.length === 0 || about.languages.length === 0,
    );
    expect(unfinished.length).toBeGreaterThanOrEqual(3);
    expect(unfinished.length).toBeLessThan(8);
    expect(people.flatMap((person) => person.private.exclusions).length).toBeGreaterThanOrEqual(5);
    expect(people.flatMap((person) => person.private.declaredInterests).length).toBeGreaterThanOrEqual(5);
  });

  it('are the same for the same seed and others for another', () => {
    expect(demoPeople()).toEqual(people);
    expect(demoPeople(7).map(({ email }) => email)).not.toEqual(people.map(({ email }) => email));
  });
});

describe('the vocabulary', () => {
  it('has eleven practice areas, and topics whose parents exist', () => {
    expect(TAGS.filter(({ kind }) => kind === 'practice-area')).toHaveLength(11);
    expect(TAGS.filter(({ kind }) => kind === 'topic').length).toBeGreaterThanOrEqual(30);
    const slugs = TAGS.map(({ slug }) => slug);
    expect(repeated(slugs)).toEqual([]);
    for (const { parent } of TAGS) if (parent !== null) expect(slugs).toContain(parent);
  });
});

describe('the demo sign-ins', () => {
  it('belong to people of the association and pass the password rules', () => {
    const byEmail = new Map(people.map((person) => [person.email, person.name]));
    for (const { email, name, password } of signIns) {
      expect(byEmail.get(email)).toBe(name);
      expect(NewPassword.parse(password)).toBe(password);
    }
    expect(signIns.map(({ role }) => role)).toEqual(['coordinator', 'organiser', 'administrator', 'mentor', 'mentee']);
  });
});

describe('the employers', () => {
  it('are invented, with addresses of their own under .example', () => {
    expect(repeated(EMPLOYERS.map(({ domain }) => domain))).toEqual([]);
    for (const { domain } of EMPLOYERS) expect(domain).toMatch(/\.example$/);
  });
});
