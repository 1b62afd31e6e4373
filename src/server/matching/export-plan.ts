import { stringify } from 'csv-stringify/sync';
import { Download, type Context } from '../platform';
import { showPlan } from './show-plan';

/** The plan as a table for a committee: RFC 4180, UTF-8 with a mark, cells that no spreadsheet takes for a formula. */
export async function exportPlan(ctx: Context, runId: string): Promise<Download> {
  const plan = await showPlan(ctx, runId);
  const mentees = new Map(plan.mentees.map((person) => [person.applicationId, person]));
  const mentors = new Map(plan.mentors.map((person) => [person.applicationId, person]));
  const paired = plan.pairings.map((pairing) => {
    const mentee = mentees.get(pairing.mentee);
    const mentor = mentors.get(pairing.mentor);
    return [
      mentee?.name ?? '',
      mentee?.area ?? '',
      mentee?.region ?? '',
      mentor?.name ?? '',
      mentor?.employer ?? '',
      (pairing.fit / 100).toFixed(1),
      pairing.locked ? 'yes' : 'no',
      pairing.stays === null ? '' : pairing.stays.toFixed(2),
      ...pairing.scores.map((score) => (score < 0 ? 'no data' : (score / 10_000).toFixed(2))),
      '',
    ];
  });
  const leftOut = plan.report.leftOut.map((key) => {
    const mentee = mentees.get(key);
    const blank = new Array<string>(5 + plan.criteria.length).fill('');
    return [
      mentee?.name ?? '',
      mentee?.area ?? '',
      mentee?.region ?? '',
      ...blank,
      plan.report.leftOutBecause[key]?.text ?? '',
    ];
  });
  const head = [
    'Mentee',
    'Practice area',
    'Region',
    'Mentor',
    'Mentor’s employer',
    'Fit',
    'Locked',
    'Stays',
    ...plan.criteria.map((criterion) => criterion.label),
    'Left out because',
  ];
  const content = stringify([head, ...paired, ...leftOut], {
    bom: true,
    record_delimiter: 'windows',
    escape_formulas: true,
  });
  return new Download(`plan-run-${plan.run.number}.csv`, 'text/csv; charset=utf-8', content);
}
