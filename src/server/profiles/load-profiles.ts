import type { MentoringProfile } from '../../../shared/profiles/profiles-contract';
import type { Db } from '../platform';
import { loadProfileRows, type ProfileRows } from './profiles-queries';

/** One place where rows become the profile that its owner sees. */
function toProfile({
  profile: row,
  name,
  offers,
  seeks,
  exclusions,
  declaredInterests,
}: ProfileRows): MentoringProfile {
  return {
    personId: row.personId,
    about: {
      name,
      knownAs: row.knownAs,
      pronouns: row.pronouns,
      headline: row.headline,
      employer: row.employer,
      region: row.region,
      town: row.town,
      timeZone: row.timeZone,
      languages: row.languages,
    },
    practice: {
      careerStage: row.careerStage,
      yearsInPractice: row.yearsInPractice,
      sector: row.sector,
      credentials: row.credentials,
    },
    interests: { offers, seeks },
    meeting: { meetingMode: row.meetingMode, maxDistanceKm: row.maxDistanceKm, availability: row.availability },
    wishes: {
      hopes: row.hopes,
      style: row.style,
      cannotHelpWith: row.cannotHelpWith,
      wishedYearsMin: row.wishedYearsMin,
      wishedYearsMax: row.wishedYearsMax,
      wishedSector: row.wishedSector,
      wishedStages: row.wishedStages,
      listed: row.listed,
    },
    private: { exclusions, declaredInterests, adjustments: row.adjustments },
    versions: {
      about: row.aboutVersion,
      practice: row.practiceVersion,
      interests: row.interestsVersion,
      meeting: row.meetingVersion,
      wishes: row.wishesVersion,
      private: row.privateVersion,
    },
    updatedAt: row.updatedAt.toISOString(),
  };
}

/** Whole profiles, private parts included: for the owner and for coordinators' work alone. */
export async function loadProfiles(db: Db, personIds: string[]): Promise<Map<string, MentoringProfile>> {
  const rows = await loadProfileRows(db, personIds);
  return new Map(rows.map((row) => [row.profile.personId, toProfile(row)]));
}
