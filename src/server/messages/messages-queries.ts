import { and, asc, count, desc, eq, ilike, lte, or, type SQL } from 'drizzle-orm';
import { mailbox, messages, people } from '../../../drizzle/schema';
import type { MessageState, MessageTemplate } from '../../../shared/messages/messages-contract';
import type { Db } from '../platform';

export type MessageRow = typeof messages.$inferSelect;

export async function insertMessages(db: Db, rows: (typeof messages.$inferInsert)[]): Promise<void> {
  for (let from = 0; from < rows.length; from += 1000)
    await db
      .insert(messages)
      .values(rows.slice(from, from + 1000))
      .onConflictDoNothing();
}

/** Takes the next message that is due and holds its row, so that no other process sends it too. */
export async function takeDueMessage(db: Db, now: Date): Promise<MessageRow | null> {
  const [row] = await db
    .select()
    .from(messages)
    .where(and(eq(messages.state, 'queued'), lte(messages.dueAt, now)))
    .orderBy(asc(messages.dueAt))
    .limit(1)
    .for('update', { skipLocked: true });
  return row ?? null;
}

export async function updateMessage(db: Db, id: string, change: Partial<MessageRow>): Promise<void> {
  await db.update(messages).set(change).where(eq(messages.id, id));
}

export async function insertMailboxMessage(db: Db, row: typeof mailbox.$inferInsert): Promise<void> {
  await db.insert(mailbox).values(row);
}

interface MessageFilter {
  search: string;
  state: MessageState | undefined;
  template: MessageTemplate | undefined;
}

function matching({ search, state, template }: MessageFilter): SQL | undefined {
  const pattern = `%${search.replace(/[\\%_]/g, '\\$&')}%`;
  return and(
    state ? eq(messages.state, state) : undefined,
    template ? eq(messages.template, template) : undefined,
    search
      ? or(ilike(messages.address, pattern), ilike(people.name, pattern), ilike(mailbox.subject, pattern))
      : undefined,
  );
}

export async function listMessages(db: Db, filter: MessageFilter, limit: number, offset: number) {
  return db
    .select({ message: messages, recipientName: people.name, subject: mailbox.subject })
    .from(messages)
    .leftJoin(people, eq(people.id, messages.recipientId))
    .leftJoin(mailbox, eq(mailbox.messageId, messages.id))
    .where(matching(filter))
    .orderBy(desc(messages.createdAt), asc(messages.id))
    .limit(limit)
    .offset(offset);
}

export async function countMessages(db: Db, filter: MessageFilter): Promise<number> {
  const [row] = await db
    .select({ total: count() })
    .from(messages)
    .leftJoin(people, eq(people.id, messages.recipientId))
    .leftJoin(mailbox, eq(mailbox.messageId, messages.id))
    .where(matching(filter));
  return row?.total ?? 0;
}

export async function findMailboxMessage(db: Db, messageId: string) {
  const [row] = await db.select().from(mailbox).where(eq(mailbox.messageId, messageId)).limit(1);
  return row ?? null;
}
