import type { Gazetteer } from '../../../shared/accounts/accounts-contract';
import type { ImportedProfile } from '../../../shared/applications/import-rows';
import { type MentoringProfile, Region } from '../../../shared/profiles/profiles-contract';
import { findAssociation } from '../accounts';
import { changedFields, recordAll } from '../audit';
import type { Context } from '../platform';
import { loadProfiles } from '../profiles';
import type { ImportedPerson } from './import-applicants';
import { chunksOf, insertProfiles, writeProfiles, type FilledSection } from './import-queries';

const SECTIONS: readonly FilledSection[] = ['about', 'practice', 'interests', 'meeting', 'wishes'];

/**
 * Fills profiles with what the file says; cells that are empty, and columns that are not there, change nothing. It does for
 * a whole list what saving a section does for one person (versions rise, audit rows name the changed fields), since one
 * statement after the other would take minutes for some thousand lines.
 */
export async function fillProfiles(tx: Context, people: ImportedPerson[]): Promise<Map<string, MentoringProfile>> {
  const association = await findAssociation(tx.db);
  const personIds = [...new Set(people.map((each) => each.personId))];
  await insertProfiles(tx.db, personIds, association?.timeZone ?? 'UTC', tx.now());
  const before = await loadProfiles(tx.db, personIds);
  const after = new Map(before);
  for (const { row, personId } of people) {
    const profile = after.get(personId);
    if (profile) after.set(personId, filled(profile, row.profile, association?.gazetteer ?? {}));
  }
  const changed = [...after.values()].flatMap((profile) => {
    const fields = changedIn(before.get(profile.personId), profile);
    return fields.size > 0 ? [{ profile, fields }] : [];
  });
  await writeProfiles(
    tx.db,
    changed.map(({ profile, fields }) => ({ profile, sections: [...fields.keys()] })),
    tx.now(),
  );
  for (const chunk of chunksOf(changed))
    await recordAll(
      tx,
      chunk.map(({ profile, fields }) => ({
        action: 'profiles.update',
        subjectId: profile.personId,
        fields: [...fields].flatMap(([section, names]) => names.map((name) => `${section}.${name}`)),
      })),
    );
  return after;
}

/** Names of changed fields by section; sections without a change are left out. */
function changedIn(before: MentoringProfile | undefined, after: MentoringProfile): Map<FilledSection, string[]> {
  const changed = new Map<FilledSection, string[]>();
  for (const section of SECTIONS) {
    const fields = before ? changedFields(before[section], after[section]) : [];
    if (fields.length > 0) changed.set(section, fields);
  }
  return changed;
}

function filled(before: MentoringProfile, said: ImportedProfile, towns: Gazetteer): MentoringProfile {
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
    ...before,
    about,
    practice: { ...before.practice, ...said.practice },
    interests: { ...before.interests, ...said.interests },
    meeting: { ...before.meeting, ...said.meeting },
    wishes,
  };
}
