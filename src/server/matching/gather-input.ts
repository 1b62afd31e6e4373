import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import {
  canonicalInput,
  type MatchingInput,
  type MenteeInput,
  type MentorInput,
} from '../../../shared/matching/matching-input';
import { grouped, type Db } from '../platform';
import { listDecisions } from './decisions-queries';
import {
  findGazetteer,
  listAdmitted,
  listDeclaredInterests,
  listEarlierCycles,
  listExclusions,
  listPairsOfPeople,
  listPreferences,
  listTagChoices,
  listTagTree,
  stepDown,
  stepUp,
  type ApplicantRow,
} from './gather-queries';

/** What a run of this cycle would read now, in canonical form. Belongs into a transaction: its role is lowered for the while. */
export async function gatherInput(
  db: Db,
  cycle: { id: string; startsOn: string },
  settings: MatchingSettings,
): Promise<MatchingInput> {
  await stepDown(db);
  const applicants = await listAdmitted(db, cycle.id);
  const tagsOf = grouped(await listTagChoices(db, cycle.id), (row) => row.personId);
  const exclusionsOf = grouped(await listExclusions(db, cycle.id), (row) => row.personId);
  const interestsOf = grouped(await listDeclaredInterests(db, cycle.id), (row) => row.personId);
  const preferredOf = grouped(await listPreferences(db, cycle.id), (row) => row.applicationId);
  const earlierCycles = await listEarlierCycles(db, cycle);
  const earlier = await listPairsOfPeople(db, earlierCycles, ['under-way', 'completed', 'ended-early']);
  const declined = await listPairsOfPeople(db, [cycle.id], ['declined']);
  const decisions = await listDecisions(db, cycle.id);
  const tags = await listTagTree(db);
  const towns = await findGazetteer(db);
  await stepUp(db);

  const common = (row: ApplicantRow) => ({
    key: row.applicationId,
    person: row.personId,
    employer: row.employer,
    town: row.town,
    timeZone: row.timeZone,
    languages: row.languages,
    yearsInPractice: row.yearsInPractice,
    sector: row.sector,
    meetingMode: row.meetingMode,
    maxDistanceKm: row.maxDistanceKm,
    availability: row.availability,
    exclusions: (exclusionsOf.get(row.personId) ?? []).map((each) => each.otherId),
    declaredInterests: (interestsOf.get(row.personId) ?? []).map((each) => each.otherId),
  });
  const choices = (row: ApplicantRow, direction: 'offers' | 'seeks') =>
    (tagsOf.get(row.personId) ?? []).filter((choice) => choice.direction === direction);
  const toMentee = (row: ApplicantRow): MenteeInput => ({
    ...common(row),
    seeks: choices(row, 'seeks').map(({ tagId, priority }) => ({ tagId, priority })),
    careerStage: row.careerStage,
    wishedYearsMin: row.wishedYearsMin,
    wishedYearsMax: row.wishedYearsMax,
    wishedSector: row.wishedSector,
    preferred: (preferredOf.get(row.applicationId) ?? []).map((each) => each.personId),
    leftOutLastTime: row.leftOutLastTime,
  });
  const toMentor = (row: ApplicantRow): MentorInput => ({
    ...common(row),
    offers: choices(row, 'offers').map(({ tagId, priority }) => ({ tagId, priority })),
    wishedStages: row.wishedStages,
    places: row.places - row.taken,
    taken: row.taken,
    oneMoreIfAsked: row.oneMoreIfAsked,
  });
  return canonicalInput({
    settings,
    day: cycle.startsOn,
    mentees: applicants.filter((row) => row.side === 'mentee').map(toMentee),
    mentors: applicants.filter((row) => row.side === 'mentor').map(toMentor),
    tags,
    towns,
    earlier: earlier.map(({ cycleId, mentee, mentor }) => ({
      mentee,
      mentor,
      cyclesAgo: earlierCycles.indexOf(cycleId) + 1,
    })),
    declined: declined.map(({ mentee, mentor }) => ({ mentee, mentor })),
    decisions: decisions.map((row) => ({
      mentee: row.menteeApplicationId,
      mentor: row.mentorApplicationId,
      kind: row.kind,
      overridesRules: row.overridesRules,
    })),
  });
}
