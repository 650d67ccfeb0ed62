import { randomBytes, randomUUID } from 'node:crypto';
import { createDb } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import { z } from 'zod';
import { hashToken } from '../members/invite-member.ts';

const wanted = z.tuple([z.string().min(1), z.string().min(1), z.email()], 'firm name, administrator name, administrator e-mail');
const daysToAccept = 14;

/** Makes a firm and the invitation of its first administrator; run by the operator of an installation. */
export async function createFirm(
  ownerUrl: string,
  publicUrl: string,
  { firmName, adminName, adminEmail, timeZone = 'UTC', demonstration = false }: NewFirm,
): Promise<{ firmId: string; token: string; link: string }> {
  const db = createDb(ownerUrl, { connections: 1 });
  const token = randomBytes(24).toString('base64url');
  const firmId = randomUUID();
  const expires = new Date(Date.now() + daysToAccept * 24 * 60 * 60 * 1000).toISOString();
  try {
    await db.execute(
      sql`select create_firm(${firmId}::uuid, ${firmName}, ${timeZone}, ${randomUUID()}::uuid, ${adminName}, ${adminEmail.toLowerCase()}, ${hashToken(token)}, ${expires}::timestamptz, ${demonstration})`,
    );
  } finally {
    await db.$client.end();
  }
  return { firmId, token, link: `${publicUrl}/invitation/${token}` };
}

export interface NewFirm {
  firmName: string;
  adminName: string;
  adminEmail: string;
  timeZone?: string;
  demonstration?: boolean;
}

/** `npm run firm:create -- "Firm" "Name of the administrator" admin@firm.example` */
export async function runFirmCreate(args: string[], { ownerUrl, publicUrl }: { ownerUrl: string; publicUrl: string }): Promise<void> {
  const parsed = wanted.safeParse(args);
  if (!parsed.success) {
    throw new Error('Give the name of the firm, the name of its administrator and their e-mail address, each in quotes.');
  }
  const [firmName, adminName, adminEmail] = parsed.data;
  const { link } = await createFirm(ownerUrl, publicUrl, { firmName, adminName, adminEmail });
  console.log(`${firmName} was made. ${adminName} accepts the invitation here, within ${daysToAccept} days:\n${link}`);
}
