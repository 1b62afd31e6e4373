import {
  MentoringProfile,
  PeopleFound,
  PersonSearch,
  ProfileParams,
  PublicProfile,
  SavedSection,
  SectionBody,
  SectionParams,
} from '../../../shared/profiles/profiles-contract';
import { actorOf, route, type Route } from '../platform';
import { searchMembers } from './profiles-queries';
import { showOwnProfile, showVisibleProfile } from './show-profile';
import { updateOwnSection } from './update-section';

export const profilesRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/profiles/mine',
    may: ['member'],
    summary: 'One’s own mentoring profile',
    answer: MentoringProfile,
    handle: (ctx) => showOwnProfile(ctx),
  }),
  route({
    method: 'put',
    path: '/api/profiles/mine/:section',
    may: ['member'],
    summary: 'Save one section of one’s own profile',
    versioned: true,
    params: SectionParams,
    body: SectionBody,
    answer: SavedSection,
    handle: (ctx, { params, body, version }) => updateOwnSection(ctx, params.section, body, version),
  }),
  route({
    method: 'get',
    path: '/api/profiles/search',
    may: ['member'],
    summary: 'Members by name, for naming somebody in one’s private section',
    query: PersonSearch,
    answer: PeopleFound,
    handle: async (ctx, { query }) => ({ people: await searchMembers(ctx.db, query.text, actorOf(ctx).personId, 10) }),
  }),
  route({
    method: 'get',
    path: '/api/profiles/:personId',
    may: ['member'],
    summary: 'A profile as other members see it',
    params: ProfileParams,
    answer: PublicProfile,
    handle: (ctx, { params }) => showVisibleProfile(ctx, params.personId),
  }),
];
