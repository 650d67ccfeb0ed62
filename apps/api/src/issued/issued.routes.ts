import { id, issuedDetail, issuedList } from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { sendDownload } from '../files/send-download.ts';
import { firmRoute } from '../http/route.ts';
import { downloadContent, downloadReport, downloadResults } from './download-issued.ts';
import { listIssued, loadIssued } from './issued.queries.ts';

const ofRevision = z.object({ revisionId: id });

export const issuedRoutes = [
  firmRoute({
    method: 'get',
    path: '/issued',
    access: 'issued.read',
    summary: 'Issued reports; a client sees those addressed to them',
    reply: issuedList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listIssued(tx) })),
  }),
  firmRoute({
    method: 'get',
    path: '/issued/:revisionId',
    access: 'issued.read',
    summary: 'An issued report with its content as it was frozen',
    params: ofRevision,
    reply: issuedDetail,
    handle: ({ deps, who, params }) => withFirm(deps.db, who, (tx) => loadIssued(tx, params.revisionId)),
  }),
  firmRoute({
    method: 'get',
    path: '/issued/:revisionId/report.pdf',
    access: 'issued.read',
    summary: 'The signed PDF, byte for byte as it was issued',
    params: ofRevision,
    reply: 'file',
    handle: async ({ deps, who, params, response }) => sendDownload(response, await downloadReport(deps, who, params.revisionId)),
  }),
  firmRoute({
    method: 'get',
    path: '/issued/:revisionId/results.csv',
    access: 'issued.read',
    summary: 'The results as a table for a spreadsheet',
    params: ofRevision,
    reply: 'file',
    handle: async ({ deps, who, params, response }) => sendDownload(response, await downloadResults(deps, who, params.revisionId)),
  }),
  firmRoute({
    method: 'get',
    path: '/issued/:revisionId/content.json',
    access: 'issued.read',
    summary: 'The content as it was frozen: the very text whose SHA-256 was signed',
    params: ofRevision,
    reply: 'file',
    handle: async ({ deps, who, params, response }) => sendDownload(response, await downloadContent(deps, who, params.revisionId)),
  }),
];
