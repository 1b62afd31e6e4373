import {
  AddressOnly,
  Invitation,
  InvitationAnswer,
  InvitationView,
  Outcome,
  PasswordReset,
  PeoplePage,
  PeopleQuery,
  PersonLine,
  PersonParams,
  Registration,
  RolesChange,
  Session,
  SignIn,
  TokenOnly,
} from '../../../shared/accounts/accounts-contract';
import { route, type Route } from '../platform';
import { confirmAddress } from './confirm-address';
import { acceptInvitation, invite, showInvitation } from './invite';
import { changeRoles, showPeople } from './manage-people';
import { register } from './register';
import { requestReset, resetPassword } from './reset-password';
import { showSession } from './show-session';
import { asActor, signIn } from './sign-in';

export const accountsRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/accounts/session',
    may: ['anyone'],
    summary: 'Who is signed in, and the association',
    answer: Session,
    handle: (ctx) => showSession(ctx),
  }),
  route({
    method: 'post',
    path: '/api/accounts/registrations',
    may: ['anyone'],
    summary: 'Sign up',
    limit: 'send-link',
    body: Registration,
    answer: Outcome,
    status: 202,
    async handle(ctx, { body }) {
      await ctx.limits.count('send-link-account', body.email);
      return register(ctx, body);
    },
  }),
  route({
    method: 'post',
    path: '/api/accounts/confirmations',
    may: ['anyone'],
    summary: 'Confirm an address by the link sent to it',
    limit: 'link-guess',
    body: TokenOnly,
    answer: Outcome,
    handle: (ctx, { body }) => confirmAddress(ctx, body.token),
  }),
  route({
    method: 'post',
    path: '/api/accounts/session',
    may: ['anyone'],
    summary: 'Sign in',
    body: SignIn,
    answer: Session,
    async handle(ctx, { body }) {
      const actor = await signIn(ctx, body.email);
      return showSession(asActor(ctx, actor));
    },
  }),
  route({
    method: 'delete',
    path: '/api/accounts/session',
    may: ['anyone'],
    summary: 'Sign out',
    answer: Session,
    async handle(ctx) {
      await ctx.session.end();
      return showSession(asActor(ctx, null));
    },
  }),
  route({
    method: 'post',
    path: '/api/accounts/reset-requests',
    may: ['anyone'],
    summary: 'Ask for a link to set a new password',
    limit: 'send-link',
    body: AddressOnly,
    answer: Outcome,
    status: 202,
    async handle(ctx, { body }) {
      await ctx.limits.count('send-link-account', body.email);
      return requestReset(ctx, body.email);
    },
  }),
  route({
    method: 'post',
    path: '/api/accounts/password-resets',
    may: ['anyone'],
    summary: 'Set a new password by the link',
    limit: 'link-guess',
    body: PasswordReset,
    answer: Outcome,
    handle: (ctx, { body }) => resetPassword(ctx, body),
  }),
  route({
    method: 'get',
    path: '/api/accounts/invitations/:token',
    may: ['anyone'],
    summary: 'What an invitation offers',
    limit: 'link-guess',
    params: TokenOnly,
    answer: InvitationView,
    handle: (ctx, { params }) => showInvitation(ctx, params.token),
  }),
  route({
    method: 'post',
    path: '/api/accounts/invitation-answers',
    may: ['anyone'],
    summary: 'Accept an invitation',
    limit: 'link-guess',
    body: InvitationAnswer,
    answer: Outcome,
    handle: (ctx, { body }) => acceptInvitation(ctx, body),
  }),
  route({
    method: 'post',
    path: '/api/accounts/invitations',
    may: ['administrator'],
    summary: 'Invite somebody',
    body: Invitation,
    answer: Outcome,
    status: 202,
    handle: (ctx, { body }) => invite(ctx, body),
  }),
  route({
    method: 'get',
    path: '/api/accounts/people',
    may: ['administrator'],
    summary: 'People and their roles',
    query: PeopleQuery,
    answer: PeoplePage,
    handle: (ctx, { query }) => showPeople(ctx, query),
  }),
  route({
    method: 'put',
    path: '/api/accounts/people/:personId/roles',
    may: ['administrator'],
    summary: 'Give or take roles',
    params: PersonParams,
    body: RolesChange,
    answer: PersonLine,
    handle: (ctx, { params, body }) => changeRoles(ctx, params.personId, body.roles),
  }),
];
