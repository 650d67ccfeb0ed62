import { createHash, randomUUID } from 'node:crypto';
import { type Actor, schema, type Tx } from '@strandnote/db';

const chunkSize = 1024 * 1024;

export interface FileToStore {
  kind: 'report-unsigned' | 'report-signed' | 'record';
  name: string;
  mediaType: string;
  bytes: Buffer;
}

/** Stores a file of the firm in chunks of at most 1 MiB; it is never changed afterwards. */
export async function storeFile(tx: Tx, actor: Pick<Actor, 'firmId'>, file: FileToStore): Promise<{ id: string; sha256: string }> {
  const id = randomUUID();
  const sha256 = createHash('sha256').update(file.bytes).digest('hex');
  const { kind, name, mediaType, bytes } = file;
  await tx.insert(schema.files).values({ firmId: actor.firmId, id, kind, name, mediaType, bytes: bytes.length, sha256 });
  for (let index = 0; index * chunkSize < bytes.length; index++) {
    const data = bytes.subarray(index * chunkSize, (index + 1) * chunkSize);
    await tx.insert(schema.fileChunks).values({ firmId: actor.firmId, id: randomUUID(), fileId: id, index, data });
  }
  return { id, sha256 };
}
