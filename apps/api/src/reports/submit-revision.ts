import { randomUUID } from 'node:crypto';
import type { SubmitRevision } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { type DraftContent, draftContent } from './draft-content.ts';
import type { Blocker } from './find-blockers.ts';
import { lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { submittedMail } from './revision-mail.ts';
import { assertNow } from './revision-situation.ts';
import { signSubmission } from './sign-submission.ts';
import { preparedStatement, signedRevisionOf } from './statements.ts';
import { latestSubmission } from './submissions.queries.ts';

const { submissions, submissionSources } = schema;

/**
 * The preparer signs the content and submits it for checking: it is frozen, hashed, and listed with every row whose values
 * it uses. Content that has changed since the preparer looked is not signed for.
 */
export async function submitRevision(deps: AppDeps, actor: Actor, revisionId: string, body: SubmitRevision): Promise<void> {
  assertCan(actor, 'report.write');
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    if (await isRepeated(tx, revisionId, body)) return;
    await assertNow(tx, actor, loaded, 'submit');
    const draft = await draftContent(tx, loaded);
    if (draft.contentSha256 !== body.contentSha256) {
      throw new AppError('stale-content', 'The content has changed since you looked at it. Look at it again, then sign.');
    }
    if (draft.blockers.length > 0) throw blocked(draft.blockers);
    const at = deps.clock();
    const number = await freeze(tx, actor, { revisionId, submissionId: body.submissionId, draft, at });
    await signSubmission(
      tx,
      actor,
      { submissionId: body.submissionId, revisionId, contentSha256: draft.contentSha256 },
      { meaning: 'prepared', name: body.name, statement: preparedStatement(signedRevisionOf(draft.content)), at },
    );
    await moveRevision(tx, revisionId, { from: ['draft', 'returned'], to: 'in check', at });
    await enqueueMail(tx, await submittedMail(tx, { loaded, submissionId: body.submissionId, content: draft.content }));
    await recordEvent(
      tx,
      actor,
      'revision.submitted',
      { kind: 'revision', id: revisionId },
      { number, contentSha256: draft.contentSha256 },
      at,
    );
  });
}

function blocked(blockers: Blocker[]): AppError {
  const errors = blockers.map(({ cableId, message }) => ({ field: cableId === null ? 'texts' : `cables.${cableId}`, message }));
  return new AppError('blocked', 'Something stands in the way of submitting.', { errors });
}

interface Freezing {
  revisionId: string;
  submissionId: string;
  draft: DraftContent;
  at: Date;
}

async function freeze(tx: Tx, actor: Actor, { revisionId, submissionId, draft, at }: Freezing): Promise<number> {
  const number = ((await latestSubmission(tx, revisionId))?.number ?? 0) + 1;
  const { firmId } = actor;
  await tx.insert(submissions).values({
    firmId,
    id: submissionId,
    revisionId,
    number,
    content: draft.text,
    contentSha256: draft.contentSha256,
    submittedBy: actor.userId,
    submittedAt: at,
  });
  await tx.insert(submissionSources).values(draft.sources.map((source) => ({ firmId, id: randomUUID(), submissionId, ...source })));
  return number;
}

async function isRepeated(tx: Tx, revisionId: string, body: SubmitRevision): Promise<boolean> {
  const [stored] = await tx.select().from(submissions).where(eq(submissions.id, body.submissionId));
  if (!stored) return false;
  if (stored.revisionId === revisionId && stored.contentSha256 === body.contentSha256) return true;
  throw new AppError('conflict', 'Another submission has this identifier already.');
}
