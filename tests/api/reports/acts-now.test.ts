import { expect, test } from 'vitest';
import { actsNow, type RevisionSituation } from '../../../apps/api/src/reports/acts-now.ts';

function acts(over: Partial<RevisionSituation>) {
  return actsNow({
    state: 'draft',
    isLatest: true,
    roles: ['engineer', 'checker'],
    isAuthorOrDeputy: true,
    ownWork: null,
    blockerCount: 0,
    cableCount: 3,
    tickedCount: 3,
    openRemarkCount: 0,
    pdfReady: true,
    ...over,
  });
}

test('offers each role its own acts and no other', () => {
  expect(Object.keys(acts({ roles: ['checker'] })).sort()).toEqual(['approve', 'remark', 'return', 'tick']);
  expect(Object.keys(acts({ roles: ['engineer'] }))).not.toContain('approve');
  expect(acts({ roles: ['admin'] })).toEqual({});
});

test('lets a draft be edited and submitted, and nothing else be done with it', () => {
  const may = acts({ state: 'draft' });
  expect(may).toMatchObject({ edit: null, submit: null });
  for (const act of ['recall', 'tick', 'remark', 'return', 'approve', 'issue', 'withdraw', 'start-next-revision'] as const) {
    expect(may[act]).toMatch(/^The /);
  }
});

test('says what is left of a check', () => {
  expect(acts({ state: 'in check', tickedCount: 1, openRemarkCount: 1 }).approve).toBe('2 cables to look at, 1 remark open.');
  expect(acts({ state: 'in check', tickedCount: 2 }).approve).toBe('1 cable to look at.');
  expect(acts({ state: 'in check' }).approve).toBeNull();
});

test('does not offer the check of own work, however complete the check is', () => {
  const may = acts({ state: 'in check', ownWork: 'You prepared part of this revision, so someone else must check it.' });
  for (const act of ['tick', 'remark', 'return', 'approve'] as const) expect(may[act]).toContain('someone else must check it');
});

test('lets only the author or the deputy submit, recall, issue and withdraw', () => {
  expect(acts({ isAuthorOrDeputy: false }).submit).toContain('author');
  expect(acts({ state: 'in check', isAuthorOrDeputy: false }).recall).toContain('author');
  expect(acts({ state: 'approved', isAuthorOrDeputy: false }).issue).toContain('author');
  expect(acts({ state: 'issued', isAuthorOrDeputy: false }).withdraw).toContain('author');
});

test('waits for the PDF before it offers to issue', () => {
  expect(acts({ state: 'approved', pdfReady: false }).issue).toContain('rendered');
  expect(acts({ state: 'approved' }).issue).toBeNull();
});

test('starts the next revision from the latest issued or withdrawn one only', () => {
  expect(acts({ state: 'issued' })['start-next-revision']).toBeNull();
  expect(acts({ state: 'withdrawn' })['start-next-revision']).toBeNull();
  expect(acts({ state: 'issued', isLatest: false })['start-next-revision']).toContain('later revision');
});
