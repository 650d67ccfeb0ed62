import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { actText, detailsText, nameInDetails, subjectPath, subjectText } from '../../../apps/mobile/src/features/firm/audit-words.ts';
import { withRole } from '../../../apps/mobile/src/features/firm/role-words.ts';

const event = (over: Partial<Parameters<typeof subjectText>[0]>) => ({
  sequence: 1,
  at: '2026-10-01T08:00:00Z',
  actorName: 'A. Person',
  act: 'structure.created',
  subjectKind: 'structure',
  subjectId: 'f4c9e9a2-6d3b-4c1f-9b52-0f7c2d6f1a10',
  details: {},
  hash: '',
  ...over,
});

test('every act that the server writes down has words', () => {
  const source = readFileSync(fileURLToPath(new URL('../../../apps/api/src/audit/record-event.ts', import.meta.url)), 'utf8');
  const acts = [...source.matchAll(/^ {2}\| '([\w.-]+)'/gm)].map(([, act]) => act!);
  expect(acts.length).toBeGreaterThan(40);
  expect(acts.filter((act) => actText({ act }) === act)).toEqual([]);
});

test('changes are told with old and new values, keys and hashes are left out', () => {
  expect(detailsText({ details: { from: { phone: '', licenceNumber: '12' }, to: { phone: '555', licenceNumber: '13' } } })).toBe(
    'phone: empty to 555; licence number: 12 to 13',
  );
  expect(detailsText({ details: { reason: 'Span of W-07 is wrong', from: 'in check' } })).toBe(
    'reason: Span of W-07 is wrong; from: in check',
  );
  expect(detailsText({ details: { cableId: event({}).subjectId, sha256: 'ab'.repeat(32), superseded: null } })).toBe('');
});

test('a subject bears the name that its event gives, or the one known', () => {
  const known = new Map([[event({}).subjectId, 'Long Ferry Bridge']]);
  expect(subjectText(event({ details: { name: 'North Roof' } }), known)).toBe('structure North Roof');
  expect(subjectText(event({ act: 'structure.changed', details: { from: { place: 'A' }, to: { place: 'B' } } }), known)).toBe(
    'structure Long Ferry Bridge',
  );
  expect(subjectText(event({ subjectKind: 'reference-tension', subjectId: 'x' }), known)).toBe('reference tension');
  expect(nameInDetails({ act: 'structure.changed', details: { from: { name: 'Old' }, to: { name: 'New' } } })).toBe('New');
  expect(nameInDetails({ act: 'revision.started', details: { number: 'R-0001', letter: 'B' } })).toBe('R-0001, revision B');
  expect(nameInDetails({ act: 'revision.approved', details: { name: 'The Signer' } })).toBeNull();
  expect(nameInDetails({ act: 'report.downloaded', details: { name: 'R-0001-A.pdf' } })).toBeNull();
});

test('a subject leads to its page where it has one', () => {
  expect(subjectPath({ subjectKind: 'cable', subjectId: 'c1' })).toBe('structures/cables/c1');
  expect(subjectPath({ subjectKind: 'member', subjectId: 'm1' })).toBe('firm/members');
  expect(subjectPath({ subjectKind: 'measurement', subjectId: 'x' })).toBeNull();
});

test('client stands alone among the roles', () => {
  expect(withRole(['admin', 'engineer'], 'client', true)).toEqual(['client']);
  expect(withRole(['client'], 'checker', true)).toEqual(['checker']);
  expect(withRole(['engineer'], 'checker', true)).toEqual(['engineer', 'checker']);
  expect(withRole(['engineer', 'checker'], 'engineer', false)).toEqual(['checker']);
});
