import { MailboxMessage, MessageParams, MessagesPage, MessagesQuery } from '../../../shared/messages/messages-contract';
import { FramedPage, route, type Route } from '../platform';
import { showMailboxMessage, showMessages } from './show-messages';

export const messagesRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/messages',
    may: ['administrator'],
    summary: 'Messages and their delivery states',
    query: MessagesQuery,
    answer: MessagesPage,
    handle: (ctx, { query }) => showMessages(ctx, query),
  }),
  route({
    method: 'get',
    path: '/api/messages/:messageId/mailbox',
    may: ['administrator'],
    summary: 'A whole message from the local mailbox',
    params: MessageParams,
    answer: MailboxMessage,
    handle: (ctx, { params }) => showMailboxMessage(ctx, params.messageId),
  }),
  route({
    method: 'get',
    path: '/api/messages/:messageId/mailbox/page',
    may: ['administrator'],
    summary: 'The HTML of a message from the local mailbox, for showing in a frame',
    params: MessageParams,
    handle: async (ctx, { params }) => new FramedPage((await showMailboxMessage(ctx, params.messageId)).html),
  }),
];
