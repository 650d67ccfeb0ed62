import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
  to: string[];
  subject: string;
  text: string;
}

/** A mail server on loopback that keeps what it is sent. */
export async function startMailServer(): Promise<{ url: string; received: ReceivedMail[]; stop: () => Promise<void> }> {
  const received: ReceivedMail[] = [];
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        received.push({
          to: session.envelope.rcptTo.map(({ address }) => address),
          ...readMessage(Buffer.concat(chunks).toString('utf8')),
        });
        done();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.server.address() as AddressInfo;
  return { url: `smtp://127.0.0.1:${port}`, received, stop: () => new Promise((resolve) => server.close(resolve)) };
}

/** Enough of RFC 5322 for messages of one plain part: folded headers, encoded words, quoted-printable. */
function readMessage(message: string): { subject: string; text: string } {
  const [head = '', ...rest] = message.split('\r\n\r\n');
  const headers = head.replace(/\r\n[ \t]+/g, ' ');
  const subject = /^Subject: (.*)$/im.exec(headers)?.[1] ?? '';
  const quoted = /^Content-Transfer-Encoding: quoted-printable/im.test(headers);
  const body = rest.join('\r\n\r\n').trim();
  return { subject: decodeWords(subject), text: quoted ? decodeQuoted(body.replace(/=\r\n/g, '')) : body };
}

function decodeWords(text: string): string {
  return text
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind: string, word: string) =>
      kind.toLowerCase() === 'b' ? Buffer.from(word, 'base64').toString('utf8') : decodeQuoted(word.replace(/_/g, ' ')),
    );
}

function decodeQuoted(text: string): string {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}
