import type { ReportContent } from '@strandnote/core/report-content';
import { type Actor, schema, type Tx } from '@strandnote/db';
import { and, arrayContains, eq, inArray, sql } from 'drizzle-orm';
import type { Mail } from '../mail/mail.ts';
import type { LoadedRevision } from './load-revision.ts';

const { members } = schema;

/** To every checker of the firm who took no part in the submission: it waits for them. */
export async function submittedMail(
  tx: Tx,
  { loaded, submissionId, content }: { loaded: LoadedRevision; submissionId: string; content: ReportContent },
): Promise<Mail[]> {
  const checkers = await tx
    .select()
    .from(members)
    .where(
      and(
        eq(members.active, true),
        arrayContains(members.roles, ['checker']),
        sql`not has_prepared(${members.firmId}, ${submissionId}::uuid, ${members.userId})`,
      ),
    );
  const name = nameOf(loaded);
  return checkers.map(({ email }) => ({
    to: email,
    subject: `${name} is waiting to be checked`,
    text: `${content.author.name} has submitted ${name} (${content.structure.name}, ${content.campaign.name}) for checking: ${counted(content.cables.length, 'cable')}.`,
    path: `checking/${loaded.revision.id}`,
  }));
}

/** To the author: the checker wants something changed. */
export async function returnedMail(tx: Tx, loaded: LoadedRevision, actor: Actor, reason: string): Promise<Mail[]> {
  const name = nameOf(loaded);
  return (await authorOf(tx, loaded)).map(({ email }) => ({
    to: email,
    subject: `${name} was returned`,
    text: `${actor.name} has returned ${name} with this reason:\n\n${reason}`,
    path: `reports/${loaded.revision.id}`,
  }));
}

/** To the author and the deputy: the revision can be issued. */
export async function approvedMail(tx: Tx, loaded: LoadedRevision, actor: Actor): Promise<Mail[]> {
  const name = nameOf(loaded);
  return (await authorOf(tx, loaded)).map(({ email }) => ({
    to: email,
    subject: `${name} was approved`,
    text: `${actor.name} has checked and approved ${name}. It can be issued now.`,
    path: `reports/${loaded.revision.id}`,
  }));
}

/** To the people of the client that it is addressed to. */
export async function issuedMail(tx: Tx, loaded: LoadedRevision, content: ReportContent): Promise<Mail[]> {
  const name = nameOf(loaded);
  return (await peopleOfClient(tx, loaded)).map(({ email }) => ({
    to: email,
    subject: `${content.firm.name}: ${name} was issued to you`,
    text: `${content.firm.name} has issued ${name}, “${content.report.title}” (${content.structure.name}), to ${content.client.name}.\n\nAnyone who holds the report can verify it with the code ${loaded.revision.verificationCode}.`,
    path: `issued/${loaded.revision.id}`,
  }));
}

/** To the people of the client that it was addressed to. */
export async function withdrawnMail(
  tx: Tx,
  { loaded, content, reason }: { loaded: LoadedRevision; content: ReportContent; reason: string },
): Promise<Mail[]> {
  const name = nameOf(loaded);
  return (await peopleOfClient(tx, loaded)).map(({ email }) => ({
    to: email,
    subject: `${content.firm.name}: ${name} was withdrawn`,
    text: `${content.firm.name} has withdrawn ${name}, “${content.report.title}” (${content.structure.name}), with this reason:\n\n${reason}\n\nPlease do not rely on it any longer.`,
    path: `issued/${loaded.revision.id}`,
  }));
}

function nameOf({ report, revision }: LoadedRevision): string {
  return `report ${report.number}, revision ${revision.letter}`;
}

function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

async function authorOf(tx: Tx, { revision }: LoadedRevision): Promise<{ email: string }[]> {
  const people = [revision.authorUserId, ...(revision.deputyUserId === null ? [] : [revision.deputyUserId])];
  return tx
    .select({ email: members.email })
    .from(members)
    .where(and(eq(members.active, true), inArray(members.userId, people)));
}

async function peopleOfClient(tx: Tx, { report, revision }: LoadedRevision): Promise<{ email: string }[]> {
  return tx
    .select({ email: members.email })
    .from(members)
    .where(and(eq(members.active, true), eq(members.clientId, revision.addressedClientId ?? report.clientId)));
}
