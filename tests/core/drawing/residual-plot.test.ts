import { residualPlot } from '@strandnote/core/drawing';
import { expect, test } from 'vitest';

const size = { width: 400, height: 180 };
const residuals = [
  { mode: 1, residual: 0.001, standardUncertainty: 0.002, used: true },
  { mode: 2, residual: -0.003, standardUncertainty: 0.002, used: true },
  { mode: 4, residual: 0.02, standardUncertainty: null, used: false },
];

test('frequencies above the model stand above zero, those below it under zero', () => {
  const { marks } = residualPlot(residuals, size);
  const dots = marks.filter((mark) => mark.kind === 'circle');
  const zero = marks.find(
    (mark) => mark.kind === 'line' && mark.y1 === mark.y2 && mark.stroke.pigment === 'ink' && mark.x1 > 50 && mark.y1 < 140,
  );
  if (zero?.kind !== 'line') throw new Error('no line at zero');
  expect(dots[0]!.cy).toBeLessThan(zero.y1);
  expect(dots[1]!.cy).toBeGreaterThan(zero.y1);
});

test('the band of a frequency reaches two standard uncertainties to each side, and is missing where none is known', () => {
  const { marks } = residualPlot(residuals, size);
  const bands = marks.filter((mark) => mark.kind === 'rect');
  const dots = marks.filter((mark) => mark.kind === 'circle');
  expect(bands).toHaveLength(2);
  // 0.4 % each way against the 0.4 % between the first two dots.
  expect(bands[0]!.height / (dots[1]!.cy - dots[0]!.cy)).toBeCloseTo(2, 6);
});

test('everything lies on the sheet', () => {
  const { marks } = residualPlot(residuals, size);
  for (const mark of marks) {
    if (mark.kind !== 'circle') continue;
    expect(mark.cy).toBeGreaterThanOrEqual(0);
    expect(mark.cy).toBeLessThanOrEqual(size.height);
  }
});

test('noise of a hundredth of a per cent does not fill the plot', () => {
  const { marks } = residualPlot([{ mode: 1, residual: 0.0001, used: true }], size);
  const ticks = marks.flatMap((mark) => (mark.kind === 'text' && mark.anchor === 'end' ? [mark.text] : []));
  expect(ticks).toContain('0.1');
  expect(residualPlot([], size).marks).toEqual([]);
});
