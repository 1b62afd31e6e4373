import type { MentoringProfile, PublicProfile, TagChoice } from '../../../shared/profiles/profiles-contract';
import { findAssociation } from '../accounts';
import { actorOf, hasRole, notFound, type Context } from '../platform';
import { listTags } from '../tags';
import { loadProfiles } from './load-profiles';
import { insertProfile } from './profiles-queries';

/** One's own profile, made on first sight. */
export async function showOwnProfile(ctx: Context): Promise<MentoringProfile> {
  const { personId } = actorOf(ctx);
  await ensureProfile(ctx, personId);
  const profile = (await loadProfiles(ctx.db, [personId])).get(personId);
  if (!profile) throw notFound('profile');
  return profile;
}

/** Makes an empty profile where there is none yet. */
export async function ensureProfile(ctx: Context, personId: string): Promise<void> {
  const association = await findAssociation(ctx.db);
  await insertProfile(ctx.db, personId, association?.timeZone ?? 'UTC', ctx.now());
}

/**
 * A profile as others see it: one's own, a coordinator's look, or a mentor who agreed to be listed. Partners of a pairing
 * read each other through `pairings`, which knows that they are.
 */
export async function showVisibleProfile(ctx: Context, personId: string): Promise<PublicProfile> {
  const actor = actorOf(ctx);
  const profile = (await loadProfiles(ctx.db, [personId])).get(personId);
  const visible = personId === actor.personId || hasRole(actor, 'coordinator') || profile?.wishes.listed;
  if (!profile || !visible) throw notFound('profile');
  return toPublicProfile(ctx, profile);
}

/** Addresses and private parts are absent, not hidden. */
export async function toPublicProfile(ctx: Context, profile: MentoringProfile): Promise<PublicProfile> {
  const labels = new Map((await listTags(ctx.db)).map((tag) => [tag.id, tag.label]));
  const named = (choices: TagChoice[]): string[] =>
    choices.map((choice) => labels.get(choice.tagId) ?? '').filter(Boolean);
  const { about, practice, interests, meeting, wishes } = profile;
  return {
    personId: profile.personId,
    name: about.name,
    pronouns: about.pronouns,
    headline: about.headline,
    employer: about.employer,
    region: about.region,
    careerStage: practice.careerStage,
    yearsInPractice: practice.yearsInPractice,
    sector: practice.sector,
    credentials: practice.credentials,
    languages: about.languages,
    offers: named(interests.offers),
    seeks: named(interests.seeks),
    meetingMode: meeting.meetingMode,
    availability: meeting.availability,
    timeZone: about.timeZone,
    hopes: wishes.hopes,
    style: wishes.style,
    cannotHelpWith: wishes.cannotHelpWith,
  };
}
