import { fitPlot } from '@strandnote/core/drawing';
import { expect, test } from 'vitest';

const size = { width: 500, height: 240 };

/** A stiff string with hinged ends: (f/n)² = 1.44 + 0.002 n². */
const hinged = [1, 2, 3, 4, 5, 6].map((mode) => ({ mode, frequency: mode * Math.sqrt(1.44 + 0.002 * mode ** 2) }));

function circles(figure: ReturnType<typeof fitPlot>) {
  return figure.marks.filter((mark) => mark.kind === 'circle');
}

test('a stiff string with hinged ends lies on a straight line', () => {
  const dots = circles(
    fitPlot(
      hinged.map((peak) => ({ ...peak, used: true })),
      [],
      size,
    ),
  );
  const slopes = dots.slice(1).map((dot, index) => (dot.cy - dots[index]!.cy) / (dot.cx - dots[index]!.cx));
  for (const slope of slopes) expect(slope).toBeCloseTo(slopes[0]!, 6);
});

test('a wrong mode number jumps out of the line', () => {
  const wrong = hinged.map((peak) => ({ mode: peak.mode === 6 ? 5 : peak.mode, frequency: peak.frequency, used: true }));
  const dots = circles(fitPlot(wrong, [], size));
  expect(Math.abs(dots[5]!.cy - dots[4]!.cy)).toBeGreaterThan(50);
});

test('a peak that was set aside is hollow', () => {
  const dots = circles(
    fitPlot(
      [
        { mode: 1, frequency: 1.2, used: true },
        { mode: 2, frequency: 2.5, used: false },
      ],
      [],
      size,
    ),
  );
  expect(dots.map((dot) => dot.fill)).toEqual(['ink', 'sheet']);
});

test('models go through their own frequencies and are told apart by their dashes', () => {
  const figure = fitPlot(
    hinged.map((peak) => ({ ...peak, used: true })),
    [
      { name: 'hinged ends', values: hinged },
      { name: 'taut string', values: hinged.map(({ mode }) => ({ mode, frequency: 1.2 * mode })) },
    ],
    size,
  );
  const paths = figure.marks.filter((mark) => mark.kind === 'path');
  const [first] = circles(figure);
  expect(paths[0]!.d.startsWith(`M${Math.round(first!.cx * 100) / 100} ${Math.round(first!.cy * 100) / 100}`)).toBe(true);
  expect(paths.map((path) => path.stroke?.dash ?? null)).toEqual([null, [6, 3]]);
  const words = figure.marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));
  expect(words).toContain('hinged ends');
  expect(words).toContain('taut string');
});

test('a single peak and no peak are drawn without a number that is not finite', () => {
  expect(fitPlot([], [], size).marks).toEqual([]);
  const { marks } = fitPlot([{ mode: 1, frequency: 1.2, used: true }], [], size);
  for (const mark of marks)
    for (const value of Object.values(mark)) if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
});
