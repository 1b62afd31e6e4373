import { inTransaction, type Context } from '../platform';
import type { MailTransport } from './mail-transport';
import { takeDueMessage, updateMessage, type MessageRow } from './messages-queries';
import { renderMessage } from './render-message';

const MINUTE = 60_000;
const LONGEST_WAIT = 240 * MINUTE;
// RFC 5321, 4.5.4.1: give up after four to five days.
const GIVE_UP_AFTER = 4 * 24 * 60 * MINUTE;

/** Sends what is due, one row a transaction; returns how many rows were handled. */
export async function deliverMessages(ctx: Context, send: MailTransport, most = 200): Promise<number> {
  let handled = 0;
  while (handled < most && (await deliverNext(ctx, send))) handled++;
  return handled;
}

async function deliverNext(ctx: Context, send: MailTransport): Promise<boolean> {
  return inTransaction(ctx, async (tx) => {
    const row = await takeDueMessage(tx.db, tx.now());
    if (!row) return false;
    const fault = await attempt(tx, row, send);
    await updateMessage(
      tx.db,
      row.id,
      fault
        ? failed(row, fault, tx.now())
        : { state: 'sent', sentAt: tx.now(), attempts: row.attempts + 1, fault: null },
    );
    return true;
  });
}

interface Fault {
  text: string;
  permanent: boolean;
}

async function attempt(tx: Context, row: MessageRow, send: MailTransport): Promise<Fault | null> {
  try {
    const rendered = await renderMessage(tx.settings, row.template, row.data);
    await send(tx, { ...rendered, rowId: row.id, recipient: row.address });
    return null;
  } catch (error) {
    tx.log.warn({ err: error as Error, messageId: row.id, template: row.template }, 'message not delivered');
    const code = error instanceof Error && 'responseCode' in error ? Number(error.responseCode) : 0;
    return { text: error instanceof Error ? error.message.slice(0, 500) : 'unknown', permanent: code >= 500 };
  }
}

function failed(row: MessageRow, fault: Fault, now: Date): Partial<MessageRow> {
  const attempts = row.attempts + 1;
  const over = now.getTime() - row.createdAt.getTime() > GIVE_UP_AFTER;
  if (fault.permanent || over) return { state: 'dead', attempts, fault: fault.text };
  const wait = Math.min(LONGEST_WAIT, MINUTE * 2 ** Math.min(attempts - 1, 20));
  return { attempts, fault: fault.text, dueAt: new Date(now.getTime() + wait) };
}

/** Looks for due messages every second until stopped; any number of processes may do so. */
export function startDelivery(ctx: Context, send: MailTransport): () => Promise<void> {
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let current: Promise<unknown> = Promise.resolve();
  const round = (): void => {
    current = deliverMessages(ctx, send)
      .catch((error: unknown) => ctx.log.warn({ err: error as Error }, 'delivery paused'))
      .finally(() => {
        if (!stopped) timer = setTimeout(round, 1000);
      });
  };
  round();
  return async () => {
    stopped = true;
    clearTimeout(timer);
    await current;
  };
}
