import { CycleParams } from '../../../shared/cycles/cycles-contract';
import {
  AnswerForm,
  OwnPairing,
  OwnPairings,
  PairingLines,
  PairingParams,
  PairingsQuery,
  ProposalLinkParams,
} from '../../../shared/pairings/pairings-contract';
import { route, type Route } from '../platform';
import { answerByToken, answerOwn } from './answer-pairing';
import { showOwnPairings, showProposal, showResponses } from './show-pairings';

export const pairingsRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/pairings/mine',
    may: ['member'],
    summary: 'One’s own proposals and pairs',
    answer: OwnPairings,
    handle: (ctx) => showOwnPairings(ctx),
  }),
  route({
    method: 'post',
    path: '/api/pairings/:pairingId/answer',
    may: ['member'],
    summary: 'Accept or decline a proposal, or take an acceptance back',
    params: PairingParams,
    body: AnswerForm,
    answer: OwnPairing,
    handle: (ctx, { params, body }) => answerOwn(ctx, params.pairingId, body),
  }),
  route({
    method: 'get',
    path: '/api/pairings/proposals/:token',
    may: ['anyone'],
    summary: 'What the link of a proposal shows; looking changes nothing',
    limit: 'link-guess',
    params: ProposalLinkParams,
    answer: OwnPairing,
    handle: (ctx, { params }) => showProposal(ctx, params.token),
  }),
  route({
    method: 'post',
    path: '/api/pairings/proposals/:token/answer',
    may: ['anyone'],
    summary: 'Answer a proposal through its link',
    limit: 'link-guess',
    params: ProposalLinkParams,
    body: AnswerForm,
    answer: OwnPairing,
    handle: (ctx, { params, body }) => answerByToken(ctx, params.token, body),
  }),
  route({
    method: 'get',
    path: '/api/pairings/cycles/:cycleId',
    may: ['coordinator'],
    summary: 'Every pairing of a cycle and how it stands',
    params: CycleParams,
    query: PairingsQuery,
    answer: PairingLines,
    handle: (ctx, { params, query }) =>
      showResponses(ctx, params.cycleId, { state: query.state, search: query.search }),
  }),
];
