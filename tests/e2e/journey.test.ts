import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openBrowser, type Screen, screens, Visitor } from '../support/browser.ts';
import { newFolder, type RunningApp, removeFolder, startApp } from '../support/running-app.ts';
import {
  addLike,
  addStructure,
  answerVisit,
  download,
  enterPeaks,
  fillCable,
  fillCampaign,
  frequencies,
  openCable,
  saveEntry,
  submit,
} from './journey-steps.ts';

/** Two ways to hold it: a phone and a wide screen, each with a structure of its own, against one real server. */
const folder = newFolder();
let app: RunningApp;
let browser: Awaited<ReturnType<typeof openBrowser>>;

beforeAll(async () => {
  app = await startApp(folder);
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  const code = await app?.stop();
  removeFolder(folder);
  expect(code, 'npm start ends cleanly on Ctrl-C').toBe(0);
});

describe.each(screens)('from the cable to the verified PDF, on a $name screen', (screen: Screen) => {
  const bridge = `Alder Lane Footbridge (${screen.name})`;
  const structureId = randomUUID();
  let campaign = '';
  let revision = '';
  let number = '';

  test('an engineer adds a cable from the strand catalogue', async () => {
    const engineer = await Visitor.arrive(browser, app, screen, 'engineer');
    const { page, firm } = engineer;
    await engineer.sees('Desk');
    await addStructure(engineer, structureId, bridge);
    await engineer.open(`${firm}/structures`);
    await engineer.sees('Structures');
    await page.getByRole('link', { name: bridge }).first().click();
    await engineer.sees(bridge);
    await page.getByRole('link', { name: 'Add a cable' }).first().click();
    await page.getByRole('heading', { name: 'Add a cable' }).waitFor();
    await fillCable(page, 'A-01');
    // Sheath and grout are asked for: blank is an error that says so, and what was typed stays.
    await page.getByRole('button', { name: 'Add the cable' }).click();
    await page.getByText('The mass of the sheath is missing.').waitFor();
    expect(await page.getByLabel('Our reference').inputValue()).toBe('A-01');
    await engineer.sees('Add a cable');
    await page.getByLabel('Mass of the sheath').fill('2,5');
    await page.getByLabel('Mass of the grout').fill('0');
    await page.getByRole('button', { name: 'Add the cable' }).click();
    await engineer.sees('Cable A-01');
    await page.getByText('38.300').first().waitFor();
    await addLike(engineer, structureId, 'A-02');
    await engineer.leave();
  });

  test('opens a campaign and enters peaks, with the tension beside them at once', async () => {
    const engineer = await Visitor.arrive(browser, app, screen, 'engineer');
    const { page, firm } = engineer;
    await engineer.open(`${firm}/site/new?structure=${structureId}`);
    await fillCampaign(page);
    await page.getByRole('button', { name: 'Open the campaign' }).click();
    await engineer.sees('First survey');
    campaign = new URL(page.url()).pathname;
    for (const [index, cable] of ['A-01', 'A-02'].entries()) {
      await page
        .getByRole('link', { name: new RegExp(cable) })
        .first()
        .click();
      await page.getByRole('heading', { name: `Cable ${cable}` }).waitFor();
      await enterPeaks(
        page,
        frequencies.map((frequency) => frequency * (1 + 0.02 * index)),
      );
      await answerVisit(page);
      // Computed on the device while typing.
      await page.getByText(/±/).first().waitFor();
      await engineer.sees(`Cable ${cable}`);
      await saveEntry(page);
      await engineer.open(campaign);
      await page.getByRole('heading', { name: 'First survey' }).waitFor();
    }
    await page.getByText('2 of 2 measured').first().waitFor();
    await page.getByRole('button', { name: 'Save estimates' }).click();
    await page.getByText('Every estimate is saved.').waitFor();
    await engineer.leave();
  });

  test('writes the report, signs as preparer and submits revision A', async () => {
    const engineer = await Visitor.arrive(browser, app, screen, 'engineer');
    const { page } = engineer;
    await engineer.open(campaign);
    await page.getByRole('link', { name: 'Start a report' }).click();
    await engineer.sees('Start a report');
    await page.getByRole('button', { name: 'Start the report' }).click();
    await page.getByRole('heading', { name: /, revision A$/ }).waitFor();
    revision = new URL(page.url()).pathname.split('/').at(-1)!;
    number = (await page.getByRole('heading', { level: 1 }).textContent())!.split(',')[0]!;
    for (const name of ['Scope', 'Conditions', 'Deviations', 'Conclusion'])
      await page.getByLabel(name, { exact: true }).fill(`${name} of the survey.`);
    await page.getByRole('button', { name: 'Save the texts' }).click();
    await page.getByText('Saved.', { exact: true }).waitFor();
    await submit(page);
    await page.getByText('in check', { exact: true }).first().waitFor();
    await engineer.sees(/, revision A$/);
    await engineer.leave();
  });

  test('a checker ticks, writes a remark and returns it', async () => {
    const checker = await Visitor.arrive(browser, app, screen, 'checker');
    const { page, firm } = checker;
    await checker.sees('Desk');
    await checker.open(`${firm}/checking/${revision}`);
    await checker.sees('Revision A, in check');
    await openCable(page, 'A-01');
    await page.getByRole('button', { name: 'Recompute' }).click();
    await page.getByText(/the same\.$/).waitFor();
    await page.getByRole('button', { name: 'Tick as looked at' }).click();
    await page.getByRole('button', { name: 'Take the tick back' }).waitFor();
    await page.getByLabel('New remark').fill('Is the last peak of A-01 mode 6 or mode 7?');
    await page.getByRole('button', { name: 'Write the remark' }).click();
    await page.getByText('1 remark open').first().waitFor();
    await checker.sees('Revision A, in check');
    await page.getByRole('button', { name: 'Return with remarks' }).click();
    await page.getByLabel('Why it is returned').fill('One mode number to look at.');
    await page.getByRole('button', { name: 'Return it to the author' }).click();
    await page.getByRole('heading', { name: 'Revision A, returned' }).waitFor();
    await checker.leave();
  });

  test('the engineer answers, corrects a mode number and submits again', async () => {
    const engineer = await Visitor.arrive(browser, app, screen, 'engineer');
    const { page, firm } = engineer;
    await engineer.open(`${firm}/reports/${revision}`);
    await page.getByText('One mode number to look at.').waitFor();
    await page.getByLabel('Answer').fill('It is mode 7: corrected.');
    await page.getByRole('button', { name: 'Save the answer' }).click();
    await page.getByText(/^Answer by/).waitFor();
    await engineer.open(campaign);
    await page.getByRole('link', { name: /A-01/ }).first().click();
    await page.getByRole('heading', { name: 'Cable A-01' }).waitFor();
    await page.getByRole('button', { name: /^Mode 6: number/ }).click();
    await page.getByLabel('Mode number').fill('7');
    await page.getByLabel('Frequency of mode 7').fill(String(frequencies[6]!.toFixed(3)));
    await saveEntry(page);
    await engineer.open(campaign);
    await page.getByRole('button', { name: 'Save estimates' }).click();
    await page.getByText('Every estimate is saved.').waitFor();
    await engineer.open(`${firm}/reports/${revision}`);
    await submit(page);
    await page.getByText('in check', { exact: true }).first().waitFor();
    await engineer.leave();
  });

  test('the checker closes the remark, approves and signs', async () => {
    const checker = await Visitor.arrive(browser, app, screen, 'checker');
    const { page, firm } = checker;
    await checker.open(`${firm}/checking/${revision}`);
    await page.getByRole('button', { name: 'Close the remark' }).click();
    await page.getByRole('button', { name: 'Open it again' }).waitFor();
    for (const cable of ['A-01', 'A-02']) {
      await openCable(page, cable);
      await page.getByRole('heading', { name: `Cable ${cable}` }).waitFor();
      await page.getByRole('button', { name: 'Tick as looked at' }).click();
      await page.getByRole('button', { name: 'Take the tick back' }).waitFor();
    }
    await page.getByRole('button', { name: 'Approve and sign' }).click();
    await page.getByRole('checkbox', { name: 'This is what I sign' }).check();
    await page.getByLabel('Your password', { exact: true }).fill('not the password');
    await page.getByRole('button', { name: 'Sign: checked and approved' }).click();
    await page.getByText('This is not your password.', { exact: false }).first().waitFor();
    await page.getByLabel('Your password', { exact: true }).fill(checker.password);
    await page.getByRole('button', { name: 'Sign: checked and approved' }).click();
    await page.getByRole('heading', { name: 'Revision A, approved' }).waitFor();
    await checker.leave();
  });

  test('the engineer issues it', async () => {
    const engineer = await Visitor.arrive(browser, app, screen, 'engineer');
    const { page, firm } = engineer;
    await engineer.open(`${firm}/reports/${revision}`);
    await page.getByRole('button', { name: /^Issue to/ }).waitFor();
    await page.getByText('The PDF is being rendered').waitFor({ state: 'detached', timeout: 60_000 });
    await page.getByRole('button', { name: /^Issue to/ }).click();
    await page.getByLabel('Your password', { exact: true }).fill(engineer.password);
    await page.getByRole('button', { name: 'Sign the PDF and issue it' }).click();
    await page.getByText('issued', { exact: true }).first().waitFor();
    await engineer.sees(/, revision A$/);
    await engineer.leave();
  });

  test('the client is told by mail, sees only what was addressed to them, and downloads PDF and CSV', async () => {
    const client = await Visitor.arrive(browser, app, screen, 'client');
    const { page, firm } = client;
    await client.sees('Issued');
    expect(await page.getByRole('link', { name: 'Structures' }).count()).toBe(0);
    await page
      .getByRole('link', { name: new RegExp(number) })
      .first()
      .click();
    await client.sees(`${number}, revision A`);
    const csv = await download(page, 'Results as CSV');
    expect(csv.toString()).toContain('A-01');
    const pdf = await download(page, /Signed PDF/);
    expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
    const refused = await page.evaluate(async (path) => (await fetch(path)).status, `/api/v1/firms${firm}/structures`);
    expect(refused).toBe(403);
    await client.open('/demonstration/mail');
    await client.sees('Mail of the demonstration');
    await page.getByText(new RegExp(number)).first().waitFor();
    await client.leave();
  });

  test('anyone sees on the verification page that the PDF is genuine and current, and that a changed one is not', async () => {
    const client = await Visitor.arrive(browser, app, screen, 'client');
    await client.open(`${client.firm}/issued/${revision}`);
    const pdf = await download(client.page, /Signed PDF/);
    await client.leave();
    const anyone = await Visitor.arrive(browser, app, screen, null);
    const { page } = anyone;
    await anyone.open('/verify');
    await anyone.sees('Verify a report');
    await page
      .getByLabel('Drop the PDF here, or choose it')
      .setInputFiles({ name: 'report.pdf', mimeType: 'application/pdf', buffer: pdf });
    await page.getByText('Genuine', { exact: true }).waitFor();
    await page.getByText('current', { exact: true }).waitFor();
    await anyone.sees('Verify a report');
    const changed = Buffer.from(pdf);
    changed[1000] = changed[1000]! ^ 1;
    await page
      .getByLabel('Drop the PDF here, or choose it')
      .setInputFiles({ name: 'changed.pdf', mimeType: 'application/pdf', buffer: changed });
    await page.getByText('This file was not issued here').waitFor();
    await anyone.leave();
  });
});
