import { createHash } from 'node:crypto';
import { schema, type Tx } from '@strandnote/db';
import { asc, eq } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';

export interface LoadedFile {
  name: string;
  mediaType: string;
  sha256: string;
  bytes: Buffer;
}

/** @throws AppError `not-found`; Error when the bytes are not those whose hash was stored */
export async function loadFile(tx: Tx, fileId: string): Promise<LoadedFile> {
  const { files, fileChunks } = schema;
  const [file] = await tx.select().from(files).where(eq(files.id, fileId));
  if (!file) throw new AppError('not-found', 'There is no such file.');
  const chunks = await tx
    .select({ data: fileChunks.data })
    .from(fileChunks)
    .where(eq(fileChunks.fileId, fileId))
    .orderBy(asc(fileChunks.index));
  const bytes = Buffer.concat(chunks.map(({ data }) => data));
  if (createHash('sha256').update(bytes).digest('hex') !== file.sha256) throw new Error(`File ${fileId} is not what was stored.`);
  return { name: file.name, mediaType: file.mediaType, sha256: file.sha256, bytes };
}
