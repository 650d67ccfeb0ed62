import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { readMailbox, startFakeMailServer } from '../../../apps/api/src/demonstration/mailbox.ts';
import { smtpMail } from '../../../apps/api/src/mail/send-mail.ts';
import { startTestServer } from '../../support/test-server.ts';

const folder = mkdtempSync(join(tmpdir(), 'strandnote-mail-'));
let server: Awaited<ReturnType<typeof startFakeMailServer>>;
beforeAll(async () => {
  server = await startFakeMailServer(folder, () => new Date('2026-09-14T08:00:00Z'));
});
afterAll(async () => {
  await server.stop();
  rmSync(folder, { recursive: true });
});

test('a folder without mail is an empty mailbox', async () => {
  expect(await readMailbox(join(folder, 'nowhere'))).toEqual([]);
});

test('keeps what is sent as it was written, the latest first', async () => {
  const send = smtpMail({ SMTP_URL: server.url, MAIL_FROM: 'Strandnote <strandnote@localhost>' });
  const long = `A line that is longer than a line of mail may be: ${'cable '.repeat(40)}= done.`;
  await send({ to: 'one@strandnote.example', subject: 'Invitation', text: `First\n\nhttp://127.0.0.1/invitation/a-token_1=2\n` });
  await send({ to: 'two@strandnote.example', subject: 'Fågel & “Bridge” — 2 000 ± 71 kN', text: `${long}\nÅngström “quoted” — 1 000 N` });
  const [latest, first] = await readMailbox(folder);
  expect(latest).toMatchObject({
    to: 'two@strandnote.example',
    subject: 'Fågel & “Bridge” — 2 000 ± 71 kN',
    at: '2026-09-14T08:00:00.000Z',
  });
  expect(latest!.text).toBe(`${long}\nÅngström “quoted” — 1 000 N`);
  expect(first!.text).toContain('http://127.0.0.1/invitation/a-token_1=2');
});

test('only a demonstration shows its mail', async () => {
  const real = await startTestServer();
  try {
    expect((await real.anonymous('get', '/demonstration')).body).toEqual({ demonstration: false });
    expect((await real.anonymous('get', '/demonstration/mail')).body).toMatchObject({ status: 404, code: 'not-found' });
  } finally {
    await real.stop();
  }
  const shown = await startTestServer({ settings: { DEMONSTRATION: 'true' } });
  try {
    expect((await shown.anonymous('get', '/demonstration')).body).toEqual({ demonstration: true });
    expect((await shown.anonymous('get', '/demonstration/mail')).body).toEqual({ items: [] });
  } finally {
    await shown.stop();
  }
});

test('without a server to send through, sending fails and says so', async () => {
  const send = smtpMail({ SMTP_URL: undefined, MAIL_FROM: 'x' });
  await expect(send({ to: 'x', subject: 'x', text: 'x' })).rejects.toThrow('SMTP_URL is not set');
});
