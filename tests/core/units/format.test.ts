import {
  decimalsOfUncertainty,
  formatInterval,
  formatNumber,
  formatWithUncertainty,
  fromSi,
  parseNumber,
  type Quantity,
  toSi,
} from '@strandnote/core';
import fc from 'fast-check';
import { expect, test } from 'vitest';

test('conversions are exact by definition and go both ways', () => {
  expect(toSi(1, 'force', 'us')).toBeCloseTo(4448.2216152605, 10);
  expect(toSi(1, 'mass-per-length', 'us')).toBeCloseTo(1.488164, 6);
  expect(toSi(212, 'temperature', 'us')).toBeCloseTo(100, 10);
  expect(toSi(9, 'temperature-difference', 'us')).toBeCloseTo(5, 12);
  const quantities: Quantity[] = [
    'force',
    'length',
    'small-length',
    'mass-per-length',
    'temperature',
    'area',
    'modulus',
    'bending-stiffness',
    'angle',
  ];
  fc.assert(
    fc.property(
      fc.constantFrom(...quantities),
      fc.constantFrom('si', 'us'),
      fc.double({ min: -1e6, max: 1e6, noNaN: true }),
      (quantity, system, value) => {
        expect(Math.abs(fromSi(toSi(value, quantity, system), quantity, system) - value)).toBeLessThan(1e-9 * (1 + Math.abs(value)));
      },
    ),
  );
});

// JCGM 100:2008, 7.2.6: at most two significant figures of U, the value to the same place.
test.each([
  [3456789, 21345, 'si', '3\u2009457 ± 21 kN'],
  [3456789, 213450, 'si', '3\u2009460 ± 210 kN'],
  [3456789, 9960, 'si', '3\u2009457 ± 10 kN'],
  [3456789, 996, 'si', '3\u2009456.8 ± 1.0 kN'],
  [3456789, 21345, 'us', '777.1 ± 4.8 kip'],
] as const)('%d N ± %d N is written together (%s)', (value, uncertainty, system, text) => {
  expect(formatWithUncertainty(value, uncertainty, 'force', system).text).toBe(text);
});

test('numbers have thin spaces and a real minus sign, and zero has none', () => {
  expect(formatNumber(-1234567.891, 2)).toBe('\u22121\u2009234\u2009567.89');
  expect(formatNumber(-0.0004, 2)).toBe('0.00');
  expect(formatNumber(Number.NaN, 2)).toBe('–');
  expect(decimalsOfUncertainty(0.0123)).toBe(3);
  expect(formatInterval([3.41e6, 3.49e6], 'force', 'si')).toEqual({ low: '3\u2009410', high: '3\u2009490', symbol: 'kN' });
});

test.each([
  ['12,5', 12.5],
  ['1 234,5', 1234.5],
  ['1\u2009234.5', 1234.5],
  ['1,234.5', 1234.5],
  ['1.234,5', 1234.5],
  ['1.234.567', 1234567],
  ["1'234", 1234],
  ['\u22123.2', -3.2],
  ['2e3', 2000],
])('reads %s', (text, value) => {
  expect(parseNumber(text)).toEqual({ ok: true, value });
});

test.each([
  ['', 'empty'],
  ['abc', 'not-a-number'],
  ['1,2,3', 'ambiguous'],
  ['1e999', 'not-a-number'],
])('says why “%s” is no number', (text, code) => {
  const parsed = parseNumber(text);
  expect(parsed).toMatchObject({ ok: false, code });
  expect(!parsed.ok && parsed.message.endsWith('.')).toBe(true);
});
