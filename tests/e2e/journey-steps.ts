import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import type { Visitor } from '../support/browser.ts';

/** A stay of 40 m in 12 strands near 1 000 kN, as f/n rises with n by bending. */
export const frequencies = [2.815, 5.635, 8.46, 11.295, 14.145, 17.01, 19.9];

export async function fillCable(page: Page, reference: string): Promise<void> {
  await page.getByLabel('Our reference').fill(reference);
  await page.getByLabel('Kind', { exact: true }).selectOption('stay');
  await page.getByLabel('Strand from the catalogue').selectOption('y1860s7-15.7-sheathed');
  await page.getByLabel('Number of strands').fill('12');
  await page.getByLabel('Where these come from').selectOption('supplier');
  await page.getByLabel('Chord between working points').fill('40,3');
  await page.getByLabel('Tolerance of the chord, ±').fill('20');
  await page.getByLabel('Where the chord comes from').selectOption('as-built');
  for (const side of ['Lower', 'Upper']) await page.getByLabel(`${side} deduction`).fill('1');
  for (const tolerance of await page.getByLabel('Its tolerance, ±').all()) await tolerance.fill('20');
  await page.getByLabel('Where the deductions come from').selectOption('design');
  await page.getByLabel('Inclination from the horizontal').fill('35');
  for (const end of ['Lower end', 'Upper end']) await page.getByLabel(`${end}, as the drawings say`).selectOption('socket');
  for (const group of await page.getByRole('radio', { name: 'None' }).all()) await group.check();
  await page.getByLabel('Design tension, mean chord').fill('860');
  await page.getByLabel('Construction stage').fill('In service, permanent load');
}

/** A second cable with the same section, by the same interface as the form. */
export async function addLike(engineer: Visitor, structureId: string, reference: string): Promise<void> {
  const path = `/api/v1/firms${engineer.firm}/structures/${structureId}/cables`;
  const { items } = (await engineer.page.evaluate(async (address) => (await fetch(address)).json(), path)) as {
    items: Record<string, unknown>[];
  };
  const { id: _id, structureId: _structure, section: _section, references: _references, spans, ...fields } = items[0]!;
  const copied = (spans as Record<string, unknown>[]).map(({ cableId: _cable, position: _position, ...span }) => ({
    ...span,
    id: randomUUID(),
  }));
  await engineer.send('POST', `/structures/${structureId}/cables`, { ...fields, id: randomUUID(), reference, position: 1, spans: copied });
}

export async function enterPeaks(page: Page, values: readonly number[]): Promise<void> {
  for (const [index, value] of values.slice(0, 6).entries()) {
    await page.getByLabel(`Frequency of mode ${index + 1}`).fill(value.toFixed(3));
  }
}

export async function answerVisit(page: Page): Promise<void> {
  for (const label of [/^Damper at the lower end/, /^Damper at the upper end/, 'Bushing'])
    await page.getByLabel(label).selectOption('none');
  await page.getByRole('radio', { name: 'no', exact: true }).check();
  await page.getByLabel('What made it vibrate').selectOption('ambient');
}

export async function submit(page: Page): Promise<void> {
  await page.getByRole('checkbox', { name: 'This is what I sign' }).check();
  // What stood in the way is gone from the page, so that nothing moves under the pointer.
  await page.getByText('in the way of submitting').waitFor({ state: 'detached' });
  await page.waitForLoadState('networkidle');
  await page.getByRole('button', { name: 'Submit revision A for checking' }).and(page.locator(':not([aria-disabled])')).click();
}

export async function openCable(page: Page, reference: string): Promise<void> {
  await page
    .getByRole('link', { name: new RegExp(`^${reference}`) })
    .first()
    .click();
  await page.getByRole('heading', { name: `Cable ${reference}` }).waitFor();
}

export async function download(page: Page, link: string | RegExp): Promise<Buffer> {
  const [started] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: link }).click()]);
  return readFileSync(await started.path());
}

export async function fillCampaign(page: Page): Promise<void> {
  await page.getByLabel('Name').fill('First survey');
  await page.getByLabel('First day').fill('2026-12-01');
  await page.getByLabel('Stage of the structure').fill('In service, permanent load');
  await page.getByLabel('Reference that tensions are compared with').selectOption('design');
  await page.getByRole('radio', { name: /Agreed with the client/ }).check();
  await page.getByLabel('Not more below the reference than').fill('10');
  await page.getByLabel('Not more above the reference than').fill('10');
}

/** Saves the entry and waits until the app has gone on to where work waits. */
export async function saveEntry(page: Page): Promise<void> {
  const here = page.url();
  await page.getByRole('button', { name: /^Save and go to/ }).click();
  await page.waitForURL((url) => url.href !== here);
}

/** A structure without cables, ordered by the demonstration's client. */
export async function addStructure(engineer: Visitor, id: string, name: string): Promise<void> {
  const { items } = (await engineer.page.evaluate(async (path) => (await fetch(path)).json(), `/api/v1/firms${engineer.firm}/clients`)) as {
    items: { id: string }[];
  };
  await engineer.send('POST', '/structures', {
    id,
    name,
    reference: '',
    kind: 'cable-stayed',
    ownerName: '',
    clientId: items[0]!.id,
    place: 'Orrinvale',
    timeZone: 'Europe/London',
    elevation: null,
    notes: '',
  });
}
