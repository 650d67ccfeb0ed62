import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Signature } from '@strandnote/api/contract';
import type { ReportContent } from '@strandnote/core/report-content';
import { canonicalJson, sha256OfText } from '../../apps/api/src/reports/canonical-json.ts';
import { type ReportInput, renderReport } from '../../apps/api/src/reports/pdf/render-report.ts';
import { sampleReportContent } from './report-content.ts';

/** What a report is rendered from, as it stands after approval. */
export function reportInput(content: ReportContent = sampleReportContent(), over: Partial<ReportInput> = {}): ReportInput {
  const contentJson = canonicalJson(content);
  const contentSha256 = sha256OfText(contentJson);
  return {
    content,
    contentJson,
    contentSha256,
    signatures: [
      signature(contentSha256, { meaning: 'prepared', name: 'Ines Falk', signedAt: '2026-09-10T09:12:00.000Z' }),
      signature(contentSha256, {
        meaning: 'checked and approved',
        name: 'Marta Olsen',
        licenceNumber: 'PE 20417',
        jurisdiction: 'Ansel',
        signedAt: '2026-09-14T14:40:00.000Z',
      }),
    ],
    verificationCode: '7K2M-Q4TX-90BD-WZ3R',
    verificationUrl: 'https://strandnote.example/verify/7K2M-Q4TX-90BD-WZ3R',
    auditHead: { sequence: 1842, hash: sha256OfText('the head of the chain') },
    renderedAt: new Date('2026-09-14T14:41:00.000Z'),
    draft: false,
    ...over,
  };
}

function signature(contentSha256: string, over: Partial<Signature>): Signature {
  return {
    meaning: 'prepared',
    name: '',
    licenceNumber: '',
    jurisdiction: '',
    statement: 'I stand by this content.',
    contentSha256,
    signedAt: '',
    submissionNumber: 1,
    ...over,
  };
}

const rendered = new Map<string, Promise<Buffer>>();

/** The sample report as rendered at approval; made once. */
export function sampleReport(count: 12 | 56 = 12): Promise<Buffer> {
  const key = String(count);
  let report = rendered.get(key);
  if (!report) {
    report = renderReport(reportInput(sampleReportContent(count)));
    rendered.set(key, report);
  }
  return report;
}

const folder = mkdtempSync(join(tmpdir(), 'strandnote-pdf-'));
let files = 0;

/** Puts bytes where another program can read them. */
export function asFile(bytes: Buffer | string, ending = 'pdf'): string {
  files += 1;
  const path = join(folder, `${files}.${ending}`);
  writeFileSync(path, bytes);
  return path;
}

/** What a program prints; it has to succeed. */
export function run(program: string, ...parameters: string[]): string {
  return execFileSync(program, parameters, {
    encoding: 'utf8',
    maxBuffer: 1 << 28,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, TZ: 'UTC' },
  });
}

/** What a program prints and how it ends, whichever way. */
export function attempt(program: string, ...parameters: string[]): { status: number | null; output: string } {
  const { status, stdout, stderr, error } = spawnSync(program, parameters, { encoding: 'utf8' });
  if (error) throw error;
  return { status, output: `${stdout}${stderr}` };
}

/** The words of a page, or of all pages, in the order in which they stand. */
export function wordsOf(pdf: Buffer, page?: number): string {
  const pages = page === undefined ? [] : ['-f', String(page), '-l', String(page)];
  return run('pdftotext', '-layout', ...pages, asFile(pdf), '-');
}

/** The same text with its thousands run together: some programs write a thin space as a space. */
export function ungrouped(text: string): string {
  return text.replace(/(?<=\d)[ \u2009](?=\d{3}(?!\d))/g, '');
}
