import { randomUUID } from 'node:crypto';
import { appendFile, readFile } from 'node:fs/promises';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { text as readText } from 'node:stream/consumers';
import { type DemonstrationMail, demonstrationMail } from '@strandnote/api/contract';
import { SMTPServer } from 'smtp-server';

/**
 * A FAKE mail server for demonstrations and tests: it takes messages over SMTP on loopback and keeps them in a file, where a page
 * of the demonstration shows them. Nothing is delivered.
 */
export async function startFakeMailServer(folder: string, clock: () => Date): Promise<{ url: string; stop: () => Promise<void> }> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData: (stream, session, done) => {
      readText(stream)
        .then((raw) => keep(folder, raw, session.envelope.rcptTo.map(({ address }) => address).join(', '), clock()))
        .then(() => done(), done);
    },
  });
  const port = await freePort();
  await new Promise<void>((resolve) => {
    server.listen(port, '127.0.0.1', resolve);
  });
  return { url: `smtp://127.0.0.1:${port}`, stop: () => new Promise((resolve) => server.close(() => resolve())) };
}

async function keep(folder: string, raw: string, to: string, at: Date): Promise<void> {
  const message: DemonstrationMail = { id: randomUUID(), at: at.toISOString(), to, subject: subjectOf(raw), text: bodyOf(raw) };
  await appendFile(join(folder, 'mail.jsonl'), `${JSON.stringify(message)}\n`, { mode: 0o600 });
}

/** The messages of the demonstration, the latest first. */
export async function readMailbox(folder: string): Promise<DemonstrationMail[]> {
  const lines = await readFile(join(folder, 'mail.jsonl'), 'utf8').catch(() => '');
  return lines
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => demonstrationMail.parse(JSON.parse(line)))
    .reverse();
}

function subjectOf(raw: string): string {
  const header = /^Subject: ((?:.*(?:\r?\n[ \t].*)*))/im.exec(raw)?.[1] ?? '';
  return header
    .replace(/\r?\n[ \t]/g, ' ')
    .replace(/=\?utf-8\?([bq])\?(.*?)\?=\s*/gi, (_, kind: string, word: string) => decodeWord(kind, word));
}

function decodeWord(kind: string, word: string): string {
  if (kind.toLowerCase() === 'b') return Buffer.from(word, 'base64').toString('utf8');
  return decodeQuoted(word.replace(/_/g, ' '));
}

function bodyOf(raw: string): string {
  const [head = '', ...rest] = raw.split(/\r?\n\r?\n/);
  const body = rest.join('\n\n').replace(/\r\n/g, '\n').trimEnd();
  if (/^Content-Transfer-Encoding: base64/im.test(head)) return Buffer.from(body, 'base64').toString('utf8').trimEnd();
  if (/^Content-Transfer-Encoding: quoted-printable/im.test(head)) return decodeQuoted(body.replace(/=\n/g, ''));
  return body;
}

function decodeQuoted(text: string): string {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16)));
  // Characters that were not quoted are ASCII, so that each is one byte here.
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => (typeof address === 'object' && address ? resolve(address.port) : reject(new Error('No free port was found.'))));
    });
  });
}
