import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { formatWithUncertainty } from '@strandnote/core';
import type { ReportContent } from '@strandnote/core/report-content';
import { expect, test } from 'vitest';
import { renderReport } from '../../../apps/api/src/reports/pdf/render-report.ts';
import { asFile, reportInput, run, sampleReport, ungrouped, wordsOf } from '../../support/rendered-report.ts';
import { sampleReportContent } from '../../support/report-content.ts';

function pagesOf(pdf: Buffer): number {
  return Number(/Pages:\s+(\d+)/.exec(run('pdfinfo', asFile(pdf)))![1]);
}

test('prints the tension of every measured cable as the content has it, and no single tension where only bounds may be given', async () => {
  const content = sampleReportContent(56);
  const words = ungrouped(wordsOf(await sampleReport(56)));
  const measured = content.cables.filter(({ spans }) => spans[0]!.estimate !== null);
  expect(measured.length).toBe(54);
  for (const { reference, spans } of measured) {
    const { tension, expanded, boundsOnly } = spans[0]!.estimate!.output;
    const { value, uncertainty } = formatWithUncertainty(tension, expanded.U, 'force', 'si');
    const printed = boundsOnly === null ? `${ungrouped(value)}\\s+${ungrouped(uncertainty)}` : '–';
    expect(words).toMatch(new RegExp(`^\\s*${reference}\\s+${printed}\\s`, 'm'));
  }
});

test('sets a title block on every page', async () => {
  const pdf = await sampleReport();
  const count = pagesOf(pdf);
  expect(count).toBeGreaterThan(20);
  for (let page = 1; page <= count; page += 1) {
    const words = wordsOf(pdf, page).replace(/\s+/g, ' ');
    for (const field of [
      'Falk and Reyes, Structural Engineers',
      'SN-0231',
      'Checked and approved',
      `${page} of ${count}`,
      '7K2M-Q4TX-90BD-WZ3R',
    ]) {
      expect(words).toContain(field);
    }
  }
});

test('names what the report rests on: zones, cautions, references, conditions, signatures, hashes', async () => {
  const input = reportInput();
  const words = wordsOf(await sampleReport()).replace(/\s+/g, ' ');
  for (const told of [
    'Ansel County Roads',
    'outside, not proven',
    'A normal tension does not show that wires or anchorages are sound',
    'The decision belongs to a licensed engineer',
    'Scaffold of the painters at the lower end; no safe reach.',
    'Drawing MFC-S-204, revision 3',
    'One lane in each direction, lorries allowed',
    'The residuals are 5',
    'Set aside: A mode of the deck',
    'PE 20417, Ansel',
    input.contentSha256,
    input.auditHead!.hash,
    'Irvine, H. M., Caughey, T. K. (1974)',
  ]) {
    expect(words).toContain(told);
  }
});

test('marks a draft on every page and keeps no place for a signature in it', async () => {
  const pdf = await renderReport(reportInput(sampleReportContent(), { draft: true, signatures: [], auditHead: null }));
  const count = pagesOf(pdf);
  for (let page = 1; page <= count; page += 1) expect(wordsOf(pdf, page)).toContain('Draft, not checked. Demonstration data, simulated');
  expect(wordsOf(pdf)).toContain('Nobody has signed this content.');
  expect(pdf.includes('/ByteRange')).toBe(false);
  expect(wordsOf(await sampleReport())).not.toContain('not checked');
});

test('says on every page that demonstration data are simulated, and never of real data', async () => {
  const content = sampleReportContent();
  const real: ReportContent = { ...content, firm: { ...content.firm, demonstration: false } };
  expect(wordsOf(await renderReport(reportInput(real)))).not.toMatch(/demonstration|simulated/i);
  const demonstration = await sampleReport();
  const count = pagesOf(demonstration);
  for (let page = 1; page <= count; page += 1) expect(wordsOf(demonstration, page)).toContain('Demonstration data, simulated');
});

test('repeats the head of a table on the page that it runs over to', async () => {
  const pdf = await sampleReport(56);
  const pages = Array.from({ length: 8 }, (_, index) => wordsOf(pdf, index + 1));
  expect(pages.filter((words) => /Cable\s+kN\s+±\s?U\s+95 % interval/.test(words)).length).toBeGreaterThanOrEqual(2);
});

test('shows US customary units where they are asked for', async () => {
  const content = sampleReportContent();
  const words = ungrouped(wordsOf(await renderReport(reportInput(content, { units: 'us', paper: 'letter' }))));
  const { output } = content.cables[0]!.spans[0]!.estimate!;
  const { value, uncertainty } = formatWithUncertainty(output.tension, output.expanded.U, 'force', 'us');
  expect(words).toMatch(new RegExp(`W-01u\\s+${value}\\s+${uncertainty}\\s`));
  expect(words).toMatch(/lb\/ft/);
  expect(words).not.toMatch(/\bkN\b(?!·m\/rad)/);
});

test('attaches the content byte for byte, and the table of results', async () => {
  const input = reportInput();
  const path = asFile(await sampleReport());
  const folder = join(path, '..');
  run('pdfdetach', '-saveall', '-o', folder, path);
  expect(readFileSync(join(folder, 'content.json'), 'utf8')).toBe(input.contentJson);
  const csv = readFileSync(join(folder, 'results.csv'), 'utf8');
  expect(csv.split('\r\n').filter((line) => line !== '')).toHaveLength(input.content.cables.length + 1);
});

test('gives the same bytes for the same input', async () => {
  expect((await renderReport(reportInput())).equals(await sampleReport())).toBe(true);
});

test('prints texts of any length and script, and codes for letters that no font has', async () => {
  const content = sampleReportContent();
  const long = Array.from({ length: 300 }, (_, index) => `sentence ${index} of a long text`).join(', ');
  const odd: ReportContent = {
    ...content,
    report: { ...content.report, title: 'Tensions & <limits> of "Брод" Ω-bridge' },
    client: { ...content.client, name: 'Δήμος Ανσέλ 橋' },
    texts: { ...content.texts, scope: `${long}\n\n${'W'.repeat(400)}`, conclusion: '' },
  };
  const pdf = await renderReport(reportInput(odd));
  const words = wordsOf(pdf);
  expect(words).toContain('Брод');
  expect(words).toContain('Δήμος Ανσέλ [U+6A4B]');
  expect(words).toContain('sentence 299 of a');
  expect(run('pdfinfo', asFile(pdf))).toContain('Tensions & <limits> of "Брод" Ω-bridge');
});

test('renders a report of which no cable was measured or has coordinates', async () => {
  const content = sampleReportContent();
  const bare: ReportContent = {
    ...content,
    structure: { ...content.structure, elevation: null },
    campaign: {
      ...content.campaign,
      instruments: [],
      basis: { ...content.campaign.basis, referenceKind: null, lowerLimit: null, upperLimit: null },
    },
    texts: { scope: '', conditions: '', deviations: '', conclusion: '' },
    cables: content.cables
      .filter(({ notMeasuredReason }) => notMeasuredReason !== null)
      .map((cable) => ({ ...cable, lowerAnchor: null, upperAnchor: null, referenceTension: null })),
  };
  const words = wordsOf(await renderReport(reportInput(bare)));
  expect(words).toContain('0 of 1 cable were measured');
  expect(words).toContain('No limits were agreed before the survey');
});
