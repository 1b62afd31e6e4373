import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { MessageState, MessageTemplate } from '../../shared/messages/messages-contract';
import { people } from './accounts';
import { id, instant } from './columns';

/** The outbox: one row per cause, recipient and template, written in the transaction of the change it tells of. */
export const messages = pgTable(
  'messages',
  {
    id: id(),
    template: text().$type<MessageTemplate>().notNull(),
    cause: text().notNull(),
    recipientId: uuid().references(() => people.id, { onDelete: 'cascade' }),
    address: text().notNull(),
    data: jsonb().$type<Record<string, unknown>>().notNull(),
    state: text().$type<MessageState>().notNull().default('queued'),
    attempts: integer().notNull().default(0),
    dueAt: instant().notNull(),
    fault: text(),
    createdAt: instant().notNull(),
    sentAt: instant(),
  },
  (t) => [
    uniqueIndex('messages_once').on(t.cause, t.address, t.template),
    index('messages_due')
      .on(t.dueAt)
      .where(sql`${t.state} = 'queued'`),
    check('messages_state_known', sql`${t.state} in ('queued', 'sent', 'refused', 'dead', 'cancelled')`),
  ],
);

/** The local mailbox: what the fake mail server received. Empty where a real one is set. */
export const mailbox = pgTable(
  'mailbox',
  {
    id: id(),
    messageId: uuid()
      .notNull()
      .references(() => messages.id, { onDelete: 'cascade' }),
    sender: text().notNull(),
    recipient: text().notNull(),
    subject: text().notNull(),
    html: text().notNull(),
    text: text().notNull(),
    headers: jsonb().$type<Record<string, string>>().notNull(),
    receivedAt: instant().notNull(),
  },
  (t) => [index('mailbox_received').on(t.receivedAt)],
);
