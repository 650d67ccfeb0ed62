import { readFileSync } from 'node:fs';
import { beforeAll, expect, test } from 'vitest';
import { renderReport } from '../../../apps/api/src/reports/pdf/render-report.ts';
import { asFile, attempt, reportInput, run, sampleReport } from '../../support/rendered-report.ts';
import { sampleReportContent } from '../../support/report-content.ts';

/**
 * Clauses of ISO 19005-3 (PDF/A-3b) and of tagging that can be tested without a validator. The file is read as qpdf writes
 * it out: one object after the other, its streams unpacked.
 */
let pdf: Buffer;
let plain: string;

beforeAll(async () => {
  pdf = await sampleReport();
  const unpacked = asFile('', 'qdf.pdf');
  run('qpdf', '--qdf', '--object-streams=disable', asFile(pdf), unpacked);
  plain = readFileSync(unpacked, 'latin1');
});

/** The text of every page's drawing. */
function drawings(): string[] {
  return [...plain.matchAll(/\nstream\n([\s\S]*?)\nendstream/g)]
    .map((match) => match[1]!)
    .filter((stream) => /\bBT\b[\s\S]*\bET\b/.test(stream));
}

test('is sound in the eyes of another program', () => {
  const { status, output } = attempt('qpdf', '--check', asFile(pdf));
  expect(output).toContain('No syntax or stream encoding errors found');
  expect(status).toBe(0);
});

test('is PDF 1.7, tagged, in English, with its title shown', () => {
  const told = run('pdfinfo', asFile(pdf));
  expect(told).toMatch(/PDF version:\s+1\.7/);
  expect(told).toMatch(/Tagged:\s+yes/);
  expect(plain).toMatch(/\/Lang \(en\)/);
  expect(plain).toMatch(/\/DisplayDocTitle true/);
});

test('embeds every font as a subset with a map to Unicode', () => {
  const [, , ...fonts] = run('pdffonts', asFile(pdf)).trim().split('\n');
  expect(fonts.length).toBeGreaterThanOrEqual(5);
  for (const font of fonts) expect(font).toMatch(/\byes yes yes\b/);
});

test('says in XMP that it is PDF/A-3b, and the same of itself as its own dictionary', async () => {
  const content = sampleReportContent();
  const titled = await renderReport(reportInput({ ...content, report: { ...content.report, title: 'Spans & <stays>' } }));
  const xmp = /<\?xpacket[\s\S]*?<\?xpacket end="w"\?>/.exec(titled.toString('utf8'))![0];
  expect(xmp).toContain('<pdfaid:part>3</pdfaid:part>');
  expect(xmp).toContain('<pdfaid:conformance>B</pdfaid:conformance>');
  expect(xmp).toContain('SN-0231 revision B: Spans &amp; &lt;stays&gt;</rdf:li>');
  expect(xmp).toContain('<xmp:CreateDate>2026-09-14T14:41:00Z</xmp:CreateDate>');
  expect(run('pdfinfo', asFile(titled))).toContain('Spans & <stays>');
});

test('names the colours of a screen as its output intent', () => {
  expect(plain).toMatch(/\/S \/GTS_PDFA1/);
  expect(plain).toMatch(/\/DestOutputProfile \d+ 0 R/);
  expect(plain).toMatch(/\/N 3\b/);
});

test('has no encryption, transparency, script, outside reference or form that is drawn anew', () => {
  for (const forbidden of [
    '/Encrypt',
    '/SMask',
    '/Transparency',
    '/ExtGState',
    '/JavaScript',
    '/JS ',
    '/AA ',
    '/NeedAppearances',
    '/LZWDecode',
    '/Launch',
    '/Movie',
    '/Sound',
  ]) {
    expect(plain).not.toContain(forbidden);
  }
  for (const annotation of plain.matchAll(/\/Subtype \/(?:Link|Widget)\b/g)) {
    const object = plain.slice(plain.lastIndexOf(' 0 obj', annotation.index), plain.indexOf('endobj', annotation.index));
    // Printed (bit 3), and neither hidden nor invisible (bits 1, 2).
    expect(Number(/\/F (\d+)/.exec(object)![1]) & 0b111).toBe(0b100);
  }
});

test('holds its attachments as associated data with their kinds', () => {
  expect(plain).toMatch(/\/AF \[/);
  expect(plain.match(/\/AFRelationship \/Data/g)).toHaveLength(2);
  expect(plain).toContain('/Subtype /application#2fjson');
  expect(plain).toContain('/Subtype /text#2fcsv');
});

test('prints no letter without a glyph', () => {
  for (const drawing of drawings()) {
    const codes = [...drawing.matchAll(/<([0-9a-f]+)>/g)].flatMap((match) => match[1]!.match(/.{4}/g) ?? []);
    expect(codes).not.toContain('0000');
  }
});

test('draws nothing outside tagged content or an artifact', () => {
  const painting = /^(?:S|s|f|F|f\*|B|B\*|b|b\*|Do|Tj|TJ|sh)$/;
  expect(drawings().length).toBeGreaterThan(20);
  for (const drawing of drawings()) {
    let depth = 0;
    const bare: string[] = [];
    for (const line of drawing.split('\n')) {
      const operator = line.trim().split(/\s+/).at(-1)!;
      if (operator === 'BDC' || operator === 'BMC') depth += 1;
      else if (operator === 'EMC') depth -= 1;
      else if (depth === 0 && painting.test(operator)) bare.push(line);
    }
    expect(bare).toEqual([]);
    expect(depth).toBe(0);
  }
});

test('is built of headings, tables with their heads, figures in words, formulas and paragraphs', () => {
  const structure = run('pdfinfo', '-struct', asFile(pdf));
  for (const kind of ['Document', 'H1', 'H2', 'H3', 'P', 'Table', 'TR', 'TH', 'TD', 'Figure', 'Formula', 'TOC']) {
    expect(structure).toMatch(new RegExp(`^\\s*${kind}\\b`, 'm'));
  }
  const figures = plain.match(/\/S \/Figure\b/g)!.length;
  const described = [...plain.matchAll(/\/S \/Figure\b/g)].filter((match) =>
    plain.slice(plain.lastIndexOf(' 0 obj', match.index), plain.indexOf('endobj', match.index)).includes('/Alt '),
  );
  expect(described).toHaveLength(figures);
  expect(plain).toMatch(/\/Scope \/Column/);
  expect(plain).toMatch(/\/Scope \/Row/);
});

test('skips no level of heading', () => {
  const levels = [...run('pdfinfo', '-struct', asFile(pdf)).matchAll(/^\s*H([1-6])\b/gm)].map((match) => Number(match[1]));
  expect(levels[0]).toBe(1);
  const jumps = levels.filter((level, index) => index > 0 && level > levels[index - 1]! + 1);
  expect(jumps).toEqual([]);
});
