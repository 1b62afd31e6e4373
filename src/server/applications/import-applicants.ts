import type {
  ApplicationSide,
  ImportPreview,
  ImportRequest,
  ImportResult,
} from '../../../shared/applications/applications-contract';
import type { ImportRow } from '../../../shared/applications/import-rows';
import { completenessOf } from '../../../shared/profiles/profile-rules';
import type { MentoringProfile } from '../../../shared/profiles/profiles-contract';
import { ensurePerson, type PersonRow } from '../accounts';
import { recordAll, recordAudit } from '../audit';
import { inTransaction, Problem, type Context } from '../platform';
import { leftOutBefore, updateApplication, type ApplicationRow } from './applications-queries';
import { fillProfiles } from './fill-profiles';
import { chunksOf, insertApplications } from './import-queries';
import { readImport, type ReadImport } from './read-import';

const FAULTS_SHOWN = 200;
const FAULTS_ANSWERED = 100;
const SAMPLE_LINES = 5;

/** What an import would do, and everything that stands in its way. */
export async function previewImport(ctx: Context, cycleId: string, request: ImportRequest): Promise<ImportPreview> {
  const { table, mapping, rows, applications, faults, unknownTags } = await readImport(ctx, cycleId, request);
  const mentors = rows.filter(({ row }) => row.sides.includes('mentor'));
  const applied = new Set(applications.map((each) => `${each.side} ${each.personId}`));
  return {
    columns: table.columns,
    mapping,
    rows: table.lines.length,
    mentees: rows.filter(({ row }) => row.sides.includes('mentee')).length,
    mentors: mentors.length,
    places: mentors.reduce((sum, { row }) => sum + (row.places ?? 1), 0),
    newPeople: rows.filter(({ person }) => person === null).length,
    knownPeople: rows.filter(({ person }) => person !== null).length,
    alreadyApplied: rows.filter(({ row, person }) => row.sides.some((side) => applied.has(`${side} ${person?.id}`)))
      .length,
    unknownTags,
    faults: faults.slice(0, FAULTS_SHOWN),
    faultCount: faults.length,
    sample: table.lines.slice(0, SAMPLE_LINES).map((line) => line.cells),
  };
}

/** Imports a file as a whole or not at all. */
export function importApplicants(ctx: Context, cycleId: string, request: ImportRequest): Promise<ImportResult> {
  return inTransaction(ctx, async (tx) => {
    const read = await readImport(tx, cycleId, request);
    if (read.faults.length > 0) throw faulty(read);
    const people = await ensurePeople(tx, read);
    const profiles = await fillProfiles(tx, people);
    const applications = await writeApplications(tx, read, people, profiles);
    await recordAudit(tx, { action: 'applications.import', subjectId: cycleId, cycleId });
    const created = new Set(people.filter((each) => each.created).map((each) => each.personId));
    const all = new Set(people.map((each) => each.personId));
    return {
      imported: read.rows.length,
      newPeople: created.size,
      updatedPeople: all.size - created.size,
      newApplications: applications.inserted,
      updatedApplications: applications.updated,
    };
  });
}

function faulty({ faults }: ReadImport): Problem {
  const count = faults.length === 1 ? 'one fault' : `${faults.length} faults`;
  return new Problem('unprocessable', `Nothing was imported: the file has ${count}`, {
    detail: 'Put the lines right in the file, or choose other columns, and import it again',
    fields: faults
      .slice(0, FAULTS_ANSWERED)
      .map((fault) => ({ field: `line ${fault.line}, column ${fault.column}`, message: fault.message })),
  });
}

export interface ImportedPerson {
  row: ImportRow;
  personId: string;
  created: boolean;
}

/** Somebody who is on the list with a number is a current member. */
async function ensurePeople(tx: Context, { rows }: ReadImport): Promise<ImportedPerson[]> {
  const people: ImportedPerson[] = [];
  const created = new Set<string>();
  for (const { row, person } of rows) {
    if (person && isListedAlready(person, row)) {
      people.push({ row, personId: person.id, created: false });
      continue;
    }
    const ensured = await ensurePerson(tx, {
      email: row.email,
      name: row.name,
      ...(row.membershipNumber === undefined
        ? {}
        : { membershipNumber: row.membershipNumber, membershipCurrent: true }),
    });
    if (ensured.created) created.add(ensured.id);
    people.push({ row, personId: ensured.id, created: created.has(ensured.id) });
  }
  return people;
}

const isListedAlready = (person: PersonRow, { membershipNumber }: ImportRow): boolean =>
  membershipNumber === undefined || (person.membershipNumber === membershipNumber && person.membershipCurrent);

type Content = Pick<ApplicationRow, 'places' | 'oneMoreIfAsked' | 'goals' | 'status'>;
const CONTENT = ['places', 'oneMoreIfAsked', 'goals', 'status'] as const;

async function writeApplications(
  tx: Context,
  { cycle, applications }: ReadImport,
  people: ImportedPerson[],
  profiles: Map<string, MentoringProfile>,
): Promise<{ inserted: number; updated: number }> {
  const leftOut = await leftOutBefore(tx.db, cycle, [...profiles.keys()]);
  const existing = new Map(applications.map((each) => [`${each.side} ${each.personId}`, each]));
  const fresh: Parameters<typeof insertApplications>[1] = [];
  const known: ApplicationRow[] = [];
  const changed: string[] = [];
  for (const { row, personId } of people)
    for (const side of row.sides) {
      const before = existing.get(`${side} ${personId}`);
      const content = contentOf(row, side, before, profiles.get(personId));
      if (before) {
        known.push(before);
        if (CONTENT.every((field) => before[field] === content[field])) continue;
        await updateApplication(tx.db, before.id, content);
        changed.push(before.id);
      } else
        fresh.push({
          ...content,
          cycleId: cycle.id,
          personId,
          side,
          leftOutLastTime: side === 'mentee' && leftOut.has(personId),
          submittedAt: tx.now(),
          createdAt: tx.now(),
        });
    }
  const inserted = await insertApplications(tx.db, fresh);
  for (const ids of chunksOf([...inserted.map((each) => each.id), ...changed]))
    await recordAll(
      tx,
      ids.map((subjectId) => ({ action: 'applications.import-line', subjectId, cycleId: cycle.id })),
    );
  return { inserted: inserted.length, updated: known.length };
}

function contentOf(
  row: ImportRow,
  side: ApplicationSide,
  before: ApplicationRow | undefined,
  profile: MentoringProfile | undefined,
): Content {
  const places = side === 'mentor' ? (row.places ?? before?.places ?? 1) : 0;
  const complete = profile !== undefined && completenessOf(profile).readyForMatching;
  return {
    places: Math.max(places, before?.taken ?? 0),
    oneMoreIfAsked: side === 'mentor' && (row.oneMoreIfAsked ?? before?.oneMoreIfAsked ?? false),
    goals: row.goals ?? before?.goals ?? '',
    // A decision, a withdrawal and the waiting list stay as they are: the file does not know why they came about.
    status: before && before.status !== 'submitted' ? before.status : complete ? 'admitted' : 'submitted',
  };
}
