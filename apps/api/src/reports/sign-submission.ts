import { randomUUID } from 'node:crypto';
import { type Actor, schema, type Tx } from '@strandnote/db';

const { signatures } = schema;

interface SubmissionToSign {
  submissionId: string;
  revisionId: string;
  contentSha256: string;
}

interface SignedAs {
  meaning: 'prepared' | 'checked and approved' | 'issued';
  name: string;
  licenceNumber?: string;
  jurisdiction?: string;
  statement: string;
  at: Date;
}

/**
 * Records a signature under a submission, with the hash and the words that it stands for. The database refuses one that
 * approves own work.
 */
export async function signSubmission(tx: Tx, actor: Actor, submission: SubmissionToSign, signed: SignedAs): Promise<void> {
  const { meaning, name, licenceNumber = '', jurisdiction = '', statement, at } = signed;
  await tx.insert(signatures).values({
    ...submission,
    firmId: actor.firmId,
    id: randomUUID(),
    userId: actor.userId,
    meaning,
    name,
    licenceNumber,
    jurisdiction,
    statement,
    signedAt: at,
  });
}
