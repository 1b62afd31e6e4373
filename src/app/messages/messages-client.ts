import { httpResource } from '@angular/common/http';
import { Injectable, type Signal } from '@angular/core';
import { MailboxMessage, MessagesPage } from '../../../shared/messages/messages-contract';

/** Every HTTP call of messages. */
@Injectable({ providedIn: 'root' })
export class MessagesClient {
  messages(query: Signal<{ search: string; state: string; page: number }>) {
    return httpResource(
      () => {
        const { search, state, page } = query();
        return { url: '/api/messages', params: { search, page, ...(state ? { state } : {}) } };
      },
      { parse: MessagesPage.parse },
    );
  }

  mailboxMessage(messageId: Signal<string>) {
    return httpResource(() => `/api/messages/${messageId()}/mailbox`, { parse: MailboxMessage.parse });
  }
}
