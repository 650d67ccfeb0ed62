import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readNumber } from '../../apps/mobile/src/lib/read-number.ts';

test.each([
  ['1.214', 1.214],
  ['1,214', 1.214],
  ['12,5', 12.5],
  [' 3 520 ', 3520],
  ['3\u2009520,5', 3520.5],
  ["3'520.5", 3520.5],
  ['1,234.5', 1234.5],
  ['1.234,5', 1234.5],
  ['1,234,567.8', 1234567.8],
  ['\u22124', -4],
  ['+4', 4],
  ['.5', 0.5],
  ['5.', 5],
  ['2e11', 2e11],
])('reads %j as %d', (text, value) => {
  expect(readNumber(text)).toBe(value);
});

test.each(['', '  ', 'abc', '1.2.3', '1,2,3', '7.37?', '12 kN', '1,23.5', '--1', 'Infinity', 'NaN', '1e999', '0x10'])(
  'refuses %j',
  (text) => {
    expect(readNumber(text)).toBeNull();
  },
);

test('reads back every number that is printed, with either decimal mark', () => {
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
      const printed = String(value);
      // Printed, −0 is 0.
      expect(readNumber(printed)).toBe(value + 0);
      expect(readNumber(printed.replace('.', ','))).toBe(value + 0);
    }),
  );
});
