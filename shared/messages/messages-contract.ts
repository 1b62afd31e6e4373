/** Messages: the outbox and, without a mail server, the local mailbox. */
import { z } from 'zod';

/** One template per message; its file is `emails/<template>.mjml` with a text twin. */
export const MessageTemplate = z.enum([
  'accounts/confirm-address',
  'accounts/address-known',
  'accounts/reset-password',
  'accounts/password-changed',
  'accounts/invitation',
  'applications/received',
  'applications/withdrawn',
  'pairings/proposal-to-mentee',
  'pairings/proposal-to-mentor',
  'pairings/left-out',
  'pairings/other-side-accepted',
  'pairings/both-accepted',
  'pairings/declined',
  'pairings/reminder',
  'pairings/expired',
  'cycles/cancelled',
]);
export type MessageTemplate = z.infer<typeof MessageTemplate>;

export const MessageState = z.enum(['queued', 'sent', 'refused', 'dead', 'cancelled']);
export type MessageState = z.infer<typeof MessageState>;
export const MESSAGE_STATE_LABEL: Record<MessageState, string> = {
  queued: 'Waiting to be sent',
  sent: 'Sent',
  refused: 'Not sent: the recipient prefers not to get it',
  dead: 'Could not be delivered',
  cancelled: 'Cancelled',
};

export const MessageLine = z.object({
  id: z.uuid(),
  template: MessageTemplate,
  address: z.string(),
  recipientName: z.string().nullable(),
  state: MessageState,
  attempts: z.int(),
  fault: z.string().nullable(),
  createdAt: z.iso.datetime(),
  sentAt: z.iso.datetime().nullable(),
  /** Only with the local mailbox. */
  subject: z.string().nullable(),
});
export type MessageLine = z.infer<typeof MessageLine>;

export const MessagesQuery = z.object({
  search: z.string().trim().max(200).default(''),
  state: MessageState.optional(),
  template: MessageTemplate.optional(),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});
export type MessagesQuery = z.input<typeof MessagesQuery>;
export const MessagesPage = z.object({
  messages: z.array(MessageLine),
  total: z.int(),
  page: z.int(),
  pageSize: z.int(),
});
export type MessagesPage = z.infer<typeof MessagesPage>;

export const MessageParams = z.object({ messageId: z.uuid() });

/** A whole message as its reader would see it; exists only with the local mailbox. */
export const MailboxMessage = z.object({
  id: z.uuid(),
  sender: z.string(),
  recipient: z.string(),
  subject: z.string(),
  html: z.string(),
  text: z.string(),
  headers: z.record(z.string(), z.string()),
  receivedAt: z.iso.datetime(),
});
export type MailboxMessage = z.infer<typeof MailboxMessage>;
