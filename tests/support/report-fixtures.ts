import { randomUUID } from 'node:crypto';
import { type Actor, type Db, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq } from './drizzle.ts';
import { addBridge, addSurvey, type Bridge, type Firm, type Survey, sha256 } from './fixtures.ts';

const { cableChecks, fileChunks, files, reports, revisionCables, revisions, signatures, submissions, submissionSources } = schema;

export interface Draft {
  reportId: string;
  revisionId: string;
  verificationCode: string;
  clientId: string;
  cableId: string;
}

export interface Submitted {
  submissionId: string;
  contentSha256: string;
}

export type Source = { entity: string; entityId: string };

/** Everything that a report on this survey uses. */
export function sourcesOf(bridge: Bridge, survey: Survey, revisionId: string): Source[] {
  return [
    { entity: 'section', entityId: bridge.sectionId },
    { entity: 'cable', entityId: bridge.cableId },
    { entity: 'span', entityId: bridge.spanId },
    { entity: 'campaign', entityId: survey.campaignId },
    { entity: 'measurement', entityId: survey.measurementId },
    { entity: 'estimate', entityId: survey.estimateId },
    { entity: 'revision', entityId: revisionId },
  ];
}

/** A report on a survey, with revision A as a draft of this author. */
export function addDraft(db: Db, author: Actor, { clientId }: Firm, bridge: Bridge, survey: Survey): Promise<Draft> {
  const { firmId } = author;
  const { cableId } = bridge;
  return withFirm(db, author, async (tx) => {
    const reportId = randomUUID();
    await tx
      .insert(reports)
      .values({ firmId, id: reportId, campaignId: survey.campaignId, clientId, number: `SN-${reportId}`, title: 'Tensions' });
    return addRevision(tx, author, { reportId, clientId, cableId, letter: 'A' });
  });
}

export async function addRevision(
  tx: Tx,
  { firmId, userId }: Actor,
  { reportId, clientId, cableId, letter }: { reportId: string; clientId: string; cableId: string; letter: string },
): Promise<Draft> {
  const revisionId = randomUUID();
  const verificationCode = randomUUID();
  const texts = { scope: 'All stays.', conditions: '', deviations: '', conclusion: '' };
  await tx.insert(revisions).values({ firmId, id: revisionId, reportId, letter, authorUserId: userId, texts, verificationCode });
  await tx.insert(revisionCables).values({ firmId, id: randomUUID(), revisionId, cableId });
  return { reportId, revisionId, verificationCode, clientId, cableId };
}

/** Freezes some content, signs it as its preparer, and moves the revision into check. */
export function submit(db: Db, actor: Actor, { revisionId }: Draft, sources: Source[]): Promise<Submitted> {
  const { firmId, userId } = actor;
  return withFirm(db, actor, async (tx) => {
    const submissionId = randomUUID();
    const content = JSON.stringify({ structure: { name: 'Linden Bridge' }, submissionId });
    const contentSha256 = sha256(content);
    const earlier = await tx.select({ id: submissions.id }).from(submissions).where(eq(submissions.revisionId, revisionId));
    const frozen = { number: earlier.length + 1, content, contentSha256, submittedBy: userId };
    await tx.insert(submissions).values({ firmId, id: submissionId, revisionId, ...frozen });
    await tx.insert(submissionSources).values(sources.map((source) => ({ firmId, id: randomUUID(), submissionId, ...source })));
    await sign(tx, actor, { revisionId, submissionId, contentSha256, meaning: 'prepared' });
    await tx.update(revisions).set({ state: 'in check' }).where(eq(revisions.id, revisionId));
    return { submissionId, contentSha256 };
  });
}

export interface ToSign extends Submitted {
  revisionId: string;
  meaning: 'prepared' | 'checked and approved' | 'issued';
}

export async function sign(tx: Tx, { firmId, userId, name }: Actor, signed: ToSign): Promise<void> {
  await tx.insert(signatures).values({ firmId, id: randomUUID(), userId, name, statement: 'I sign.', ...signed });
}

export async function tick(tx: Tx, { firmId, userId }: Actor, submissionId: string, cableId: string): Promise<void> {
  await tx.insert(cableChecks).values({ firmId, id: randomUUID(), submissionId, cableId, checkedBy: userId });
}

/** Ticks the cable, signs as checker and approves, if the revision is still in check. @returns whether this one approved */
export function approve(db: Db, checker: Actor, { revisionId, cableId }: Draft, submitted: Submitted): Promise<boolean> {
  return withFirm(db, checker, async (tx) => {
    await tick(tx, checker, submitted.submissionId, cableId);
    await sign(tx, checker, { revisionId, ...submitted, meaning: 'checked and approved' });
    const moved = await tx
      .update(revisions)
      .set({ state: 'approved', approvedSubmissionId: submitted.submissionId, approvedAt: new Date() })
      .where(and(eq(revisions.id, revisionId), eq(revisions.state, 'in check')))
      .returning({ id: revisions.id });
    return moved.length === 1;
  });
}

/** Stores a file of the given text in one chunk. */
export async function storeText(
  tx: Tx,
  { firmId }: Pick<Actor, 'firmId'>,
  kind: 'report-unsigned' | 'report-signed',
  text: string,
): Promise<string> {
  const id = randomUUID();
  const data = Buffer.from(text);
  await tx
    .insert(files)
    .values({ firmId, id, kind, name: 'report.pdf', mediaType: 'application/pdf', bytes: data.length, sha256: sha256(data) });
  await tx.insert(fileChunks).values({ firmId, id: randomUUID(), fileId: id, index: 0, data });
  return id;
}

/** Stores the rendered and the signed file, signs and issues to the client of the report. */
export function issue(db: Db, actor: Actor, { revisionId, clientId }: Draft, submitted: Submitted) {
  return withFirm(db, actor, async (tx) => {
    const unsignedFileId = await storeText(tx, actor, 'report-unsigned', `unsigned ${revisionId}`);
    const signedFileId = await storeText(tx, actor, 'report-signed', `signed ${revisionId}`);
    await sign(tx, actor, { revisionId, ...submitted, meaning: 'issued' });
    await tx
      .update(revisions)
      .set({ state: 'issued', unsignedFileId, signedFileId, addressedClientId: clientId, issuedAt: new Date() })
      .where(eq(revisions.id, revisionId));
    return { unsignedFileId, signedFileId };
  });
}

export interface IssuedReport {
  bridge: Bridge;
  survey: Survey;
  draft: Draft;
  submitted: Submitted;
  unsignedFileId: string;
  signedFileId: string;
}

/** A bridge, its survey and a report on it, from the engineer's first row to the issue. */
export async function addIssuedReport(db: Db, firm: Firm): Promise<IssuedReport> {
  const { engineer, checker } = firm;
  const bridge = await addBridge(db, engineer);
  const survey = await addSurvey(db, engineer, bridge);
  const draft = await addDraft(db, engineer, firm, bridge, survey);
  const submitted = await submit(db, engineer, draft, sourcesOf(bridge, survey, draft.revisionId));
  await approve(db, checker, draft, submitted);
  const files = await issue(db, engineer, draft, submitted);
  return { bridge, survey, draft, submitted, ...files };
}
