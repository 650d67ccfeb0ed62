import { appendFile, readFile } from 'node:fs/promises';
import { z } from 'zod';

const anchor = z.object({ firmId: z.string(), sequence: z.number().int(), hash: z.string(), at: z.string() });
export type Anchor = z.infer<typeof anchor>;

/** Appends the head of a firm's chain to a file outside the database, so that a chain that was cut or rewritten shows itself. */
export async function appendAnchor(file: string, head: Anchor): Promise<void> {
  await appendFile(file, `${JSON.stringify(head)}\n`, { mode: 0o600 });
}

/** All anchors of a firm, oldest first; none where there is no file yet. */
export async function readAnchors(file: string, firmId: string): Promise<Anchor[]> {
  const text = await readFile(file, 'utf8').catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return '';
    throw error;
  });
  return text
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => anchor.parse(JSON.parse(line)))
    .filter((candidate) => candidate.firmId === firmId);
}
