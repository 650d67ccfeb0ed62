import { type Actor, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import type { AppDeps } from '../deps.ts';
import type { Download } from '../files/send-download.ts';
import { loadRevision } from './load-revision.ts';
import { renderReport } from './pdf/render-report.ts';
import { contentNow, listSignatures } from './revision-view.ts';

/** The PDF as it would look with the content as it stands, marked as a draft on every page. Nothing of it is kept. */
export async function previewPdf(deps: AppDeps, actor: Actor, revisionId: string): Promise<Download> {
  assertCan(actor, 'report.read');
  const { loaded, shown, signatures } = await withFirm(deps.db, actor, async (tx) => {
    const found = await loadRevision(tx, revisionId);
    return { loaded: found, shown: await contentNow(tx, found), signatures: await listSignatures(tx, revisionId) };
  });
  const { revision, report } = loaded;
  const bytes = await renderReport({
    content: shown.content,
    contentJson: shown.contentJson,
    contentSha256: shown.contentSha256,
    signatures: signatures.filter(({ contentSha256 }) => contentSha256 === shown.contentSha256),
    verificationCode: revision.verificationCode,
    verificationUrl: `${deps.env.publicUrl}/verify/${revision.verificationCode}`,
    auditHead: null,
    renderedAt: deps.clock(),
    draft: true,
  });
  return { name: `${report.number}-${revision.letter}-draft.pdf`, mediaType: 'application/pdf', bytes };
}
