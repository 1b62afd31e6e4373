import type {
  ApplicationStatus,
  ImportPreview,
  ImportRequest,
  ImportResult,
} from '../../../shared/applications/applications-contract';
import type { ImportRow } from '../../../shared/applications/import-rows';
import { completenessOf } from '../../../shared/profiles/profile-rules';
import { ensurePerson } from '../accounts';
import { recordAll, recordAudit } from '../audit';
import { inTransaction, Problem, type Context } from '../platform';
import { loadProfiles } from '../profiles';
import { leftOutBefore, updateApplication, type ApplicationRow } from './applications-queries';
import { fillProfiles } from './fill-profiles';
import { insertApplications } from './import-queries';
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
    await fillProfiles(tx, people);
    const applications = await writeApplications(tx, read, people);
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
  for (const { row } of rows) {
    const person = await ensurePerson(tx, {
      email: row.email,
      name: row.name,
      ...(row.membershipNumber === undefined
        ? {}
        : { membershipNumber: row.membershipNumber, membershipCurrent: true }),
    });
    if (person.created) created.add(person.id);
    people.push({ row, personId: person.id, created: created.has(person.id) });
  }
  return people;
}

async function writeApplications(
  tx: Context,
  { cycle, applications }: ReadImport,
  people: ImportedPerson[],
): Promise<{ inserted: number; updated: number }> {
  const personIds = [...new Set(people.map((each) => each.personId))];
  const profiles = await loadProfiles(tx.db, personIds);
  const leftOut = await leftOutBefore(tx.db, cycle, personIds);
  const existing = new Map(applications.map((each) => [`${each.side} ${each.personId}`, each]));
  const statusFor = (personId: string): ApplicationStatus => {
    const profile = profiles.get(personId);
    return profile && completenessOf(profile).readyForMatching ? 'admitted' : 'submitted';
  };
  const fresh: Parameters<typeof insertApplications>[1] = [];
  const changed: ApplicationRow[] = [];
  for (const { row, personId } of people)
    for (const side of row.sides) {
      const before = existing.get(`${side} ${personId}`);
      const places = side === 'mentor' ? (row.places ?? before?.places ?? 1) : 0;
      const content = {
        places: Math.max(places, before?.taken ?? 0),
        oneMoreIfAsked: side === 'mentor' && (row.oneMoreIfAsked ?? before?.oneMoreIfAsked ?? false),
        goals: row.goals ?? before?.goals ?? '',
      };
      if (!before)
        fresh.push({
          ...content,
          cycleId: cycle.id,
          personId,
          side,
          status: statusFor(personId),
          leftOutLastTime: side === 'mentee' && leftOut.has(personId),
          submittedAt: tx.now(),
          createdAt: tx.now(),
        });
      else {
        // A withdrawal and the waiting list stay as they are: the file does not know why they came about.
        const status = before.status === 'submitted' ? statusFor(personId) : before.status;
        const after = await updateApplication(tx.db, before.id, { ...content, status });
        if (after) changed.push(after);
      }
    }
  const inserted = await insertApplications(tx.db, fresh);
  await recordAll(
    tx,
    [...inserted, ...changed].map((each) => ({
      action: 'applications.import-line',
      subjectId: each.id,
      cycleId: cycle.id,
    })),
  );
  return { inserted: inserted.length, updated: changed.length };
}
