import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { runAuditVerify } from '../../../apps/api/src/commands/audit-verify.ts';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { draftReport, submit } from '../reports/report-acts.ts';
import { ok, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let firmId: string;
let admin: SignedIn;
let engineer: SignedIn;
let other: SignedIn;
let checker: SignedIn;
let clientId: string;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm('Falk and Reyes');
  clientId = await server.createClient(firmId);
  admin = await server.join(firmId, { name: 'Petra Lund', roles: ['admin'] });
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  other = await server.join(firmId, { name: 'Ole Dahl', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
});
afterAll(() => server.stop());

const trail = async (person: SignedIn, query = '') => (await ok(person.get(`/audit${query}`))).body.items;
const verdict = async () => (await ok(admin.get('/audit/verification'))).body;

test('an administrator reads the whole trail, the latest first, page by page', async () => {
  const bridge = await surveyBridge(engineer);
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  await ok(submit(engineer, revisionId));
  const all = await trail(admin);
  const sequences = all.map(({ sequence }: { sequence: number }) => sequence);
  expect(sequences).toEqual([...sequences].sort((a, b) => b - a));
  expect(sequences.at(-1)).toBe(1);
  const earlier = await trail(admin, `?before=${sequences[3]}`);
  expect(earlier).toEqual(all.slice(4));
});

test('an engineer reads of their own work, a checker of what they check, and neither more', async () => {
  const all = await trail(admin);
  const mine = await trail(engineer);
  expect(mine.length).toBeGreaterThan(5);
  expect(mine.some(({ act }: { act: string }) => act === 'revision.submitted')).toBe(true);
  expect(new Set((await trail(other)).map(({ act }: { act: string }) => act))).toEqual(new Set(['session.started']));
  const checked = await trail(checker);
  expect(checked.some(({ act }: { act: string }) => act === 'revision.submitted')).toBe(true);
  expect(checked.some(({ act }: { act: string }) => act === 'structure.created')).toBe(false);
  expect(checked.length).toBeLessThan(all.length);
});

test('finds the chain whole, by the page and by the command', async () => {
  expect(await verdict()).toMatchObject({ intact: true, firstProblem: null });
  const { intact, said } = await command();
  expect(intact).toBe(true);
  expect(said).toMatch(/^Falk and Reyes: \d+ events, intact$/);
});

/** As somebody would who has the whole database in hand: no trigger stands in the way. */
async function tamper(statement: string): Promise<void> {
  await server.superuser.query(
    `set session_replication_role = replica; ${statement.replaceAll('FIRM', `firm_id = '${firmId}'`)}; set session_replication_role = origin`,
  );
}

/** Whoever can do that can also compute every hash anew. */
const computeAnew = `do $$ declare e audit_events; last text := repeat('0', 64); begin
  for e in select * from audit_events where FIRM order by sequence loop
    e.previous_hash := last;
    last := audit_hash(e);
    update audit_events set previous_hash = e.previous_hash, hash = last where firm_id = e.firm_id and sequence = e.sequence;
  end loop;
  update audit_heads set hash = last where FIRM;
end $$`;

async function command(): Promise<{ intact: boolean; said: string }> {
  const log = vi.spyOn(console, 'log').mockImplementation(() => undefined);
  const intact = await runAuditVerify({ ownerUrl: server.urls.owner, anchorFile: server.anchorFile });
  const said = log.mock.calls.flat().join('\n');
  log.mockRestore();
  return { intact, said };
}

test('names an event that was changed', async () => {
  await tamper("update audit_events set actor_name = 'Somebody else' where FIRM and sequence = 2");
  expect(await verdict()).toMatchObject({ intact: false, firstProblem: { sequence: 2, message: expect.stringContaining('was changed') } });
  await tamper("update audit_events set actor_name = 'Ines Falk' where FIRM and sequence = 2");
  expect((await verdict()).intact).toBe(true);
});

test('a chain that was computed anew holds by itself, and is named by the anchors outside the database', async () => {
  await tamper(`update audit_events set actor_name = 'Somebody else' where FIRM and sequence = 2; ${computeAnew}`);
  const { rows } = await server.superuser.query('select * from audit_faults($1)', [firmId]);
  expect(rows).toEqual([]);
  expect((await verdict()).firstProblem).toMatchObject({ sequence: 2, message: expect.stringContaining('anchored') });
  await tamper(`update audit_events set actor_name = 'Ines Falk' where FIRM and sequence = 2; ${computeAnew}`);
  expect((await verdict()).intact).toBe(true);
});

test('names the last event when it was cut off together with the head', async () => {
  await server.signIn(admin.email);
  const { rows } = await server.superuser.query('select sequence from audit_heads where firm_id = $1', [firmId]);
  const last = Number(rows[0].sequence);
  await tamper(`delete from audit_events where FIRM and sequence = ${last};
    update audit_heads h set sequence = ${last - 1},
      hash = (select hash from audit_events e where e.firm_id = h.firm_id and e.sequence = ${last - 1}) where FIRM`);
  const { intact, said } = await command();
  expect(intact).toBe(false);
  expect(said).toContain(`Event ${last} is not the one that was anchored`);
});
