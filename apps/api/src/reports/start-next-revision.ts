import type { CreateRevision } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { asc, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertRevision } from './create-report.ts';
import type { RevisionRow } from './load-revision.ts';
import { nextRevisionLetter } from './revision-letter.ts';

const { reports, revisionCables, revisions } = schema;

/** Starts the revision after an issued or withdrawn one, with its texts and cables to begin from. */
export async function startNextRevision(deps: AppDeps, actor: Actor, reportId: string, body: CreateRevision): Promise<void> {
  assertCan(actor, 'report.write');
  await withFirm(deps.db, actor, async (tx) => {
    // The report's row is locked, so that two people who start the next revision at once do not both get one.
    const [report] = await tx.select().from(reports).where(eq(reports.id, reportId)).for('no key update');
    if (!report) throw new AppError('not-found', 'There is no such report.');
    if (await isRepeated(tx, reportId, body)) return;
    const latest = await latestRevision(tx, reportId);
    if (latest.state !== 'issued' && latest.state !== 'withdrawn') {
      throw new AppError('conflict', `Revision ${latest.letter} has not been issued or withdrawn yet, so no other can follow it.`);
    }
    const covered = await tx.select().from(revisionCables).where(eq(revisionCables.revisionId, latest.id));
    const letter = nextRevisionLetter(latest.letter);
    await insertRevision(tx, actor, {
      id: body.id,
      reportId,
      letter,
      texts: latest.texts,
      deputyUserId: latest.deputyUserId,
      cableIds: covered.map(({ cableId }) => cableId),
      at: deps.clock(),
    });
    await recordEvent(tx, actor, 'revision.started', { kind: 'revision', id: body.id }, { number: report.number, letter }, deps.clock());
  });
}

async function isRepeated(tx: Tx, reportId: string, body: CreateRevision): Promise<boolean> {
  const [stored] = await tx.select().from(revisions).where(eq(revisions.id, body.id));
  if (stored && stored.reportId !== reportId) throw new AppError('conflict', 'Another revision has this identifier already.');
  return stored !== undefined;
}

/** The revision that was started last; letters beyond Z are longer than those before. */
async function latestRevision(tx: Tx, reportId: string): Promise<RevisionRow> {
  const all = await tx.select().from(revisions).where(eq(revisions.reportId, reportId)).orderBy(asc(revisions.letter));
  return all.toSorted((a, b) => a.letter.length - b.letter.length || a.letter.localeCompare(b.letter)).at(-1)!;
}
