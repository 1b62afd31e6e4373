import { describe, expect, it } from 'vitest';
import type { Tag } from '../tags/tags-contract';
import { editDistance } from './closest-tag';
import { guessMapping } from './import-columns';
import { type FileLine, readImportRows } from './import-rows';
import { readLanguage, readSlot } from './import-values';
import { languageCode } from './language-names';

const tag = (id: string, label: string, synonyms: string[] = [], state: Tag['state'] = 'approved'): Tag => ({
  id,
  slug: label.toLowerCase().replaceAll(' ', '-'),
  kind: 'practice-area',
  label,
  synonyms,
  parentId: null,
  state,
});
const vocabulary = {
  tags: [
    tag('gis', 'GIS and data', ['geodata']),
    tag('hydro', 'Hydrographic'),
    tag('old', 'Chain survey', [], 'retired'),
  ],
  towns: { 'Sallow Bridge': { latitude: 55.93, longitude: 4.55, region: 'midvale' } },
};
const mapping = guessMapping([
  'Name',
  'E-mail',
  'Role',
  'Capacity',
  'Years of practice',
  'Region',
  'Town',
  'Languages',
  'Can help with',
  'Wants help with',
  'Free times',
]);
const line = (cells: Record<string, string>, number = 2): FileLine => ({
  line: number,
  cells: { Name: 'Zoë Đặng', 'E-mail': 'Zoe@List.example', Role: 'mentee', ...cells },
});
const read = (...lines: FileLine[]) => readImportRows(lines, mapping, vocabulary);

describe('guessing what the headings mean', () => {
  it('knows labels, field names and common synonyms, and uses no heading twice', () => {
    expect(mapping).toEqual({
      name: 'Name',
      email: 'E-mail',
      side: 'Role',
      places: 'Capacity',
      yearsInPractice: 'Years of practice',
      region: 'Region',
      town: 'Town',
      languages: 'Languages',
      offers: 'Can help with',
      seeks: 'Wants help with',
      availability: 'Free times',
    });
    expect(guessMapping(['Mail address', 'Membership number (2027)'])).toEqual({
      email: 'Mail address',
      membershipNumber: 'Membership number (2027)',
    });
  });
});

describe('reading lines', () => {
  it('fills what the line says and leaves the rest alone', () => {
    const { rows, faults } = read(
      line({
        Role: 'both',
        Capacity: '2 places',
        Region: 'Midvale',
        Town: 'sallow bridge',
        Languages: 'English C1; da:first',
        'Wants help with': 'geodata; Hydrographic (1)',
        'Free times': 'Mon morning | tue-evening',
      }),
    );
    expect(faults).toEqual([]);
    expect(rows).toEqual([
      {
        line: 2,
        name: 'Zoë Đặng',
        email: 'zoe@list.example',
        sides: ['mentor', 'mentee'],
        places: 2,
        oneMoreIfAsked: undefined,
        goals: undefined,
        membershipNumber: undefined,
        profile: {
          about: {
            region: 'midvale',
            town: 'Sallow Bridge',
            languages: [
              { code: 'en', level: 'C1' },
              { code: 'da', level: 'first' },
            ],
          },
          practice: {},
          interests: {
            seeks: [
              { tagId: 'gis', priority: 1 },
              { tagId: 'hydro', priority: 1 },
            ],
          },
          meeting: { availability: ['mon-morning', 'tue-evening'] },
          wishes: {},
        },
      },
    ]);
  });

  it.each([
    [{ Name: '' }, 'Name', 'missing'],
    [{ 'E-mail': 'zoe.list.example' }, 'E-mail', 'no e-mail address'],
    [{ Role: 'helper' }, 'Role', 'mentor, mentee or both'],
    [{ Role: 'mentor', Capacity: '7' }, 'Capacity', '1 to 6'],
    [{ 'Years of practice': '71' }, 'Years of practice', '0 to 70'],
    [{ 'Years of practice': 'many' }, 'Years of practice', '0 to 70'],
    [{ Region: 'Lowlands' }, 'Region', 'Coast, Midvale, Uplands, Islands'],
    [{ Town: 'Nowhere' }, 'Town', 'towns'],
    [{ Languages: 'English' }, 'Languages', 'level'],
    [{ Languages: 'Elvish C1' }, 'Languages', 'no language'],
    [{ 'Free times': 'Mon night' }, 'Free times', 'morning'],
    [{ 'Can help with': 'Hydrografic' }, 'Can help with', '“Hydrographic” is meant'],
    [{ 'Can help with': 'Chain survey' }, 'Can help with', 'no tag'],
  ])('says where and why: %j', (cells, column, words) => {
    const { rows, faults } = read(line(cells, 7));
    expect(rows).toEqual([]);
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatchObject({ line: 7, column });
    expect(faults[0]?.message).toContain(words);
  });

  it('finds the same person twice on one side, and not on different ones', () => {
    expect(read(line({}, 2), line({ 'E-mail': 'zoe@LIST.example' }, 3)).faults).toMatchObject([
      { line: 3, message: 'This person is a mentee in line 2 already' },
    ]);
    expect(read(line({}, 2), line({ Role: 'mentor' }, 3)).faults).toEqual([]);
  });

  it('asks for the columns it cannot do without', () => {
    const { faults } = readImportRows([line({})], { name: 'Name' }, vocabulary);
    expect(faults.map((fault) => fault.line)).toEqual([1, 1]);
  });
});

describe('words in cells', () => {
  it('reads languages and times in the ways people write them', () => {
    expect(readLanguage('Danish (first language)')).toEqual({ value: { code: 'da', level: 'first' } });
    expect(readLanguage('nb – native')).toEqual({ value: { code: 'nb', level: 'first' } });
    expect(languageCode('Romanian')).toBe('ro');
    expect(languageCode('Norwegian')).toBe('nb');
    expect(readSlot('Thursday afternoons')).toEqual({ value: 'thu-afternoon' });
    expect(readSlot('Fri p.m.')).toEqual({ value: 'fri-afternoon' });
  });

  it('measures how far two words are apart', () => {
    expect(editDistance('kitten', 'sitting')).toBe(3);
    expect(editDistance('', 'abc')).toBe(3);
    expect(editDistance('levelling', 'x', 3)).toBe(3);
  });
});
