import type { MessageTemplate } from '../../../shared/messages/messages-contract';
import type { Context } from '../platform';
import { insertMessages } from './messages-queries';

/** What a template is filled with: texts, numbers, lists of them. Links are named by purpose and row (see `LinkRef`). */
export type MessageData = Record<string, unknown>;

/** Stands in a message's data for a link whose token is made when the message is rendered, so that no token is stored. */
export interface LinkRef {
  /** Path with `:token` where the token goes, e.g. `/proposals/:token`. */
  path: string;
  purpose: string;
  rowId: string;
}

export interface OutgoingMessage {
  template: MessageTemplate;
  /** Why it is sent; with address and template it makes the message unique, so that a repeated deed sends nothing twice. */
  cause: string;
  recipientId: string | null;
  address: string;
  data: MessageData;
  /** Links by the name under which the template knows them. */
  links?: Record<string, LinkRef>;
}

/** Puts a message into the outbox; belongs into the transaction of the change it tells of. */
export const postMessage = (ctx: Context, message: OutgoingMessage): Promise<void> => postMessages(ctx, [message]);

export async function postMessages(ctx: Context, outgoing: OutgoingMessage[]): Promise<void> {
  const at = ctx.now();
  await insertMessages(
    ctx.db,
    outgoing.map(({ links, data, ...message }) => ({
      ...message,
      data: { ...data, links: links ?? {} },
      dueAt: at,
      createdAt: at,
    })),
  );
}
