import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { cableBody, ok, type SurveyedBridge, sectionBody, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let bridge: SurveyedBridge;
let position = 10;

beforeAll(async () => {
  server = await startTestServer();
  engineer = await server.join(await server.createFirm(), { name: 'Ines Falk', roles: ['engineer'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const newCable = () => cableBody(bridge.sectionId, position++);
const add = (body: object) => engineer.post(`/structures/${bridge.structureId}/cables`, body);

test('gives back a cable with its spans, its section and what it is compared with', async () => {
  const body = newCable();
  const made = (await ok(add(body))).body;
  expect(made).toMatchObject({ id: body.id, reference: body.reference, section: { id: bridge.sectionId }, references: [], history: [] });
  expect(made.spans).toEqual([{ ...body.spans[0], cableId: body.id, position: 0 }]);
  expect(made.structureName).toBe('Orrin Bridge');
});

test('takes the same cable sent twice for one, and refuses it with another span', async () => {
  const body = newCable();
  const first = await ok(add(body));
  expect((await ok(add(body))).body).toEqual(first.body);
  const other = { ...body, spans: [{ ...body.spans[0], chordLength: 81 }] };
  expect((await add(other)).body).toMatchObject({ status: 409, code: 'conflict' });
});

test('refuses a reference that is taken, a section of another structure and deductions that leave no length', async () => {
  const taken = { ...newCable(), reference: 'W-01' };
  expect((await add(taken)).body.errors).toEqual([{ field: 'reference', message: 'The structure has a cable W-01 already.' }]);
  const second = await surveyBridge(engineer);
  expect((await add({ ...newCable(), sectionId: second.sectionId })).body.errors[0].field).toBe('sectionId');
  const body = newCable();
  const tooShort = { ...body, spans: [{ ...body.spans[0], chordLength: 1.4 }] };
  expect((await add(tooShort)).body.errors[0]).toMatchObject({ field: 'spans.0.chordLength' });
  expect((await add({ ...body, spans: [] })).body.errors[0]).toMatchObject({ field: 'spans' });
});

test('writes only what changes: the other spans keep who entered them', async () => {
  const [one, two] = [newCable().spans[0]!, newCable().spans[0]!];
  const body = { ...newCable(), spans: [one, two] };
  await ok(add(body));
  const contributed = async (id: string) =>
    (await server.superuser.query("select 1 from contributions where entity = 'span' and entity_id = $1", [id])).rowCount;
  await ok(engineer.patch(`/cables/${body.id}`, { spans: [one, { ...two, chordLength: 82 }] }));
  expect([await contributed(one.id), await contributed(two.id)]).toEqual([1, 2]);
  const { rows } = await server.superuser.query("select details from audit_events where act = 'cable.changed' and subject_id = $1", [
    body.id,
  ]);
  expect(rows).toHaveLength(1);
  expect(rows[0].details.to.spans[1].chordLength).toBe(82);
  await ok(engineer.patch(`/cables/${body.id}`, { spans: [one, { ...two, chordLength: 82 }] }));
  expect(await contributed(two.id)).toBe(2);
});

test('retires a span that is no longer named, and keeps what was measured on it', async () => {
  const cable = bridge.cables[0]!;
  const fresh = newCable().spans[0]!;
  const changed = (await ok(engineer.patch(`/cables/${cable.id}`, { spans: [fresh] }))).body;
  expect(changed.spans.map(({ id }: { id: string }) => id)).toEqual([fresh.id]);
  const { rows } = await server.superuser.query('select retired_at from spans where id = $1', [cable.spanId]);
  expect(rows[0].retired_at).not.toBeNull();
  const kept = await server.superuser.query('select 1 from measurements where span_id = $1', [cable.spanId]);
  expect(kept.rowCount).toBe(1);
});

test('shows the tension of each campaign in the history, unchecked until a revision is approved', async () => {
  const { history } = (await ok(engineer.get(`/cables/${bridge.cables[1]!.id}`))).body;
  expect(history).toHaveLength(1);
  expect(history[0]).toMatchObject({ campaignName: 'Autumn survey', steelTemperature: 17, checked: false });
  expect(history[0].interval95[0]).toBeLessThan(history[0].tension);
});

test('adds a reference tension once and retires it once', async () => {
  const cable = bridge.cables[1]!;
  const body = {
    id: randomUUID(),
    kind: 'lift-off',
    stage: 'In service',
    place: 'lower-end',
    value: 2.4e6,
    relativeUncertainty: 0.02,
    source: 'Jack 4',
    dated: '2024-05-01',
  };
  await ok(engineer.post(`/cables/${cable.id}/references`, body));
  const { references } = (await ok(engineer.post(`/cables/${cable.id}/references`, body))).body;
  expect(references.filter(({ id }: { id: string }) => id === body.id)).toEqual([{ ...body, cableId: cable.id, retiredAt: null }]);
  expect((await engineer.post(`/cables/${cable.id}/references`, { ...body, value: 2.5e6 })).status).toBe(409);
  const once = (await ok(engineer.post(`/references/${body.id}/retirement`))).body;
  const twice = (await ok(engineer.post(`/references/${body.id}/retirement`))).body;
  expect(twice).toEqual(once);
  expect((await engineer.post(`/cables/${randomUUID()}/references`, { ...body, id: randomUUID() })).status).toBe(404);
});

test('of a section, blank masses are refused, a typed 0 is an answer, and bounds must be in order', async () => {
  const path = `/structures/${bridge.structureId}/sections`;
  const { sheathMass: _left, ...blank } = sectionBody();
  expect((await engineer.post(path, blank)).body.errors).toEqual([{ field: 'sheathMass', message: 'The mass of the sheath is missing.' }]);
  const body = { ...sectionBody(), sheathMass: 0 };
  expect((await ok(engineer.post(path, body))).body.sheathMass).toBe(0);
  expect((await ok(engineer.post(path, body))).body.id).toBe(body.id);
  const wrong = await engineer.patch(`/sections/${body.id}`, { bendingStiffnessHigh: body.bendingStiffnessLow / 2 });
  expect(wrong.body.errors[0].field).toBe('bendingStiffnessHigh');
});
