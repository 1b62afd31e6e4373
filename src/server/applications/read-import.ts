import { mayImport } from '../../../shared/applications/application-rules';
import type { ImportFault, ImportMapping, ImportRequest } from '../../../shared/applications/applications-contract';
import { guessMapping } from '../../../shared/applications/import-columns';
import { type ImportRow, readImportRows } from '../../../shared/applications/import-rows';
import { findAssociation, findPeopleByAddressOrNumber, type PersonRow } from '../accounts';
import { type CycleRow, findCycle } from '../cycles';
import { notFound, Problem, type Context } from '../platform';
import { listTags } from '../tags';
import type { ApplicationRow } from './applications-queries';
import { applicationsOfPeople } from './import-queries';
import { readTable, type FileTable } from './read-table';

export interface ReadImport {
  cycle: CycleRow;
  table: FileTable;
  mapping: ImportMapping;
  /** Lines without faults, with the person that each of them means; null = not known yet. */
  rows: { row: ImportRow; person: PersonRow | null }[];
  applications: ApplicationRow[];
  faults: ImportFault[];
  unknownTags: string[];
}

/** Reads a file against the association's words and people; changes nothing. Preview and import both begin here. */
export async function readImport(ctx: Context, cycleId: string, request: ImportRequest): Promise<ReadImport> {
  const cycle = await findCycle(ctx.db, cycleId);
  if (!cycle) throw notFound('cycle');
  if (!mayImport(cycle.phase)) throw new Problem('conflict', 'Lists can be imported until matching is over');
  const table = readTable(request.content);
  const mapping = request.mapping ?? guessMapping(table.columns);
  refuseOtherColumns(mapping, table.columns);
  const association = await findAssociation(ctx.db);
  const vocabulary = { tags: await listTags(ctx.db), towns: association?.gazetteer ?? {} };
  const { rows, faults, unknownTags } = readImportRows(table.lines, mapping, vocabulary);
  const known = await findPeopleByAddressOrNumber(
    ctx.db,
    rows.map((row) => row.email),
    rows.flatMap((row) => row.membershipNumber ?? []),
  );
  const matched = matchPeople(rows, known, mapping);
  return {
    cycle,
    table,
    mapping,
    rows: matched.rows,
    applications: await applicationsOfPeople(
      ctx.db,
      cycleId,
      matched.rows.flatMap((each) => each.person?.id ?? []),
    ),
    faults: [...faults, ...matched.faults].sort((a, b) => a.line - b.line),
    unknownTags,
  };
}

function refuseOtherColumns(mapping: ImportMapping, columns: string[]): void {
  const missing = Object.entries(mapping).filter(([, column]) => !columns.includes(column));
  if (missing.length > 0)
    throw new Problem('invalid', 'Some columns are not in this file', {
      fields: missing.map(([field, column]) => ({
        field: `mapping.${field}`,
        message: `The file has no column “${column}”; choose another`,
      })),
    });
}

/** Finds each line's person by address, else by membership number, and refuses lines that mean two people or one twice. */
function matchPeople(
  rows: ImportRow[],
  known: PersonRow[],
  mapping: ImportMapping,
): { rows: ReadImport['rows']; faults: ImportFault[] } {
  const byEmail = new Map(known.map((person) => [person.email, person]));
  const byNumber = new Map(
    known.flatMap((person) => (person.membershipNumber ? [[person.membershipNumber, person]] : [])),
  );
  const seen = new Map<string, ImportRow>();
  const faults: ImportFault[] = [];
  const matched = rows.map((row) => {
    const number = row.membershipNumber;
    const owner = number === undefined ? undefined : byNumber.get(number);
    const person = byEmail.get(row.email) ?? owner ?? null;
    const fault = (message: string): void => {
      faults.push({ line: row.line, column: mapping.membershipNumber ?? '', value: number ?? '', message });
    };
    if (owner && person && owner.id !== person.id)
      fault(`This number belongs to ${owner.name}, the address to ${person.name}`);
    if (number !== undefined) {
      const earlier = seen.get(`number ${number}`);
      if (earlier && earlier.email !== row.email)
        fault(`Line ${earlier.line} has the same number with another address`);
      else seen.set(`number ${number}`, row);
    }
    return { row, person };
  });
  return { rows: matched, faults };
}
