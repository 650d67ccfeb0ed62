import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonicalJson, sha256OfJson, sha256OfText } from '../../../apps/api/src/reports/canonical-json.ts';

test('does not depend on the order in which properties were written', () => {
  expect(canonicalJson({ b: [{ d: 1, c: 2 }], a: null })).toBe('{"a":null,"b":[{"c":2,"d":1}]}');
  expect(sha256OfJson({ b: 1, a: 2 })).toBe(sha256OfJson({ a: 2, b: 1 }));
});

test('sorts names by UTF-16 code units, as RFC 8785 (3.2.3) has it', () => {
  expect(canonicalJson({ '€': 1, '\r': 2, '\ufb33': 3, '1': 4, '😀': 5, '\u0080': 6, ö: 7 })).toBe(
    '{"\\r":2,"1":4,"\u0080":6,"ö":7,"€":1,"😀":5,"\ufb33":3}',
  );
});

test('writes numbers as RFC 8785 (3.2.2.3) has them', () => {
  expect(canonicalJson([333333333.3333333, 1e30, 4.5, 2e-3, 0.000000000000000000000000001, -0])).toBe(
    '[333333333.3333333,1e+30,4.5,0.002,1e-27,0]',
  );
});

test('leaves out what is undefined and refuses what JSON cannot carry', () => {
  expect(canonicalJson({ a: undefined, b: 1 })).toBe('{"b":1}');
  expect(() => canonicalJson({ a: Number.NaN })).toThrow(RangeError);
});

test('says what was said when it is parsed and written again', () => {
  fc.assert(
    fc.property(fc.jsonValue(), (value) => {
      expect(canonicalJson(JSON.parse(canonicalJson(value)))).toBe(canonicalJson(value));
    }),
  );
});

test('hashes the UTF-8 text (SHA-256 of “abc”, FIPS 180-4)', () => {
  expect(sha256OfText('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
});
