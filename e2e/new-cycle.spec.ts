import { expect, test } from '@playwright/test';
import { daysFromNow, pageOf } from './support';

/** A cycle from nothing, with applicants from a list that the demo does not know. */
test('a coordinator makes a cycle, imports 400 applicants and runs it', async ({ browser }) => {
  const { page, faults } = await pageOf(browser, 'coordinator');
  await page.goto('/cycles');
  await page.getByRole('link', { name: 'New cycle' }).click();
  await page.getByRole('button', { name: 'Make the cycle' }).click();
  await expect(page.getByText('At least 3 characters').first()).toBeVisible();
  await page.getByRole('textbox', { name: 'Name' }).fill('Autumn trial');
  await page.getByLabel('What applicants agree to').fill('I agree that coordinators use my profile to find a partner.');
  const dates = {
    'Applications open on': -3,
    'Applications close at the end of': 20,
    'Answers are due at the end of': 10,
    'Pairs start on': 40,
    'Half-way check-in on': 90,
    'The cycle ends on': 160,
  };
  for (const [label, days] of Object.entries(dates)) await page.getByLabel(label).fill(daysFromNow(days));
  await page.getByRole('button', { name: 'Make the cycle' }).click();
  await expect(page.getByText('Answers are due on or after the day applications close').first()).toBeVisible();
  await page.getByLabel('Answers are due at the end of').fill(daysFromNow(34));
  await page.getByRole('button', { name: 'Make the cycle' }).click();
  await expect(page.getByRole('heading', { name: 'Autumn trial' })).toBeVisible();
  await page.getByRole('button', { name: 'Open for applications' }).click();
  await expect(page.getByRole('button', { name: 'Close applications' })).toBeVisible();

  await page
    .getByRole('link', { name: /Applications/ })
    .nth(1)
    .click();
  await page.getByRole('link', { name: 'Import a list' }).click();
  await page.locator('input[type=file]').setInputFiles('tests/fixtures/applicants-400.csv');
  await page.getByRole('button', { name: /^Import \d+ / }).click();
  await expect(page.getByRole('link', { name: 'See the applicants' })).toBeVisible({ timeout: 60_000 });

  await page.goto('/cycles');
  await page.getByRole('link', { name: 'Autumn trial' }).click();
  await page.getByRole('button', { name: 'Close applications' }).click();
  await page.getByRole('button', { name: 'Start matching' }).click();
  await page.getByRole('link', { name: 'Runs and plan' }).click();
  await page.getByRole('button', { name: 'Start a run' }).click();
  await page.getByRole('link', { name: 'Plan of run 1' }).click();
  await expect(page.getByText('Proof checked')).toBeVisible();
  expect(faults).toEqual([]);
});

test('a list with faults imports nothing and names each line', async ({ browser }) => {
  const { page } = await pageOf(browser, 'coordinator');
  await page.goto('/cycles');
  await page.getByRole('link', { name: 'Summer 2027' }).click();
  const before = await page
    .getByText(/\d+ in$/)
    .first()
    .innerText();
  await page
    .getByRole('link', { name: /Applications/ })
    .nth(1)
    .click();
  await page.getByRole('link', { name: 'Import a list' }).click();
  const rows = ['Name,E-mail,Side,Places', 'Ada Lund,ada.lund@test.example,mentee,', 'Bo Berg,not-an-address,mentor,9'];
  await page.locator('input[type=file]').setInputFiles({
    name: 'faulty.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from(rows.join('\r\n')),
  });
  await expect(page.getByText('not-an-address').first()).toBeVisible();
  await expect(page.getByRole('button', { name: /^Import \d+ / })).toHaveCount(0);
  await page.goto('/cycles');
  await page.getByRole('link', { name: 'Summer 2027' }).click();
  await expect(page.getByText(/\d+ in$/).first()).toHaveText(before);
});
