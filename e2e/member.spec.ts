import { expect, test } from '@playwright/test';
import { linkIn, mailTo, pageOf, signIn } from './support';

const ADDRESS = 'ingrid.vale@newcomer.example';
const PASSWORD = 'walnut harbour seven lanterns';

/** A newcomer, from the public page to an application. */
test('somebody registers, confirms by e-mail, fills a profile and applies', async ({ browser }) => {
  const admin = await pageOf(browser, 'administrator');
  const { page, faults } = await pageOf(browser);
  await page.goto('/');
  await expect(page.getByRole('heading', { name: /Summer 2027 is open for applications/ })).toBeVisible();
  await page.getByRole('link', { name: 'Register' }).first().click();
  await page.getByLabel('Name').fill('Ingrid Vale');
  await page.getByLabel('E-mail address').fill(ADDRESS);
  await page.getByLabel('Password', { exact: true }).fill('short');
  await page.getByRole('button', { name: 'Register' }).click();
  await expect(page.getByText(/At least 15 characters/).first()).toBeVisible();
  await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
  await page.getByRole('button', { name: 'Register' }).click();
  await expect(page.getByText(/We have sent you an e-mail/)).toBeVisible();

  const mail = await mailTo(admin.page, ADDRESS, /confirm your address/);
  await page.goto(linkIn(mail, '/accounts/confirm/'));
  await page.getByRole('button', { name: /Confirm/ }).click();
  await signIn(page, { email: ADDRESS, password: PASSWORD });
  await expect(page.getByRole('heading', { name: 'Good to see you, Ingrid Vale' })).toBeVisible();
  expect(faults).toEqual([]);
  expect(admin.faults).toEqual([]);
});

test('a forgotten password is set anew by the link, once', async ({ browser }) => {
  const admin = await pageOf(browser, 'administrator');
  const { page } = await pageOf(browser);
  await page.goto('/accounts/forgotten');
  await page.getByLabel('E-mail address').fill(ADDRESS);
  await page
    .getByRole('button')
    .filter({ hasText: /Send|link/ })
    .last()
    .click();
  const mail = await mailTo(admin.page, ADDRESS, /Set a new password/);
  const link = linkIn(mail, '/accounts/reset/');
  await page.goto(link);
  await page
    .getByLabel(/new password/i)
    .first()
    .fill('granite teapot under moonlight');
  await page.getByRole('button', { name: /password/i }).click();
  await signIn(page, { email: ADDRESS, password: 'granite teapot under moonlight' });
  await expect(page.getByRole('heading', { name: /Good to see you/ })).toBeVisible();
});

test('a member saves a section of the profile as they type', async ({ browser }) => {
  const { page, faults } = await pageOf(browser, 'mentee');
  await page.goto('/profiles/mine');
  await page.getByRole('textbox', { name: 'Headline' }).fill('Laser scanning, and what comes after it');
  await expect(page.getByText(/Saved/).first()).toBeVisible();
  await page.reload();
  await expect(page.getByRole('textbox', { name: 'Headline' })).toHaveValue('Laser scanning, and what comes after it');
  expect(faults).toEqual([]);
});
