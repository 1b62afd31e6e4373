/** What journeys share: signing in, the local mailbox, and a watch on the browser's console. */
import { type Browser, expect, type Page } from '@playwright/test';
import { readFileSync } from 'node:fs';

interface SignIn {
  role: 'coordinator' | 'organiser' | 'administrator' | 'mentor' | 'mentee';
  name: string;
  email: string;
  password: string;
}

export const SIGN_INS = JSON.parse(readFileSync('drizzle/seed/demo-sign-ins.json', 'utf8')) as SignIn[];
export const signInOf = (role: SignIn['role']): SignIn => SIGN_INS.find((each) => each.role === role)!;

export async function signIn(page: Page, { email, password }: Pick<SignIn, 'email' | 'password'>): Promise<void> {
  await page.goto('/accounts/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.includes('sign-in'));
}

export const signInAs = (page: Page, role: SignIn['role']): Promise<void> => signIn(page, signInOf(role));

/** A page of its own session, signed in. Faults in its console fail the journey at the end. */
export async function pageOf(browser: Browser, role?: SignIn['role']): Promise<{ page: Page; faults: string[] }> {
  const page = await (await browser.newContext()).newPage();
  const faults = watchConsole(page);
  if (role) await signInAs(page, role);
  return { page, faults };
}

/** Errors in the console, and pages that break; refusals (4xx) that a journey asks for on purpose are not faults. */
export function watchConsole(page: Page): string[] {
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error' && !/Failed to load resource/.test(message.text())) faults.push(message.text());
  });
  page.on('response', (response) => {
    if (response.status() >= 500) faults.push(`${response.status()} ${response.url()}`);
  });
  return faults;
}

export interface Mail {
  subject: string;
  html: string;
  text: string;
}

/** The newest message to an address that fits, as the administrator finds it in the local mailbox. */
export async function mailTo(admin: Page, address: string, subject: RegExp, containing = ''): Promise<Mail> {
  let found: Mail | undefined;
  await expect
    .poll(async () => (found = await findMail(admin, address, subject, containing)) !== undefined, {
      timeout: 60_000,
      intervals: [500],
    })
    .toBe(true);
  return found!;
}

async function findMail(admin: Page, address: string, subject: RegExp, containing: string): Promise<Mail | undefined> {
  const list = await admin.request.get('/api/messages', { params: { search: address } });
  const { messages } = (await list.json()) as { messages: { id: string; subject: string | null; address: string }[] };
  for (const line of messages.filter((each) => each.address === address && subject.test(each.subject ?? ''))) {
    const mail = (await (await admin.request.get(`/api/messages/${line.id}/mailbox`)).json()) as Mail;
    if (mail.text.includes(containing)) return mail;
  }
  return undefined;
}

/** The path of the first link of a mail whose address contains the text. */
export function linkIn(mail: Mail, containing: string): string {
  const link = [...mail.text.matchAll(/https?:\/\/\S+/g)]
    .map(([address]) => address)
    .find((each) => each.includes(containing));
  if (!link) throw new Error(`no link with ${containing} in "${mail.subject}"`);
  return new URL(link).pathname;
}

export const daysFromNow = (days: number): string =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);
