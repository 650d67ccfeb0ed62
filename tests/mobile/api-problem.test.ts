import { expect, test } from 'vitest';
import { problemOfReply } from '../../apps/mobile/src/lib/api-problem.ts';

function reply(status: number, body: unknown): Response {
  return new Response(typeof body === 'string' ? body : JSON.stringify(body), { status });
}

const details = {
  type: 'about:blank',
  title: 'Own work',
  status: 403,
  code: 'own-work',
  detail: 'You prepared part of this revision, so someone else must check it.',
};

test('Problem Details keep their code, their sentence and the fields at fault', async () => {
  const errors = [{ field: 'peaks.2.mode', message: 'Mode 3 is entered twice.' }];
  const problem = await problemOfReply(reply(422, { ...details, status: 422, code: 'invalid', errors }));
  expect(problem).toMatchObject({ kind: 'refused', status: 422, code: 'invalid', message: details.detail, fieldErrors: errors });
});

test.each([
  [401, 'signed-out'],
  [403, 'not-allowed'],
  [404, 'not-found'],
  [409, 'refused'],
  [422, 'refused'],
  [429, 'refused'],
  [500, 'failed'],
  [502, 'offline'],
  [503, 'offline'],
])('a reply with status %i is "%s", with a sentence to show even where the body says nothing', async (status, kind) => {
  expect((await problemOfReply(reply(status, { ...details, status }))).kind).toBe(kind);
  const bare = await problemOfReply(reply(status, '<html>a gateway wrote this</html>'));
  expect(bare).toMatchObject({ kind, status, fieldErrors: [] });
  expect(bare.message).toMatch(/^[A-Z].{15,}\.$/);
  expect(bare.message).not.toContain('<');
});
