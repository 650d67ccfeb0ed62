import {
  createReport as createReportBody,
  createRevision,
  editRevision as editRevisionBody,
  id,
  report,
  reportList,
  revision,
} from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { sendDownload } from '../files/send-download.ts';
import { firmRoute } from '../http/route.ts';
import { createReport } from './create-report.ts';
import { editRevision } from './edit-revision.ts';
import { previewPdf } from './preview-pdf.ts';
import { listReports, loadReport } from './reports.queries.ts';
import { loadRevisionView } from './revision-view.ts';
import { startNextRevision } from './start-next-revision.ts';

const ofReport = z.object({ reportId: id });
const ofRevision = z.object({ revisionId: id });

export const reportRoutes = [
  firmRoute({
    method: 'get',
    path: '/reports',
    access: 'report.read',
    summary: 'The firm’s reports with their revisions',
    reply: reportList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listReports(tx) })),
  }),
  firmRoute({
    method: 'post',
    path: '/campaigns/:campaignId/reports',
    access: 'report.write',
    summary: 'Opens a report on a campaign, with revision A as a draft',
    params: z.object({ campaignId: id }),
    body: createReportBody,
    reply: report,
    status: 201,
    handle: async ({ deps, who, params, body }) => {
      await createReport(deps, who, params.campaignId, body);
      return withFirm(deps.db, who, (tx) => loadReport(tx, body.id));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/reports/:reportId',
    access: 'report.read',
    summary: 'A report with its revisions',
    params: ofReport,
    reply: report,
    handle: ({ deps, who, params }) => withFirm(deps.db, who, (tx) => loadReport(tx, params.reportId)),
  }),
  firmRoute({
    method: 'post',
    path: '/reports/:reportId/revisions',
    access: 'report.write',
    summary: 'Starts the revision after an issued or withdrawn one',
    params: ofReport,
    body: createRevision,
    reply: revision,
    status: 201,
    handle: async ({ deps, who, params, body }) => {
      await startNextRevision(deps, who, params.reportId, body);
      return withFirm(deps.db, who, (tx) => loadRevisionView(tx, who, body.id));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/revisions/:revisionId',
    access: 'report.read',
    summary: 'A revision: its content as it would be or was frozen, what stands in the way, and what this member may do',
    params: ofRevision,
    reply: revision,
    handle: ({ deps, who, params }) => withFirm(deps.db, who, (tx) => loadRevisionView(tx, who, params.revisionId)),
  }),
  firmRoute({
    method: 'patch',
    path: '/revisions/:revisionId',
    access: 'report.write',
    summary: 'Saves the texts and the deputy of a draft',
    params: ofRevision,
    body: editRevisionBody,
    reply: revision,
    handle: async ({ deps, who, params, body }) => {
      await editRevision(deps, who, params.revisionId, body);
      return withFirm(deps.db, who, (tx) => loadRevisionView(tx, who, params.revisionId));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/revisions/:revisionId/preview.pdf',
    access: 'report.read',
    summary: 'The PDF as it would look, marked as a draft',
    params: ofRevision,
    reply: 'file',
    handle: async ({ deps, who, params, response }) => sendDownload(response, await previewPdf(deps, who, params.revisionId)),
  }),
];
