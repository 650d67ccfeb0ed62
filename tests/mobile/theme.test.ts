import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { type ColourName, type Colours, darkColours, lightColours } from '../../apps/mobile/src/theme/tokens.ts';

const themes: [string, Colours][] = [
  ['light', lightColours],
  ['dark', darkColours],
];

/** Contrast ratio of WCAG 2.2. */
function contrast(a: string, b: string): number {
  const luminance = (colour: string) => {
    const [r, g, bl] = [1, 3, 5].map((at) => {
      const channel = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
      return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * r! + 0.7152 * g! + 0.0722 * bl!;
  };
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (high! + 0.05) / (low! + 0.05);
}

test.each(themes)('everything read as text holds 7 : 1 on paper and sheet in the %s theme', (_, colours) => {
  const words: ColourName[] = ['ink', 'muted', 'verdigris', 'minium', 'ochre'];
  for (const word of words) {
    for (const ground of ['paper', 'sheet'] as const)
      expect(contrast(colours[word], colours[ground]), `${word} on ${ground}`).toBeGreaterThanOrEqual(7);
  }
  expect(contrast(colours.onVerdigris, colours.verdigris)).toBeGreaterThanOrEqual(7);
  expect(contrast(colours.ink, colours.wash)).toBeGreaterThanOrEqual(7);
  expect(contrast(colours.verdigris, colours.wash)).toBeGreaterThanOrEqual(7);
  // A button that cannot be used yet is still read.
  expect(contrast(colours.ink, colours.line)).toBeGreaterThanOrEqual(7);
});

test('the page that is shown before the app has started wears the colours of the themes', () => {
  const page = readFileSync(new URL('../../apps/mobile/public/index.html', import.meta.url), 'utf8').toUpperCase();
  for (const [, colours] of themes) {
    expect(page).toContain(`--PAPER: ${colours.paper}`);
    expect(page).toContain(`--FOCUS: ${colours.verdigris}`);
  }
});
