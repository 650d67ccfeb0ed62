import { randomUUID } from 'node:crypto';
import type { Role } from '@strandnote/api/contract';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { routes } from '../../apps/api/src/routes.ts';
import { draftReport } from '../api/reports/report-acts.ts';
import { ok, surveyBridge } from '../api/surveyed-bridge.ts';
import { type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';
import { expectedAccess, type Ids } from './expected-access.ts';

let server: TestServer;
let everyRole: SignedIn;
let ids: Ids;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  const clientId = await server.createClient(firmId);
  everyRole = await server.join(firmId, { name: 'Nia Sol', roles: ['admin', 'engineer', 'checker'] });
  const bridge = await surveyBridge(everyRole);
  const [cable] = bridge.cables;
  const report = await draftReport(everyRole, bridge.campaignId, clientId);
  const { references } = (await ok(everyRole.get(`/cables/${cable!.id}`))).body;
  const members = (await ok(everyRole.get('/members'))).body.items;
  ids = {
    ...report,
    structureId: bridge.structureId,
    sectionId: bridge.sectionId,
    campaignId: bridge.campaignId,
    cableId: cable!.id,
    spanId: cable!.spanId,
    measurementId: cable!.measurementId,
    referenceId: references[0].id,
    memberId: members[0].id,
    clientId,
    commentId: randomUUID(),
    invitationId: randomUUID(),
  };
});
afterAll(() => server.stop());

/** Values that programs choke on: too large for a column, not numbers, of another kind, texts that a database or a page misreads. */
const odd = fc.oneof(
  fc.constantFrom<unknown>(null, true, -1, 0, 1e308, -1e308, 2 ** 31, 2 ** 53, 1e-320, '', ' ', [], {}, [[]], '9'.repeat(400)),
  fc.constantFrom(
    '\0',
    '\ud800',
    '\u202e',
    "'; drop table firms; --",
    '<script>1</script>',
    '__proto__',
    '%00',
    '0001-01-01',
    '+275760-09-13',
  ),
  fc.string({ unit: 'binary', maxLength: 40 }),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.jsonValue({ maxDepth: 2 }),
);

/** Every place in a body, as the way to it. */
function placesOf(value: unknown, way: string[] = []): string[][] {
  if (typeof value !== 'object' || value === null) return [way];
  return [way, ...Object.entries(value).flatMap(([name, part]) => placesOf(part, [...way, name]))];
}

function withOdd(value: unknown, [name, ...rest]: string[], strange: unknown): unknown {
  if (name === undefined) return strange;
  if (Array.isArray(value)) return value.map((part, index) => (String(index) === name ? withOdd(part, rest, strange) : part));
  const parts = value as Record<string, unknown>;
  return { ...parts, [name]: withOdd(parts[name], rest, strange) };
}

const taking = routes.filter(({ body, access, perMinute }) => body !== undefined && access !== 'public' && perMinute === undefined);

describe.each(taking.map((route) => [`${route.method} ${route.path}`, route] as const))('%s', (name, { method, path }) => {
  test('never fails, whatever stands in the place of a value', async () => {
    const { body, who } = expectedAccess[name.replace('/firms/:firmId', 'F')]!;
    const role: Role = typeof who === 'string' ? 'admin' : who[0]!;
    const address = path.replace('/firms/:firmId', '').replace(/:(\w+)/g, (_, id: string) => ids[id as keyof Ids]);
    await fc.assert(
      fc.asyncProperty(fc.nat(), odd, async (pick, strange) => {
        const valid = body?.(ids, role) ?? {};
        const places = placesOf(valid);
        const sent = withOdd(valid, places[pick % places.length]!, strange);
        // Only an object or a list is JSON for a body here; the rest is refused before it is read.
        fc.pre(typeof sent === 'object' && sent !== null);
        const reply = await everyRole[method](address, sent as object);
        if (reply.status >= 500) throw new Error(`${reply.status} for ${JSON.stringify(sent)}`);
      }),
      { numRuns: 40, seed: 20260914 },
    );
    expect((await everyRole.get('/structures')).status).toBe(200);
  });
});
