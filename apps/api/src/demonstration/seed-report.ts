import type { ReportTexts } from '@strandnote/core/report-content';
import { withFirm } from '@strandnote/db';
import type { AppDeps } from '../deps.ts';
import { approveRevision } from '../reports/approve-revision.ts';
import { createReport } from '../reports/create-report.ts';
import { editRevision } from '../reports/edit-revision.ts';
import { issueRevision } from '../reports/issue-revision.ts';
import { renderReportTask } from '../reports/render-report.task.ts';
import { loadRevisionView } from '../reports/revision-view.ts';
import { loadSubmission } from '../reports/submissions.queries.ts';
import { submitRevision } from '../reports/submit-revision.ts';
import { tickCable } from '../reports/tick-cable.ts';
import type { DemonstrationPeople } from './seed-people.ts';
import type { SeededRandom } from './seeded-random.ts';

export interface SeedReport {
  campaignId: string;
  title: string;
  texts: ReportTexts;
}

/** Writes a report of a campaign and submits its revision A for checking. @returns the revision and its submission */
export async function seedSubmittedReport(
  deps: AppDeps,
  { actors, clientId }: DemonstrationPeople,
  report: SeedReport,
  random: SeededRandom,
) {
  const { engineer } = actors;
  const revisionId = random.uuid();
  await createReport(deps, engineer, report.campaignId, { id: random.uuid(), revisionId, title: report.title, clientId, cableIds: null });
  await editRevision(deps, engineer, revisionId, { texts: report.texts, deputyUserId: null, textVersion: 1 });
  const draft = await withFirm(deps.db, engineer, (tx) => loadRevisionView(tx, engineer, revisionId));
  const submissionId = random.uuid();
  await submitRevision(deps, engineer, revisionId, { submissionId, name: engineer.name, contentSha256: draft.contentSha256 });
  return { revisionId, submissionId };
}

/** Checks, approves, renders and issues a submitted revision, each by the person whose part it is. */
export async function seedIssue(
  deps: AppDeps,
  { actors, passwords }: DemonstrationPeople,
  { revisionId, submissionId }: { revisionId: string; submissionId: string },
): Promise<void> {
  const { checker, engineer } = actors;
  const submission = await withFirm(deps.db, checker, (tx) => loadSubmission(tx, submissionId));
  const { content } = await withFirm(deps.db, checker, (tx) => loadRevisionView(tx, checker, revisionId));
  for (const cable of content.cables) await tickCable(deps, checker, revisionId, cable.id);
  await approveRevision(deps, checker, revisionId, {
    password: passwords.checker,
    name: checker.name,
    licenceNumber: 'OV-11830',
    jurisdiction: 'Orrinvale (invented)',
    contentSha256: submission!.contentSha256,
    meaningUnderstood: true,
  });
  // The job in the queue finds the file there and changes nothing.
  await renderReportTask(deps)({ firmId: checker.firmId, userId: checker.userId, revisionId, submissionId });
  await issueRevision(deps, engineer, revisionId, { password: passwords.engineer });
}
