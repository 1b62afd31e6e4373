/** The way out: a mail server, or the local mailbox where none is set. */
import nodemailer from 'nodemailer';
import type { Context, Settings } from '../platform';
import { insertMailboxMessage } from './messages-queries';
import type { RenderedMessage } from './render-message';

export interface Mail extends RenderedMessage {
  rowId: string;
  recipient: string;
}

/** Hands one mail over; rejects where the server refuses it. `tx` holds the outbox row. */
export type MailTransport = (tx: Context, mail: Mail) => Promise<void>;

/** The same row always has the same Message-ID, so that a repetition after a crash can be recognised. */
const messageId = (settings: Settings, mail: Mail): string => `<${mail.rowId}@${new URL(settings.origin).hostname}>`;

const headersOf = (): Record<string, string> => ({ 'Auto-Submitted': 'auto-generated' }); // RFC 3834, section 5

export function createMailTransport(settings: Settings): MailTransport {
  return settings.smtpUrl ? smtpTransport(settings, settings.smtpUrl) : localMailbox(settings);
}

function smtpTransport(settings: Settings, url: string): MailTransport {
  const transporter = nodemailer.createTransport(url);
  return async (_tx, mail) => {
    await transporter.sendMail({
      from: settings.mailFrom,
      to: { name: '', address: mail.recipient },
      subject: mail.subject,
      text: mail.text,
      html: mail.html,
      messageId: messageId(settings, mail),
      headers: headersOf(),
    });
  };
}

function localMailbox(settings: Settings): MailTransport {
  return (tx, mail) =>
    insertMailboxMessage(tx.db, {
      messageId: mail.rowId,
      sender: settings.mailFrom,
      recipient: mail.recipient,
      subject: mail.subject,
      html: mail.html,
      text: mail.text,
      headers: { 'Message-ID': messageId(settings, mail), ...headersOf() },
      receivedAt: tx.now(),
    });
}
