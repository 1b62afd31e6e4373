import {
  SECTION_SCHEMA,
  type ProfileSection,
  type SavedSection,
  type SectionContent,
} from '../../../shared/profiles/profiles-contract';
import { findAssociation, findPeople, updatePerson } from '../accounts';
import { changedFields, recordAudit } from '../audit';
import { actorOf, inTransaction, notFound, Problem, read, stale, type Context } from '../platform';
import { listTags } from '../tags';
import { loadProfiles } from './load-profiles';
import { claimSection, replacePrivatePeople, replaceTags, updateProfileColumns } from './profiles-queries';
import { ensureProfile } from './show-profile';

/** Saves one section of one's own profile; refuses where another tab saved it meanwhile. */
export function updateOwnSection(
  ctx: Context,
  section: ProfileSection,
  body: unknown,
  version: number,
): Promise<SavedSection> {
  const { personId } = actorOf(ctx);
  return inTransaction(ctx, (tx) => saveSection(tx, personId, section, read(SECTION_SCHEMA[section], body), version));
}

/** The same for lists that staff bring; there is no version to compare with. */
export async function updateSection<S extends ProfileSection>(
  tx: Context,
  personId: string,
  section: S,
  content: SectionContent[S],
): Promise<void> {
  await ensureProfile(tx, personId);
  await saveSection(tx, personId, section, content, null);
}

async function saveSection(
  tx: Context,
  personId: string,
  section: ProfileSection,
  content: SectionContent[ProfileSection],
  expected: number | null,
): Promise<SavedSection> {
  const before = (await loadProfiles(tx.db, [personId])).get(personId);
  if (!before) throw notFound('profile');
  const version = await claimSection(tx.db, personId, section, expected, tx.now());
  if (version === null) throw stale({ section, content: before[section], version: before.versions[section] });
  await WRITE[section](tx, personId, content as never);
  const fields = changedFields(before[section], content as (typeof before)[typeof section]);
  // Private names stay private in the audit trail too: fields are named, values never.
  await recordAudit(tx, {
    action: 'profiles.update',
    subjectId: personId,
    fields: fields.map((field) => `${section}.${field}`),
  });
  return { section, content: content as Record<string, unknown>, version };
}

type Writers = { [S in ProfileSection]: (tx: Context, personId: string, content: SectionContent[S]) => Promise<void> };

const WRITE: Writers = {
  async about(tx, personId, { name, ...columns }) {
    const association = await findAssociation(tx.db);
    const towns = association?.gazetteer ?? {};
    if (columns.town !== null && !towns[columns.town]) throw oneFault('town', 'Choose a town from the list');
    await updatePerson(tx.db, personId, { name });
    await updateProfileColumns(tx.db, personId, columns);
  },
  practice: (tx, personId, content) => updateProfileColumns(tx.db, personId, content),
  async interests(tx, personId, { offers, seeks }) {
    const known = new Set((await listTags(tx.db)).filter((tag) => tag.state !== 'retired').map((tag) => tag.id));
    if ([...offers, ...seeks].some((choice) => !known.has(choice.tagId)))
      throw oneFault('offers', 'One of these tags has been retired; choose another');
    await replaceTags(tx.db, personId, offers, seeks);
  },
  meeting: (tx, personId, content) => updateProfileColumns(tx.db, personId, content),
  wishes: (tx, personId, content) => updateProfileColumns(tx.db, personId, content),
  async private(tx, personId, content) {
    const ids = [...content.exclusions, ...content.declaredInterests].map((other) => other.personId);
    if (ids.includes(personId)) throw oneFault('exclusions', 'You cannot name yourself');
    const found = await findPeople(tx.db, [...new Set(ids)]);
    if (found.length !== new Set(ids).size) throw oneFault('exclusions', 'One of these people is not known any more');
    await replacePrivatePeople(tx.db, personId, content);
    await updateProfileColumns(tx.db, personId, { adjustments: content.adjustments });
  },
};

const oneFault = (field: string, message: string): Problem =>
  new Problem('invalid', 'Some fields need another look', { fields: [{ field, message }] });
