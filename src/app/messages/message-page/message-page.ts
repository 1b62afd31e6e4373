import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import { DomSanitizer } from '@angular/platform-browser';
import { MomentPipe } from '../../core/moments';
import { PageHeader } from '../../ui/page-header/page-header';
import { MessagesClient } from '../messages-client';

/** One message of the local mailbox, as its reader would see it. */
@Component({
  selector: 'app-message-page',
  imports: [MatButton, MatButtonToggleModule, MomentPipe, PageHeader],
  templateUrl: './message-page.html',
  styleUrl: './message-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MessagePage {
  readonly messageId = input.required<string>();
  protected readonly message = inject(MessagesClient).mailboxMessage(this.messageId);
  private readonly sanitizer = inject(DomSanitizer);
  /** An address of ours, made of nothing but the message's id; the server sends it with a policy that runs nothing. */
  protected readonly page = computed(() =>
    this.sanitizer.bypassSecurityTrustResourceUrl(`/api/messages/${encodeURIComponent(this.messageId())}/mailbox/page`),
  );
  protected readonly view = signal<'html' | 'text'>('html');
  protected readonly headers = computed(() =>
    this.message.hasValue() ? Object.entries(this.message.value().headers) : [],
  );
  /** The text with its links made followable. */
  protected readonly textParts = computed(() =>
    this.message.hasValue()
      ? this.message
          .value()
          .text.split(/(https?:\/\/[^\s)]+)/)
          .map((text) => ({ text, link: /^https?:\/\//.test(text) }))
      : [],
  );
}
