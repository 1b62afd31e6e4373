import { describe, expect, it } from 'vitest';
import { MessageTemplate } from '../shared/messages/messages-contract';
import { renderMessage } from '../src/server/messages/render-message';
import { readSettings } from '../src/server/platform/settings';

const settings = readSettings({
  DATABASE_URL: 'postgresql://nobody@127.0.0.1/none',
  SESSION_SECRET: 'a secret that only these tests know, long enough',
  APP_ORIGIN: 'https://mentoring.ellmark.example',
});

const link = (path: string) => ({ path, purpose: 'test', rowId: 'row' });
const data = {
  name: 'Siobhán <b>Keely</b> & co',
  associationName: 'Ellmark Institute of Surveyors',
  contactEmail: 'mentoring@ellmark.example',
  cycleName: 'Winter 2026–27',
  hours: 48,
  inviterName: 'Oona Rask',
  side: 'mentee',
  places: 2,
  isMentor: true,
  waitingList: false,
  byCoordinator: false,
  closesOn: 'Tuesday 15 December 2026',
  partnerName: 'Ruth Calloway',
  partnerHeadline: 'Track and tunnel surveys',
  partnerEmployer: 'Ellmark Rail',
  partnerAreas: 'Laser scanning, Monitoring',
  partnerWords: 'I ask more than I tell.',
  partnerEmail: 'ruth.calloway@ellmarkrail.example',
  partnerTown: 'Greyford',
  partnerTimeZone: 'Europe/Copenhagen',
  shared: [{ text: 'Common language: English' }],
  times: [{ text: 'Monday morning' }],
  meeting: 'in person, about 12 km apart, or remotely',
  isMentee: true,
  answered: true,
  answersDue: 'Tuesday 15 December 2026, end of the day, Europe/Copenhagen',
  reason: 'This time 34 people could be served by mentors with 26 places in all.',
  waitingListNote: true,
  links: Object.fromEntries(
    ['confirm', 'reset', 'invitation', 'application', 'proposal', 'pairing'].map((name) => [
      name,
      link(`/${name}/:token`),
    ]),
  ),
};
const linksOf = (html: string): string[] =>
  [...html.matchAll(/href="(https:[^"]+)"/g)].map((match) => match[1]!.replaceAll('&#x2F;', '/'));

describe.each(MessageTemplate.options)('the message %s', (template) => {
  it('renders whole, in HTML and in text', async () => {
    const { subject, html, text } = await renderMessage(settings, template, data);
    expect(subject.length).toBeGreaterThan(5);
    for (const part of [subject, html, text]) expect(part).not.toMatch(/\{\{|undefined|\[object/);
    expect(text).toContain(data.name);
    expect(html).toContain('Siobhán &lt;b&gt;Keely');
    expect(html).not.toContain('<b>Keely');
  });

  it('has every link of its HTML in its text', async () => {
    const { html, text } = await renderMessage(settings, template, data);
    for (const address of linksOf(html)) expect(text).toContain(address.replaceAll('&#x3D;', '='));
  });

  it('holds together where optional values are absent', async () => {
    const bare = { name: data.name, associationName: data.associationName, links: data.links };
    const { html, text } = await renderMessage(settings, template, bare);
    expect(html + text).not.toMatch(/\{\{|undefined|mailto:"/);
  });
});

it('never lets a line break of a name into the subject', async () => {
  const { subject } = await renderMessage(settings, 'pairings/both-accepted', {
    ...data,
    partnerName: 'Ruth\r\nBcc: all@test.example',
  });
  expect(subject).not.toMatch(/[\r\n]/);
});
