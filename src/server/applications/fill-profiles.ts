import type { ImportedProfile } from '../../../shared/applications/import-rows';
import type { Gazetteer } from '../../../shared/accounts/accounts-contract';
import { type MentoringProfile, Region, type SectionContent } from '../../../shared/profiles/profiles-contract';
import { findAssociation } from '../accounts';
import type { Context } from '../platform';
import { ensureProfile, loadProfiles, updateSection } from '../profiles';
import type { ImportedPerson } from './import-applicants';

type Filled = Pick<SectionContent, 'about' | 'practice' | 'interests' | 'meeting' | 'wishes'>;

/** Fills profiles with what the file says; cells that are empty, and columns that are not there, change nothing. */
export async function fillProfiles(tx: Context, people: ImportedPerson[]): Promise<void> {
  const towns = (await findAssociation(tx.db))?.gazetteer ?? {};
  for (const { personId, created } of people) if (created) await ensureProfile(tx, personId);
  const profiles = await loadProfiles(
    tx.db,
    people.map((each) => each.personId),
  );
  for (const { row, personId } of people) {
    const before = profiles.get(personId);
    if (before) profiles.set(personId, await fill(tx, before, filled(before, row.profile, towns)));
  }
}

async function fill(tx: Context, before: MentoringProfile, after: Filled): Promise<MentoringProfile> {
  const { personId } = before;
  if (differs(before.about, after.about)) await updateSection(tx, personId, 'about', after.about);
  if (differs(before.practice, after.practice)) await updateSection(tx, personId, 'practice', after.practice);
  if (differs(before.interests, after.interests)) await updateSection(tx, personId, 'interests', after.interests);
  if (differs(before.meeting, after.meeting)) await updateSection(tx, personId, 'meeting', after.meeting);
  if (differs(before.wishes, after.wishes)) await updateSection(tx, personId, 'wishes', after.wishes);
  return { ...before, ...after };
}

const differs = (a: object, b: object): boolean => JSON.stringify(a) !== JSON.stringify(b);

function filled(before: MentoringProfile, said: ImportedProfile, towns: Gazetteer): Filled {
  const about = { ...before.about, ...said.about };
  // A town lies in one region; a file that names only the town says both.
  const region = Region.safeParse(said.about.town ? towns[said.about.town]?.region : null);
  if (said.about.region === undefined && region.success) about.region = region.data;
  const wishes = { ...before.wishes, ...said.wishes };
  const { wishedYearsMin: least, wishedYearsMax: most } = wishes;
  // What the file says of one end of the range may leave the other behind.
  if (least !== null && most !== null && least > most)
    wishes[said.wishes.wishedYearsMin === undefined ? 'wishedYearsMin' : 'wishedYearsMax'] = null;
  return {
    about,
    practice: { ...before.practice, ...said.practice },
    interests: { ...before.interests, ...said.interests },
    meeting: { ...before.meeting, ...said.meeting },
    wishes,
  };
}
