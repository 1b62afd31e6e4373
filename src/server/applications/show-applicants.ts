import { APPLICANT_FLAGS, type ApplicantFlag } from '../../../shared/applications/application-rules';
import type {
  ApplicantDetail,
  ApplicantLine,
  ApplicantsPage,
} from '../../../shared/applications/applications-contract';
import type { MentoringProfile, PrivateSection, TagChoice } from '../../../shared/profiles/profiles-contract';
import { recordAudit } from '../audit';
import { findCycle } from '../cycles';
import { actorOf, inTransaction, notFound, type Context } from '../platform';
import { ensureProfile, loadProfiles } from '../profiles';
import { listTags } from '../tags';
import {
  countApplicants,
  findApplicant,
  listApplicants,
  practiceAreasOf,
  type ApplicantRow,
  type ApplicantsFilter,
} from './applicants-queries';
import { preferencesOf } from './applications-queries';

const FLAG_NAMES = Object.keys(APPLICANT_FLAGS) as ApplicantFlag[];
export const flagsOf = (row: ApplicantRow): string[] =>
  FLAG_NAMES.filter((flag) => row[flag]).map((flag) => APPLICANT_FLAGS[flag]);

const toLine = (row: ApplicantRow, practiceAreas: string[]): ApplicantLine => ({
  id: row.id,
  personId: row.personId,
  name: row.name,
  email: row.email,
  side: row.side,
  status: row.status,
  places: row.places,
  oneMoreIfAsked: row.oneMoreIfAsked,
  employer: row.employer,
  region: row.region,
  careerStage: row.careerStage,
  yearsInPractice: row.yearsInPractice,
  practiceAreas,
  completeness: row.completeness,
  flags: flagsOf(row),
  late: row.late,
  submittedAt: row.submittedAt?.toISOString() ?? null,
  version: row.version,
});

export async function showApplicants(ctx: Context, cycleId: string, filter: ApplicantsFilter): Promise<ApplicantsPage> {
  if (!(await findCycle(ctx.db, cycleId))) throw notFound('cycle');
  const { page, pageSize } = filter;
  const [rows, total] = await Promise.all([
    listApplicants(ctx.db, cycleId, filter, { limit: pageSize, offset: (page - 1) * pageSize }),
    countApplicants(ctx.db, cycleId, filter),
  ]);
  const areas = await practiceAreasOf(
    ctx.db,
    rows.map((row) => row.id),
  );
  return { applicants: rows.map((row) => toLine(row, areas.get(row.id) ?? [])), total, page, pageSize };
}

/** A whole application with the private part of its profile; each look is written down. */
export function showApplicant(ctx: Context, cycleId: string, applicationId: string): Promise<ApplicantDetail> {
  return inTransaction(ctx, async (tx) => {
    const row = await findApplicant(tx.db, cycleId, applicationId);
    if (!row) throw notFound('application');
    await ensureProfile(tx, row.personId);
    const profile = (await loadProfiles(tx.db, [row.personId])).get(row.personId);
    if (!profile) throw notFound('profile');
    await recordAudit(tx, { action: 'applications.view-private', subjectId: applicationId, cycleId });

    const labels = new Map((await listTags(tx.db)).map((tag) => [tag.id, tag.label]));
    const named = (choices: TagChoice[]): string[] => choices.flatMap((choice) => labels.get(choice.tagId) ?? []);
    const areas = await practiceAreasOf(tx.db, [applicationId]);
    return {
      line: toLine(row, areas.get(applicationId) ?? []),
      goals: row.goals,
      preferredMentors: (await preferencesOf(tx.db, [applicationId])).get(applicationId) ?? [],
      membershipNumber: row.membershipNumber,
      consentVersion: row.consentVersion,
      consentAt: row.consentAt?.toISOString() ?? null,
      leftOutLastTime: row.leftOutLastTime,
      withdrawnAt: row.withdrawnAt?.toISOString() ?? null,
      profile: { ...profile, private: withoutViewer(profile, actorOf(tx).personId) },
      offers: named(profile.interests.offers),
      seeks: named(profile.interests.seeks),
    };
  });
}

// Who is named in a private section is never told, also where the named one is a coordinator.
function withoutViewer({ private: content, personId }: MentoringProfile, viewerId: string): PrivateSection {
  if (personId === viewerId) return content;
  return {
    ...content,
    exclusions: content.exclusions.filter((other) => other.personId !== viewerId),
    declaredInterests: content.declaredInterests.filter((other) => other.personId !== viewerId),
  };
}
