import { readFile } from 'node:fs/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ApplicantsPage, ImportPreview, ImportResult } from '../shared/applications/applications-contract';
import { completenessOf } from '../shared/profiles/profile-rules';
import type { ProblemDetails } from '../shared/problems/problems';
import { loadProfiles } from '../src/server/profiles';
import { apply, giveVocabulary, makeCycle, member, mine } from './support/application-cycles';
import { startTestApp, type TestApp, type TestPerson } from './support/test-app';
import type { TestClient } from './support/test-client';

let app: TestApp;
let coordinator: TestClient & { person: TestPerson };
let tagOf: Map<string, string>;
beforeAll(async () => {
  app = await startTestApp();
  tagOf = await giveVocabulary(app);
  coordinator = await app.client('coordinator');
});
afterAll(() => app.stop());

const fileOf = (content: string | Buffer, mapping?: object) => ({
  fileName: 'members.csv',
  content: Buffer.from(content).toString('base64'),
  ...(mapping ? { mapping } : {}),
});
const preview = <T = ImportPreview>(cycleId: string, file: object) =>
  coordinator.post<T>(mine(cycleId, 'import/preview'), file);
const bringIn = <T = ImportResult>(cycleId: string, file: object) => coordinator.post<T>(mine(cycleId, 'import'), file);
const counted = async (table: 'people' | 'applications' | 'profiles' | 'audit_entries' | 'messages') =>
  (await app.rows<{ count: string }>(`select count(*) from ${table}`))[0]?.count;

const HEADING = 'Name,E-mail,Side,Places,Years of practice,Languages,Wants help with,Can help with,Times,Meeting mode';
const GOOD = 'Ada Birk,ada@list.example,mentee,,3,English C1,GIS and data,,Mon morning,Remote only';
const table = (...lines: string[]) => fileOf([HEADING, ...lines].join('\n'));

describe('a list of 400', () => {
  it('is understood, imported whole, and imported again without doubles', async () => {
    const cycleId = await makeCycle(app);
    const file = fileOf(await readFile('tests/fixtures/applicants-400.csv'));
    const seen = (await preview(cycleId, file)).body;
    expect(seen).toMatchObject({ rows: 400, faultCount: 0, mentees: 253, mentors: 153, places: 237, newPeople: 400 });
    expect(seen.mapping).toMatchObject({
      name: 'Full name',
      email: 'Mail address',
      places: 'Capacity',
      employer: 'Company',
    });
    expect(Object.keys(seen.mapping)).toHaveLength(22);
    expect(await counted('applications')).toBe('0');

    const done = await bringIn(cycleId, file);
    expect(done.status).toBe(201);
    expect(done.body).toEqual({
      imported: 400,
      newPeople: 400,
      updatedPeople: 0,
      newApplications: 406,
      updatedApplications: 0,
    });
    expect(await counted('messages')).toBe('0');

    const page = await coordinator.get<ApplicantsPage>(mine(cycleId, 'applicants?pageSize=200&sort=completeness'));
    expect(page.body.total).toBe(406);
    expect(new Set(page.body.applicants.map((line) => line.status))).toEqual(new Set(['admitted']));
    expect(page.body.applicants[0]?.flags).toContain('Consent not given yet');
    // The database's count of completeness is that of the profile page.
    const profiles = await loadProfiles(
      app.backend.database.db,
      page.body.applicants.map((line) => line.personId),
    );
    for (const line of page.body.applicants) {
      const profile = profiles.get(line.personId);
      expect(profile && completenessOf(profile).percent).toBe(line.completeness);
    }

    const again = await bringIn(cycleId, file);
    expect(again.body).toMatchObject({
      newPeople: 0,
      updatedPeople: 400,
      newApplications: 0,
      updatedApplications: 406,
    });
    expect((await preview(cycleId, file)).body).toMatchObject({ knownPeople: 400, alreadyApplied: 400 });
  });
});

describe('a list that has faults', () => {
  const bad = table(
    GOOD,
    'Bo Carr,bo at list.example,mentee,,3,English C1,Hydrografic,,Mon morning,Remote only',
    'Cy Dunn,cy@list.example,mentor,9,80,English C1,,GIS and data,Mon night,Telepathy',
    ',dee@list.example,mentee,,2,English C1,GIS and data,,Mon morning,Remote only',
    'Ada Birk,ADA@list.example,mentee,,3,English C1,GIS and data,,Mon morning,Remote only',
  );

  it('is told line by line and changes nothing', async () => {
    const cycleId = await makeCycle(app);
    const before = [await counted('people'), await counted('applications'), await counted('profiles')];
    const seen = (await preview(cycleId, bad)).body;
    expect(seen.unknownTags).toEqual(['Hydrografic']);
    expect(seen.faults.map((fault) => [fault.line, fault.column])).toEqual([
      [3, 'E-mail'],
      [3, 'Wants help with'],
      [4, 'Places'],
      [4, 'Years of practice'],
      [4, 'Meeting mode'],
      [4, 'Times'],
      [5, 'Name'],
      [6, 'E-mail'],
    ]);
    const refused = await bringIn<ProblemDetails>(cycleId, bad);
    expect(refused.status).toBe(422);
    expect(refused.body.title).toBe('Nothing was imported: the file has 8 faults');
    expect(refused.body.fields?.[1]).toEqual({
      field: 'line 3, column Wants help with',
      message: '“Hydrografic” is no tag of the vocabulary; perhaps “Hydrographic” is meant',
    });
    expect([await counted('people'), await counted('applications'), await counted('profiles')]).toEqual(before);
  });

  it('answers at most a hundred faults', async () => {
    const many = table(...Array.from({ length: 150 }, (_, i) => `No Mail ${i},nobody,mentee,,,,,,,`));
    const refused = await bringIn<ProblemDetails>(await makeCycle(app), many);
    expect(refused.body.fields).toHaveLength(100);
    expect(refused.body.title).toContain('150 faults');
  });
});

describe('who and what a line means', () => {
  it('finds people by address or number, fills only what the file says, and leaves withdrawals alone', async () => {
    const cycleId = await makeCycle(app);
    const known = await member(app, { tagId: tagOf.get('Hydrographic') ?? '', name: 'Own Name' });
    const { id } = (await apply(known, cycleId)).body;
    await app.rows('update people set membership_number = $2 where id = $1', [known.person.id, 'N-1']);
    await known.post(`/api/applications/${id}/withdraw`);
    const heading = 'Name,Mail,Role,Member no.,Town,Goals';
    const file = fileOf(`${heading}\nList Name,other@list.example,mentee,N-1,Whitmoor,To find my way offshore.`);
    expect((await bringIn(cycleId, file)).body).toMatchObject({
      newPeople: 0,
      updatedPeople: 1,
      updatedApplications: 1,
    });
    const [person] = await app.rows<{ name: string; town: string; region: string; employer: string; status: string }>(
      `select people.name, town, region, employer, status from people join profiles on person_id = people.id
         join applications on applications.person_id = people.id where people.id = $1`,
      [known.person.id],
    );
    expect(person).toEqual({
      name: 'Own Name',
      town: 'Whitmoor',
      region: 'islands',
      employer: 'Quarrick & Sons Surveying',
      status: 'withdrawn',
    });
    const other = await member(app, {});
    const clash = fileOf(`${heading}\nX,${other.person.email},mentee,N-1,,`);
    expect((await preview(cycleId, clash)).body.faults[0]?.message).toContain('This number belongs to Own Name');
  });

  it('makes two applications of “both”, and leaves the incomplete to a coordinator', async () => {
    const cycleId = await makeCycle(app);
    const done = await bringIn(cycleId, table('Eva Frost,eva@list.example,both,2,,,,,,'));
    expect(done.body).toMatchObject({ imported: 1, newApplications: 2 });
    const rows = await app.rows<{ side: string; places: number; status: string }>(
      'select side, places, status from applications where cycle_id = $1 order by side',
      [cycleId],
    );
    expect(rows).toEqual([
      { side: 'mentee', places: 0, status: 'submitted' },
      { side: 'mentor', places: 2, status: 'submitted' },
    ]);
  });
});

describe('files as they come', () => {
  const line = 'Zoë Müller,zoe@list.example,mentee';
  const forms: [string, Buffer][] = [
    ['UTF-8 with a mark', Buffer.from(`\uFEFFName,E-mail,Side\r\n${line}\r\n`)],
    ['Windows-1252', Buffer.from(`Name;E-mail;Side\n${line.replaceAll(',', ';')}\n`, 'latin1')],
    ['UTF-16', Buffer.from(`\uFEFFName\tE-mail\tSide\n${line.replaceAll(',', '\t')}\n`, 'utf16le')],
  ];
  it.each(forms)('are read: %s', async (_name, bytes) => {
    const seen = (await preview(await makeCycle(app), fileOf(bytes))).body;
    expect(seen).toMatchObject({ columns: ['Name', 'E-mail', 'Side'], rows: 1, faultCount: 0 });
    expect(seen.sample[0]).toMatchObject({ Name: 'Zoë Müller' });
  });

  it('counts lines as an editor does, with cells over several lines and empty lines between', async () => {
    const text = 'Name,E-mail,Side\n"Two\nLines",two@list.example,mentee\n\nBad,bad,mentee\n';
    expect((await preview(await makeCycle(app), fileOf(text))).body.faults).toMatchObject([
      { line: 5, column: 'E-mail' },
    ]);
  });

  it.each([
    ['an empty file', ''],
    ['a heading alone', 'Name,E-mail,Side\n'],
    ['a quotation mark that is not closed', 'Name,E-mail,Side\n"Ada,ada@list.example,mentee\n'],
    ['a spreadsheet’s own file', 'PK\u0003\u0004 something'],
  ])('are refused with a sentence: %s', async (_name, text) => {
    const answer = await preview<ProblemDetails>(await makeCycle(app), fileOf(text));
    expect(answer.status).toBe(422);
    expect(answer.body.title.length).toBeGreaterThan(20);
  });

  it('may not be larger than 5 MB, nor name columns that are not there', async () => {
    const cycleId = await makeCycle(app);
    const large = await preview<ProblemDetails>(cycleId, fileOf(Buffer.alloc(5_020_000, 'a,')));
    expect([large.status, large.body.fields?.[0]?.message]).toEqual([400, 'The file is larger than 5 MB']);
    expect((await preview(cycleId, fileOf(Buffer.alloc(5_200_000, 'a,')))).status).toBe(413);
    const other = await preview<ProblemDetails>(cycleId, fileOf(`Name\n${line}`, { name: 'Nom' }));
    expect([other.status, other.body.fields?.[0]?.field]).toEqual([400, 'mapping.name']);
  });

  it('are not taken once pairs are made', async () => {
    const cycleId = await makeCycle(app, { phase: 'under-way' });
    expect((await bringIn(cycleId, table(GOOD))).status).toBe(409);
  });
});
