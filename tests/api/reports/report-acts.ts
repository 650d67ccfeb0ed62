import { randomUUID } from 'node:crypto';
import type { Reply, SignedIn } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

/** The acts of a report's life as the people in it take them. */

export const texts = { scope: 'All stays.', conditions: 'Dry, open to traffic.', deviations: 'None.', conclusion: 'See the table.' };

/** A draft with its texts written. */
export async function draftReport(
  engineer: SignedIn,
  campaignId: string,
  clientId: string,
): Promise<{ reportId: string; revisionId: string }> {
  const [reportId, revisionId] = [randomUUID(), randomUUID()];
  await ok(
    engineer.post(`/campaigns/${campaignId}/reports`, { id: reportId, revisionId, title: 'Cable forces', clientId, cableIds: null }),
  );
  await ok(engineer.patch(`/revisions/${revisionId}`, { texts, deputyUserId: null, textVersion: 1 }));
  return { reportId, revisionId };
}

export async function submit(engineer: SignedIn, revisionId: string): Promise<Reply> {
  const { body } = await ok(engineer.get(`/revisions/${revisionId}`));
  return engineer.post(`/revisions/${revisionId}/submissions`, {
    submissionId: randomUUID(),
    name: engineer.name,
    contentSha256: body.contentSha256,
  });
}

export async function tickAll(checker: SignedIn, revisionId: string): Promise<void> {
  const { body } = await ok(checker.get(`/revisions/${revisionId}`));
  for (const { id } of body.content.cables) await ok(checker.put(`/revisions/${revisionId}/ticks/${id}`, {}));
}

export async function approve(checker: SignedIn, revisionId: string, over: object = {}): Promise<Reply> {
  const { body } = await ok(checker.get(`/revisions/${revisionId}`));
  return checker.post(`/revisions/${revisionId}/approval`, {
    password: checker.password,
    name: checker.name,
    licenceNumber: 'PE 1234',
    jurisdiction: 'Orrin County',
    contentSha256: body.contentSha256,
    meaningUnderstood: true,
    ...over,
  });
}

/** Submits, checks and approves a draft, and renders its PDF. */
export async function approveDraft(
  { engineer, checker, runJobs }: { engineer: SignedIn; checker: SignedIn; runJobs: () => Promise<void> },
  revisionId: string,
): Promise<void> {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  await ok(approve(checker, revisionId));
  await runJobs();
}

export function issue(engineer: SignedIn, revisionId: string, password = engineer.password): Promise<Reply> {
  return engineer.post(`/revisions/${revisionId}/issue`, { password });
}
