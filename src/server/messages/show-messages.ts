import type { z } from 'zod';
import type { MailboxMessage, MessagesPage, MessagesQuery } from '../../../shared/messages/messages-contract';
import { notFound, type Context } from '../platform';
import { countMessages, findMailboxMessage, listMessages } from './messages-queries';

const PAGE_SIZE = 50;

/** Delivery states of all messages; never their texts. */
export async function showMessages(ctx: Context, query: z.output<typeof MessagesQuery>): Promise<MessagesPage> {
  const filter = { search: query.search, state: query.state, template: query.template };
  const rows = await listMessages(ctx.db, filter, PAGE_SIZE, (query.page - 1) * PAGE_SIZE);
  return {
    messages: rows.map(({ message, recipientName, subject }) => ({
      id: message.id,
      template: message.template,
      address: message.address,
      recipientName,
      state: message.state,
      attempts: message.attempts,
      fault: message.fault,
      createdAt: message.createdAt.toISOString(),
      sentAt: message.sentAt?.toISOString() ?? null,
      subject: ctx.settings.smtpUrl === null ? subject : null,
    })),
    total: await countMessages(ctx.db, filter),
    page: query.page,
    pageSize: PAGE_SIZE,
  };
}

/** A whole message from the local mailbox. With a real mail server nobody reads other people's mail, so there is none. */
export async function showMailboxMessage(ctx: Context, messageId: string): Promise<MailboxMessage> {
  const row = ctx.settings.smtpUrl === null ? await findMailboxMessage(ctx.db, messageId) : null;
  if (!row) throw notFound('message in the local mailbox');
  return {
    id: row.messageId,
    sender: row.sender,
    recipient: row.recipient,
    subject: row.subject,
    html: row.html,
    text: row.text,
    headers: row.headers,
    receivedAt: row.receivedAt.toISOString(),
  };
}
