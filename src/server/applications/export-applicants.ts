import { stringify } from 'csv-stringify/sync';
import { STATUS_LABEL } from '../../../shared/applications/applications-contract';
import { CAREER_STAGE_LABEL, REGION_LABEL } from '../../../shared/profiles/profiles-contract';
import { recordAudit } from '../audit';
import { findCycle } from '../cycles';
import { Download, inTransaction, notFound, type Context } from '../platform';
import { listApplicants, practiceAreasOf, type ApplicantRow, type ApplicantsFilter } from './applicants-queries';
import { flagsOf } from './show-applicants';

type CellOf = (row: ApplicantRow, areas: string[]) => string | number;

const COLUMNS: readonly [string, CellOf][] = [
  ['Name', (row) => row.name],
  ['E-mail address', (row) => row.email],
  ['Membership number', (row) => row.membershipNumber ?? ''],
  ['Side', (row) => row.side],
  ['Status', (row) => STATUS_LABEL[row.status]],
  ['Places', (row) => row.places],
  ['One more if asked', (row) => (row.oneMoreIfAsked ? 'yes' : 'no')],
  ['Employer', (row) => row.employer],
  ['Region', (row) => (row.region ? REGION_LABEL[row.region] : '')],
  ['Town', (row) => row.town ?? ''],
  ['Career stage', (row) => (row.careerStage ? CAREER_STAGE_LABEL[row.careerStage] : '')],
  ['Years in practice', (row) => row.yearsInPractice ?? ''],
  ['Practice areas', (_row, areas) => areas.join('; ')],
  ['Goals', (row) => row.goals],
  ['Completeness', (row) => row.completeness],
  ['Flags', (row) => flagsOf(row).join('; ')],
  ['Submitted at (UTC)', (row) => row.submittedAt?.toISOString() ?? ''],
];

/** All applicants of a filter as a file (RFC 4180, UTF-8 with a byte order mark for spreadsheets). */
export function exportApplicants(ctx: Context, cycleId: string, filter: ApplicantsFilter): Promise<Download> {
  return inTransaction(ctx, async (tx) => {
    const cycle = await findCycle(tx.db, cycleId);
    if (!cycle) throw notFound('cycle');
    const rows = await listApplicants(tx.db, cycleId, filter);
    const areas = await practiceAreasOf(
      tx.db,
      rows.map((row) => row.id),
    );
    await recordAudit(tx, { action: 'applications.export', subjectId: cycleId, cycleId });
    const lines = rows.map((row) => COLUMNS.map(([, cell]) => harmless(cell(row, areas.get(row.id) ?? []))));
    const content = stringify([COLUMNS.map(([heading]) => heading), ...lines], {
      bom: true,
      record_delimiter: 'windows',
    });
    return new Download(`${cycle.name} applicants.csv`, 'text/csv; charset=utf-8', content);
  });
}

// A spreadsheet would run a text that begins like a formula (OWASP, CSV Injection).
const harmless = (cell: string | number): string | number =>
  typeof cell === 'string' && /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
