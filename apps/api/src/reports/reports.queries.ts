import type { Report, RevisionSummary } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { listRevisionSummaries } from './revisions.queries.ts';

const { reports } = schema;

/** Reports with their revisions in the order of their letters, the report that was touched last first. */
export async function listReports(tx: Tx): Promise<Report[]> {
  return groupByReport(await listRevisionSummaries(tx));
}

/** @throws AppError `not-found` also for what belongs to another firm */
export async function loadReport(tx: Tx, reportId: string): Promise<Report> {
  const [report] = groupByReport(await listRevisionSummaries(tx, eq(reports.id, reportId)));
  if (!report) throw new AppError('not-found', 'There is no such report.');
  return report;
}

function groupByReport(summaries: RevisionSummary[]): Report[] {
  const found = new Map<string, Report>();
  for (const summary of summaries) {
    const { reportId: id, reportNumber: number, title, campaignId, structureName, clientName } = summary;
    const report = found.get(id) ?? { id, number, title, campaignId, structureName, clientName, revisions: [] };
    report.revisions.push(summary);
    found.set(id, report);
  }
  for (const report of found.values()) {
    report.revisions.sort((a, b) => a.letter.length - b.letter.length || a.letter.localeCompare(b.letter));
  }
  return [...found.values()];
}
