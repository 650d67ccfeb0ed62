import { expect, test } from 'vitest';
import { nextAddress } from '../../apps/mobile/src/features/account/next-address.ts';

test('leads back to the page of the app that asked to sign in', () => {
  expect(nextAddress('/8c1f/structures/2?tab=cables')).toBe('/8c1f/structures/2?tab=cables');
});

test.each([
  '//elsewhere.example',
  '/\\elsewhere.example',
  'https://elsewhere.example',
  'javascript:alert(1)',
  '',
  undefined,
  ['/a'],
  '/sign-in?next=/a',
])('does not follow %j out of the app or in a circle', (next) => {
  expect(nextAddress(next)).toBe('/');
});
