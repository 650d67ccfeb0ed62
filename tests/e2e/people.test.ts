import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openBrowser, type Screen, screens, Visitor } from '../support/browser.ts';
import { newFolder, type RunningApp, removeFolder, startApp } from '../support/running-app.ts';

const folder = newFolder();
let app: RunningApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp(folder);
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
  removeFolder(folder);
});

describe.each(screens)('an administrator, on a $name screen', (screen: Screen) => {
  const name = `Rowan Hale ${screen.name}`;
  const email = `rowan.${screen.name}@larkmoor.example`;
  const password = 'a new password of some length';

  test('invites a person, and hears beside the field what is wrong', async () => {
    const admin = await Visitor.arrive(browser, app, screen, 'administrator');
    const { page, firm } = admin;
    await admin.open(`${firm}/firm/members`);
    await admin.sees('People');
    await page.getByRole('button', { name: 'Invite a person' }).click();
    await page.getByLabel('Name', { exact: true }).fill(name);
    await page.getByLabel('E-mail address').fill('not an address');
    await page.getByRole('button', { name: 'Send the invitation' }).click();
    await page.getByText('Choose at least one role.').waitFor();
    await page.getByRole('checkbox', { name: /^Engineer/i }).check();
    await page.getByRole('button', { name: 'Send the invitation' }).click();
    await page.getByText('An e-mail address looks like name@firm.example.').waitFor();
    expect(await page.getByLabel('E-mail address').inputValue()).toBe('not an address');
    await admin.sees('People');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByRole('button', { name: 'Send the invitation' }).click();
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.getByText(email).first().waitFor();
    await admin.leave();
  });

  test('whose invitation comes by mail, makes an account, and lets them in as what they were invited for', async () => {
    const invited = await Visitor.arrive(browser, app, screen, null);
    const { page } = invited;
    await invited.open('/demonstration/mail');
    const mail = page.getByText(/\/invitation\//).first();
    await page.getByText(email).first().waitFor();
    const address = /http\S+\/invitation\/\S+/.exec((await mail.textContent())!)![0];
    await page.goto(address);
    await invited.sees(/^Join /);
    await page.getByText(email).waitFor();
    const choose = page.getByLabel('Choose a password', { exact: true });
    await choose.fill('short');
    await page.getByRole('button', { name: /^Join / }).click();
    await page.getByText('A password has at least 12 characters.').waitFor();
    await choose.fill(password);
    await page.getByRole('button', { name: /^Join / }).click();
    await page.waitForURL(/\/[0-9a-f-]{36}\/desk/);
    await invited.sees('Desk');
    await page.getByRole('link', { name: 'Site' }).waitFor();
    expect(await page.getByRole('link', { name: 'Checking' }).count()).toBe(0);
    await page.goto(address);
    await page.getByText('This invitation has been used or is too old.').waitFor();
    await invited.leave();
  });

  test('sees who joined, and that the trail of all this is whole', async () => {
    const admin = await Visitor.arrive(browser, app, screen, 'administrator');
    const { page, firm } = admin;
    await admin.open(`${firm}/firm/members`);
    await page.getByText('accepted').nth(1).waitFor();
    await admin.open(`${firm}/firm/audit`);
    await admin.sees('Audit trail');
    await page.getByRole('button', { name: 'Verify the chain' }).click();
    await page.getByText('The chain is intact').waitFor();
    await admin.sees('Audit trail');
    await admin.open(`${firm}/firm`);
    await admin.sees('Firm');
    await admin.open(`${firm}/clients`);
    await admin.sees('Clients');
    await admin.open('/account');
    await admin.sees('Petra Vangelis');
    await admin.leave();
  });
});
