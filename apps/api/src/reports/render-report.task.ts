import { type Actor, type Db, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq, isNull } from 'drizzle-orm';
import { z } from 'zod';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { storeFile } from '../files/store-file.ts';
import { type LoadedRevision, lockRevision } from './load-revision.ts';
import { renderRevision } from './render-revision.ts';

const { members, revisions } = schema;

const payload = z.object({ firmId: z.string(), userId: z.string(), revisionId: z.string(), submissionId: z.string() });
type Payload = z.infer<typeof payload>;

/**
 * Renders the PDF of an approved revision in the name of the person who approved it. A job that runs again, or after the
 * revision was returned, changes nothing: the file is kept only where it is still wanted and not there yet.
 */
export function renderReportTask(deps: AppDeps): (job: unknown) => Promise<void> {
  return async (job) => {
    const asked = payload.parse(job);
    const actor = await actorOf(deps.db, asked);
    // The revision stays locked while its PDF is made: it can be neither returned nor rendered twice meanwhile.
    await withFirm(deps.db, actor, async (tx) => {
      const loaded = await lockRevision(tx, asked.revisionId);
      if (isWanted(loaded, asked)) await renderAndKeep(deps, tx, actor, loaded);
    });
  };
}

async function actorOf(db: Db, { firmId, userId }: Payload): Promise<Actor> {
  const actor: Actor = { firmId, userId, name: '', roles: [], clientId: null };
  const [member] = await withFirm(db, actor, (tx) => tx.select().from(members).where(eq(members.userId, userId)));
  if (!member) throw new Error('The person who approved the revision is not known in the firm.');
  return { ...actor, name: member.name, roles: member.roles };
}

function isWanted({ revision }: LoadedRevision, { submissionId }: Payload): boolean {
  return revision.state === 'approved' && revision.approvedSubmissionId === submissionId && revision.unsignedFileId === null;
}

async function renderAndKeep(deps: AppDeps, tx: Tx, actor: Actor, loaded: LoadedRevision): Promise<void> {
  const { revision, report } = loaded;
  const bytes = await renderRevision(deps, tx, loaded);
  const name = `${report.number}-${revision.letter}.pdf`;
  const file = await storeFile(tx, actor, { kind: 'report-unsigned', name, mediaType: 'application/pdf', bytes });
  await tx
    .update(revisions)
    .set({ unsignedFileId: file.id, changedAt: deps.clock() })
    .where(and(eq(revisions.id, revision.id), eq(revisions.state, 'approved'), isNull(revisions.unsignedFileId)));
  await recordEvent(tx, actor, 'revision.rendered', { kind: 'revision', id: revision.id }, { sha256: file.sha256 }, deps.clock());
}
