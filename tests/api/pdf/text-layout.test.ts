import { expect, test } from 'vitest';
import { Faces } from '../../../apps/api/src/reports/pdf/faces.ts';
import { createPdf } from '../../../apps/api/src/reports/pdf/pdf-document.ts';
import { balancedLines, layoutLines, marked, styles } from '../../../apps/api/src/reports/pdf/text-layout.ts';

const doc = createPdf({ title: '', author: '', subject: '', keywords: '', createdAt: new Date(0), paper: 'a4' });
const faces = new Faces(doc);
const textOf = (lines: ReturnType<typeof layoutLines>) => lines.map(({ pieces }) => pieces.map(({ text }) => text).join(''));

test('a lone Greek letter is a symbol, a Greek word is a word', () => {
  expect(faces.stretches('With ξ = 50', 'text')).toEqual([
    { text: 'With ', face: 'text' },
    { text: 'ξ', face: 'symbol' },
    { text: ' = 50', face: 'text' },
  ]);
  expect(faces.stretches('Δήμος', 'text')).toEqual([{ text: 'Δήμος', face: 'fallback' }]);
});

test('every letter is printed in a face that has it, or as its code', () => {
  const text = 'Tension 3\u2009520 ± 110 kN, η ½ √2 ≤ ∞ ⁻¹ µ ℓ Ж 橋 🌉 \u200B\u0007x';
  for (const face of ['text', 'text-strong', 'figures', 'figures-strong', 'symbol', 'fallback'] as const) {
    const stretches = faces.stretches(text, face);
    for (const stretch of stretches)
      for (const letter of stretch.text) expect(`${letter} in ${stretch.face}: ${faces.has(letter, stretch.face)}`).toContain('true');
    expect(stretches.map((stretch) => stretch.text).join('')).toContain('Ж [U+6A4B] [U+1F309] x');
  }
});

test('lines are never wider than they may be, and lose no word', () => {
  const text = 'The residuals are 5.7 times as large as the stated uncertainties allow; look for a wrong mode number.';
  for (const width of [60, 100, 300]) {
    const lines = layoutLines(faces, text, styles.body, width);
    for (const line of lines) expect(line.width).toBeLessThanOrEqual(width + 0.01);
    expect(textOf(lines).join(' ')).toBe(text);
  }
});

test('a word longer than the line is cut, a number with thin spaces is not parted', () => {
  const hash = 'b97877b38998e46847cbfc4b8efe1b1ec0bfbc88c2b57af7828e0c217f4a358a';
  const cut = layoutLines(faces, hash, styles.figure, 100);
  expect(cut.length).toBeGreaterThan(2);
  expect(textOf(cut).join('')).toBe(hash);
  expect(textOf(layoutLines(faces, 'about 1\u2009234\u2009567 N', styles.body, 60))).toEqual(['about', '1\u2009234\u2009567 N']);
});

test('line breaks are kept, empty lines too', () => {
  expect(textOf(layoutLines(faces, 'one\n\ntwo three', styles.body, 500))).toEqual(['one', '', 'two three']);
});

test('a balanced title leaves no word alone', () => {
  const lines = textOf(balancedLines(faces, 'Cable tensions of Marrow Firth Crossing, autumn 2026', styles.title, 490));
  expect(lines).toHaveLength(2);
  expect(lines[1]!.length).toBeGreaterThan(15);
});

test('marks make symbols, subscripts and bold runs', () => {
  expect(marked('{f}_(n)² is *not* {x}^(2)')).toEqual([
    { text: 'f', face: 'symbol' },
    { text: 'n', script: 'sub', face: 'symbol' },
    { text: '² is ' },
    { text: 'not', face: 'text-strong' },
    { text: ' ' },
    { text: 'x', face: 'symbol' },
    { text: '2', script: 'sup' },
  ]);
});
