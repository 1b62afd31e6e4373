/** Turns an outbox row into what its reader sees: MJML compiled once, then filled with escaped values. */
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import mjml2html from 'mjml';
import Mustache from 'mustache';
import type { MessageTemplate } from '../../../shared/messages/messages-contract';
import { tokenFor, type Settings } from '../platform';
import type { LinkRef, MessageData } from './post-message';

export interface RenderedMessage {
  subject: string;
  html: string;
  text: string;
}

interface CompiledTemplate {
  subject: string;
  html: string;
  text: string;
}

const compiled = new Map<string, Promise<CompiledTemplate>>();

/** Compiles a template: its MJML inside the common layout, and its text twin whose first line is the subject. */
function templateOf(root: string, template: MessageTemplate): Promise<CompiledTemplate> {
  const key = join(root, 'emails', template);
  const known = compiled.get(key);
  if (known) return known;
  const made = compile(root, template);
  compiled.set(key, made);
  made.catch(() => compiled.delete(key));
  return made;
}

async function compile(root: string, template: MessageTemplate): Promise<CompiledTemplate> {
  const folder = join(root, 'emails');
  const [layout, body, textLayout, twin] = await Promise.all([
    readFile(join(folder, 'layout.mjml'), 'utf8'),
    readFile(join(folder, `${template}.mjml`), 'utf8'),
    readFile(join(folder, 'layout.txt'), 'utf8'),
    readFile(join(folder, `${template}.txt`), 'utf8'),
  ]);
  const result = await Promise.resolve(
    mjml2html(
      layout.replace('<!-- body -->', () => body),
      { validationLevel: 'strict' },
    ),
  );
  const [first = '', ...rest] = twin.split('\n');
  const subject = /^Subject: (.+)$/.exec(first)?.[1];
  if (!subject) throw new Error(`emails/${template}.txt must begin with "Subject: …"`);
  return { subject, html: result.html, text: textLayout.replace('<!-- body -->', () => rest.join('\n').trim()) };
}

/** Fills a template. `data.links` names links by purpose and row; their tokens are made here and stored nowhere. */
export async function renderMessage(
  settings: Settings,
  template: MessageTemplate,
  data: MessageData,
): Promise<RenderedMessage> {
  const { subject, html, text } = await templateOf(settings.root, template);
  const view = { ...data, origin: settings.origin, links: linksOf(settings, data['links']) };
  const plain = (value: string): string => Mustache.render(value, view, {}, { escape: String });
  return {
    // A line break in a name must not start a new header.
    subject: plain(subject)
      .replace(/[\p{Cc}\u2028\u2029]+/gu, ' ')
      .trim(),
    html: Mustache.render(html, view),
    text:
      plain(text)
        .replace(/\n{3,}/g, '\n\n')
        .trim() + '\n',
  };
}

function linksOf(settings: Settings, links: unknown): Record<string, string> {
  const refs = Object.entries((links ?? {}) as Record<string, LinkRef>);
  return Object.fromEntries(
    refs.map(([name, ref]) => [
      name,
      settings.origin + ref.path.replace(':token', () => tokenFor(settings.sessionSecret, ref.purpose, ref.rowId)),
    ]),
  );
}
