import { type Actor, type Tx, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { type AuditAct, recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { loadFile } from '../files/load-file.ts';
import type { Download } from '../files/send-download.ts';
import { contentOf } from '../reports/submissions.queries.ts';
import { type IssuedRows, loadIssuedRows } from './issued.queries.ts';
import { resultsCsv } from './results-csv.ts';

/** The signed PDF of an issued report, byte for byte. Who took it, and when, is written down. */
export async function downloadReport(deps: AppDeps, actor: Actor, revisionId: string): Promise<Download> {
  return download(deps, actor, revisionId, 'report.downloaded', async (tx, { revision, name }) => {
    const { bytes, mediaType } = await loadFile(tx, revision.signedFileId!);
    return { name: `${name}.pdf`, mediaType, bytes };
  });
}

/** The results of an issued report as a table. */
export async function downloadResults(deps: AppDeps, actor: Actor, revisionId: string): Promise<Download> {
  return download(deps, actor, revisionId, 'results.downloaded', async (_tx, { submission, name }) => ({
    name: `${name}-results.csv`,
    mediaType: 'text/csv; charset=utf-8',
    bytes: Buffer.from(resultsCsv(contentOf(submission)), 'utf8'),
  }));
}

/** The frozen content of an issued report: the very text whose hash was signed. */
export async function downloadContent(deps: AppDeps, actor: Actor, revisionId: string): Promise<Download> {
  return download(deps, actor, revisionId, 'content.downloaded', async (_tx, { submission, name }) => ({
    name: `${name}-content.json`,
    mediaType: 'application/json; charset=utf-8',
    bytes: Buffer.from(submission.content, 'utf8'),
  }));
}

async function download(
  deps: AppDeps,
  actor: Actor,
  revisionId: string,
  act: AuditAct,
  make: (tx: Tx, issued: IssuedRows & { name: string }) => Promise<Download>,
): Promise<Download> {
  assertCan(actor, 'issued.read');
  return withFirm(deps.db, actor, async (tx) => {
    const issued = await loadIssuedRows(tx, revisionId);
    const name = `${issued.report.number}-${issued.revision.letter}`.replace(/[^A-Za-z0-9._-]+/g, '-');
    const made = await make(tx, { ...issued, name });
    await recordEvent(tx, actor, act, { kind: 'revision', id: revisionId }, { name: made.name }, deps.clock());
    return made;
  });
}
