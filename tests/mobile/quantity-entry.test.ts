import { expect, test } from 'vitest';
import { enteredValue, problemOfEntry, type QuantityRules, readEntry } from '../../apps/mobile/src/lib/quantity-entry.ts';

const chord: QuantityRules = { name: 'The chord', kind: 'length', required: true, above: 0, to: 3000 };

test('keeps the text as it was typed beside the SI value', () => {
  expect(readEntry('104,250', 'length', 'si')).toEqual({ text: '104,250', si: 104.25 });
  expect(readEntry('100', 'length', 'us').si).toBeCloseTo(30.48, 12);
  expect(readEntry('7.37?', 'frequency', 'si')).toEqual({ text: '7.37?', si: null });
});

test('temperatures know their zero, and their differences do not', () => {
  expect(readEntry('32', 'temperature', 'us').si).toBeCloseTo(0, 12);
  expect(readEntry('212', 'temperature', 'us').si).toBeCloseTo(100, 12);
  expect(readEntry('9', 'temperature-difference', 'us').si).toBeCloseTo(5, 12);
});

test('a kip is 4448.2216152605 N and a pound per foot 1.48816394357 kg/m', () => {
  // From 1 lb = 0.45359237 kg, 1 ft = 0.3048 m and standard gravity 9.80665 m/s², exact by definition.
  expect(readEntry('1', 'force', 'us').si).toBeCloseTo(4448.2216152605, 9);
  expect(readEntry('1', 'mass-per-length', 'us').si).toBeCloseTo(1.48816394357, 10);
});

test('a stored value is shown with digits enough to be the same again', () => {
  for (const si of [0.0021, 104.25, 3_520_000]) {
    const shown = enteredValue(si, 'length', 'us');
    expect(readEntry(shown.text, 'length', 'us').si! / si).toBeCloseTo(1, 8);
  }
  expect(enteredValue(null, 'length', 'si')).toEqual({ text: '', si: null });
});

test('what is wrong is said in the units of the person', () => {
  expect(problemOfEntry(readEntry('', 'length', 'si'), chord, 'si')).toBe('The chord is missing.');
  expect(problemOfEntry(readEntry('0', 'length', 'si'), chord, 'si')).toBe('The chord must be more than 0 m.');
  expect(problemOfEntry(readEntry('104250', 'length', 'si'), chord, 'si')).toBe('The chord must be 3\u2009000 m or less.');
  expect(problemOfEntry(readEntry('104250', 'length', 'us'), chord, 'us')).toBe('The chord must be 9\u2009840 ft or less.');
  expect(problemOfEntry(readEntry('abc', 'length', 'si'), chord, 'si')).toMatch(/“abc” is not a number/);
  expect(problemOfEntry(readEntry('104.25', 'length', 'si'), chord, 'si')).toBeNull();
});

test('a typed zero is an answer and an empty field is not', () => {
  const sheath: QuantityRules = { name: 'The mass of the sheath', kind: 'mass-per-length', required: true, from: 0, to: 1000 };
  expect(problemOfEntry(readEntry('0', 'mass-per-length', 'si'), sheath, 'si')).toBeNull();
  expect(problemOfEntry(readEntry('', 'mass-per-length', 'si'), sheath, 'si')).toBe('The mass of the sheath is missing.');
  expect(problemOfEntry(readEntry('', 'mass-per-length', 'si'), { ...sheath, required: false }, 'si')).toBeNull();
});
