import { type Browser, expect, test } from '@playwright/test';
import { linkIn, mailTo, pageOf, signInAs, signInOf } from './support';

/** The whole job on the demo's cycle in matching: run, read the plan, publish, answer, be introduced. */
test.describe.configure({ mode: 'serial' });

const CYCLE = 'Winter 2026–27';

async function openCycle(browser: Browser) {
  const found = await pageOf(browser, 'coordinator');
  await found.page.goto('/cycles');
  await found.page.getByRole('link', { name: CYCLE }).click();
  await expect(found.page.getByRole('heading', { name: CYCLE })).toBeVisible();
  return found;
}

test('a coordinator runs the matching, reads the plan and asks what if', async ({ browser }) => {
  const { page, faults } = await openCycle(browser);
  await page.getByRole('link', { name: 'Runs and plan' }).click();
  await page.getByRole('button', { name: 'Start a run' }).click();
  await page.getByRole('link', { name: 'Plan of run 1' }).click();
  await expect(page.getByRole('heading', { name: 'Plan of run 1' })).toBeVisible();
  await expect(page.getByText('of 156 mentees paired')).toBeVisible();
  await expect(page.getByText('Proof checked')).toBeVisible();
  await expect(page.getByText('145', { exact: true }).first()).toBeVisible();

  // One mentee: partner, reasons, alternatives with their price.
  await page.getByLabel('Find a person, area or employer').fill('amara');
  await page.getByRole('button', { name: 'Amara Nwosu' }).click();
  const inspector = page.getByRole('complementary', { name: 'One mentee in detail' });
  await expect(inspector.getByRole('heading', { name: 'Amara Nwosu with Ruth Calloway' })).toBeVisible();
  await expect(inspector.getByText('Named by the mentee as first wish')).toBeVisible();
  await expect(inspector.getByText(/plan −|no loss|fewer paired/).first()).toBeVisible();

  // Who is left out, and why.
  await page.getByRole('link', { name: /^Shortages/ }).click();
  await expect(page.getByRole('heading', { name: /Shortage 1: Hydrographic/ })).toBeVisible();
  await expect(page.getByText('8 too few').first()).toBeVisible();
  await expect(page.getByText('Recruit a mentor for Hydrographic')).toBeVisible();

  // The proof, checked by this browser.
  await page.getByRole('link', { name: 'Record and proof' }).click();
  await page.getByRole('button', { name: 'Check the proof here' }).click();
  await expect(page.getByText(/Checked in this browser/)).toBeVisible();
  expect(faults).toEqual([]);
});

test('a lock is kept by the next run, and two plans can be compared', async ({ browser }) => {
  const { page, faults } = await openCycle(browser);
  await page.getByRole('link', { name: 'Runs and plan' }).click();
  await page.getByRole('link', { name: 'Plan of run 1' }).click();
  await page.getByLabel('Find a person, area or employer').fill('amara');
  await page.getByRole('button', { name: 'Amara Nwosu' }).click();
  await page.getByLabel('Note for a lock or a bar').fill('Both wish for it');
  await page.getByRole('button', { name: /^Lock/ }).first().click();
  await expect(page.getByText('Locked. The next run keeps this.')).toBeVisible();
  await page.getByRole('button', { name: 'Run again' }).click();
  await page.getByRole('link', { name: 'Plan of run 2' }).click();
  await page.getByLabel('Find a person, area or employer').fill('amara');
  await expect(page.getByRole('row', { name: /Amara Nwosu/ }).getByText('locked')).toBeVisible();
  await page.getByRole('link', { name: /Runs & plan/ }).click();
  await page.getByRole('link', { name: 'Compare the last two' }).click();
  await expect(page.getByRole('heading', { name: 'Run 1 and run 2' })).toBeVisible();
  await expect(page.getByText('Locks or bars changed')).toBeVisible();
  expect(faults).toEqual([]);
});

test('rules show their effect while they are changed, and bad input its sentence', async ({ browser }) => {
  const { page, faults } = await openCycle(browser);
  await page.getByRole('link', { name: /Rules & criteria/ }).click();
  await expect(page.getByText('145 of 156 mentees')).toBeVisible();
  await page.getByRole('switch', { name: 'Sought practice areas offered' }).click();
  await expect(page.getByText('148 of 156 mentees')).toBeVisible();
  await page.getByLabel('In person only within').fill('0');
  await expect(page.getByText('Between 1 and 1000 kilometres')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Save' })).toBeDisabled();
  await page.getByRole('button', { name: 'Undo changes' }).click();
  await expect(page.getByText('145 of 156 mentees')).toBeVisible();
  expect(faults).toEqual([]);
});

test('publishing sends proposals and messages together', async ({ browser }) => {
  const { page, faults } = await openCycle(browser);
  await page.getByRole('link', { name: 'Runs and plan' }).click();
  await page.getByRole('link', { name: 'Plan of run 2' }).click();
  await page.getByRole('link', { name: 'Review and publish' }).click();
  await expect(page.getByText('Round 1: 145 proposals, 301 messages')).toBeVisible();
  await page.getByRole('button', { name: 'Publish' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Send 301 messages' }).click();
  await expect(page.getByRole('heading', { name: 'Responses' })).toBeVisible();
  await expect(page.getByText('wait for answers')).toBeVisible();
  expect(faults).toEqual([]);
});

test('the mentee accepts at home, the mentor by the link in the e-mail, and both are introduced', async ({
  browser,
}) => {
  const admin = await pageOf(browser, 'administrator');
  const mentee = await pageOf(browser, 'mentee');
  await expect(mentee.page.getByRole('heading', { name: 'A pairing for you' })).toBeVisible();
  await mentee.page.getByRole('link', { name: 'Read and answer' }).click();
  await expect(mentee.page.getByText('ruth.calloway@ellmarkrail.example')).toHaveCount(0);
  await mentee.page.getByRole('button', { name: 'Accept' }).click();
  await expect(mentee.page.getByText(/You have accepted\. We wait for Ruth Calloway/)).toBeVisible();

  const ruth = signInOf('mentor');
  const mail = await mailTo(admin.page, ruth.email, /a mentee for you/, 'Amara Nwosu');
  const visitor = await pageOf(browser);
  await visitor.page.goto(linkIn(mail, '/pairings/proposal/'));
  await expect(visitor.page.getByRole('heading', { name: 'A pairing for you' })).toBeVisible();
  await expect(visitor.page.getByText('Amara Nwosu has accepted and waits for your answer.')).toBeVisible();
  await visitor.page.reload();
  await visitor.page.getByRole('button', { name: 'Accept' }).click();
  await expect(visitor.page.getByText(/You are a pair/)).toBeVisible();
  await expect(visitor.page.getByRole('link', { name: signInOf('mentee').email })).toBeVisible();

  const introduction = await mailTo(admin.page, signInOf('mentee').email, /are a pair/);
  expect(introduction.text).toContain(ruth.email);
  await mentee.page.reload();
  await expect(mentee.page.getByRole('link', { name: ruth.email })).toBeVisible();
  expect([...admin.faults, ...mentee.faults, ...visitor.faults]).toEqual([]);
});

test('a decline needs a reason, which only coordinators read', async ({ browser }) => {
  const admin = await pageOf(browser, 'administrator');
  const list = await admin.page.request.get('/api/messages', { params: { search: 'a mentee for you' } });
  const { messages } = (await list.json()) as { messages: { id: string; address: string }[] };
  const other = messages.find((message) => message.address !== signInOf('mentor').email)!;
  const mail = await mailTo(admin.page, other.address, /a mentee for you/);
  const { page, faults } = await pageOf(browser);
  await page.goto(linkIn(mail, '/pairings/proposal/'));
  await page.getByRole('button', { name: 'Decline…' }).click();
  await page.getByRole('button', { name: 'Decline', exact: true }).click();
  await expect(page.getByText('A short reason helps the coordinators')).toBeVisible();
  await page.getByLabel('Why does it not suit?').fill('I move abroad in January.');
  await page.getByRole('button', { name: 'Decline', exact: true }).click();
  await expect(page.getByText('Declined').first()).toBeVisible();
  const coordinator = await openCycle(browser);
  await coordinator.page
    .getByRole('link', { name: /Responses/ })
    .first()
    .click();
  await expect(coordinator.page.getByText('I move abroad in January.')).toBeVisible();
  expect(faults).toEqual([]);
});

test('an expired or wrong link, a page without right and an unknown page each say so', async ({ page }) => {
  await page.goto('/pairings/proposal/not-a-real-link');
  await expect(page.getByRole('heading', { name: 'This link does not lead to a proposal' })).toBeVisible();
  await page.goto('/accounts/confirm/not-a-real-link');
  await expect(page.getByRole('heading').first()).toBeVisible();
  await page.goto('/nothing/here');
  await expect(page.getByRole('heading', { name: 'This page does not exist' })).toBeVisible();
  await signInAs(page, 'mentee');
  await page.goto('/cycles');
  await expect(page.getByRole('heading', { name: 'Your role does not include this page' })).toBeVisible();
});
