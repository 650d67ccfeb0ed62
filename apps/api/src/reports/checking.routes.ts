import {
  approveRevision as approveRevisionBody,
  checkComment,
  createComment,
  done,
  editComment,
  id,
  issueRevision as issueRevisionBody,
  returnRevision as returnRevisionBody,
  revision,
  submitRevision as submitRevisionBody,
  withdrawRevision as withdrawRevisionBody,
} from '@strandnote/api/contract';
import { type Actor, withFirm } from '@strandnote/db';
import { z } from 'zod';
import type { AppDeps } from '../deps.ts';
import { firmRoute } from '../http/route.ts';
import { approveRevision } from './approve-revision.ts';
import { loadComment } from './comments.queries.ts';
import { issueRevision } from './issue-revision.ts';
import { recallRevision } from './recall-revision.ts';
import { remark } from './remark.ts';
import { returnRevision } from './return-revision.ts';
import { loadRevisionView } from './revision-view.ts';
import { settleRemark } from './settle-remark.ts';
import { submitRevision } from './submit-revision.ts';
import { tickCable, untickCable } from './tick-cable.ts';
import { withdrawRevision } from './withdraw-revision.ts';

const ofRevision = z.object({ revisionId: id });
const ofCable = z.object({ revisionId: id, cableId: id });

/** Every act that moves a revision answers with the revision as it stands afterwards. */
function viewAfter(deps: AppDeps, who: Actor, revisionId: string) {
  return withFirm(deps.db, who, (tx) => loadRevisionView(tx, who, revisionId));
}

export const checkingRoutes = [
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/submissions',
    access: 'report.write',
    summary: 'Signs the content as its preparer and submits it for checking',
    params: ofRevision,
    body: submitRevisionBody,
    reply: revision,
    status: 201,
    handle: async ({ deps, who, params, body }) => {
      await submitRevision(deps, who, params.revisionId, body);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/recall',
    access: 'report.write',
    summary: 'Takes a revision back out of check',
    params: ofRevision,
    body: z.strictObject({}),
    reply: revision,
    handle: async ({ deps, who, params }) => {
      await recallRevision(deps, who, params.revisionId);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
  firmRoute({
    method: 'put',
    path: '/revisions/:revisionId/ticks/:cableId',
    access: 'revision.check',
    summary: 'Marks a cable as looked at',
    params: ofCable,
    body: z.strictObject({}),
    reply: done,
    handle: async ({ deps, who, params }) => {
      await tickCable(deps, who, params.revisionId, params.cableId);
      return { done: true as const };
    },
  }),
  firmRoute({
    method: 'delete',
    path: '/revisions/:revisionId/ticks/:cableId',
    access: 'revision.check',
    summary: 'Takes that mark back',
    params: ofCable,
    reply: done,
    handle: async ({ deps, who, params }) => {
      await untickCable(deps, who, params.revisionId, params.cableId);
      return { done: true as const };
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/comments',
    access: 'revision.check',
    summary: 'Remarks on a cable, a field or the whole',
    params: ofRevision,
    body: createComment,
    reply: checkComment,
    status: 201,
    handle: async ({ deps, who, params, body }) => {
      await remark(deps, who, params.revisionId, body);
      return withFirm(deps.db, who, (tx) => loadComment(tx, { ...params, commentId: body.id }));
    },
  }),
  firmRoute({
    method: 'patch',
    path: '/revisions/:revisionId/comments/:commentId',
    access: 'report.discuss',
    summary: 'Answers a remark (engineer), closes it or opens it again (checker)',
    params: z.object({ revisionId: id, commentId: id }),
    body: editComment,
    reply: checkComment,
    handle: async ({ deps, who, params, body }) => {
      await settleRemark(deps, who, params, body);
      return withFirm(deps.db, who, (tx) => loadComment(tx, params));
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/return',
    access: 'revision.check',
    summary: 'Gives a revision back to its author with a reason',
    params: ofRevision,
    body: returnRevisionBody,
    reply: revision,
    handle: async ({ deps, who, params, body }) => {
      await returnRevision(deps, who, params.revisionId, body);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/approval',
    access: 'revision.check',
    summary: 'Signs the content as checked and approved; asks for the password again',
    params: ofRevision,
    body: approveRevisionBody,
    reply: revision,
    perMinute: 20,
    handle: async ({ deps, who, params, body }) => {
      await approveRevision(deps, who, params.revisionId, body);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/issue',
    access: 'revision.issue',
    summary: 'Signs the PDF that was rendered at approval and issues it to the client; asks for the password again',
    params: ofRevision,
    body: issueRevisionBody,
    reply: revision,
    perMinute: 20,
    handle: async ({ deps, who, params, body }) => {
      await issueRevision(deps, who, params.revisionId, body);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
  firmRoute({
    method: 'post',
    path: '/revisions/:revisionId/withdrawal',
    access: 'revision.withdraw',
    summary: 'Withdraws an issued revision with a reason',
    params: ofRevision,
    body: withdrawRevisionBody,
    reply: revision,
    handle: async ({ deps, who, params, body }) => {
      await withdrawRevision(deps, who, params.revisionId, body);
      return viewAfter(deps, who, params.revisionId);
    },
  }),
];
