import { type IntervalBarValues, intervalBar, type Mark, type Pigment } from '@strandnote/core/drawing';
import { drawFigure } from './draw-figure.ts';
import type { Sheet } from './sheet.ts';

const example: IntervalBarValues = {
  zone: 'within',
  tension: 1.01,
  interval: [0.985, 1.04],
  bracket: { hinged: 1.035, clamped: 0.99 },
  lowerLimit: 0.95,
  upperLimit: 1.05,
  reference: 1,
  lastSurvey: 1.025,
};

/** Each part of a bar by itself, in the order of the key: two rows in three columns. */
const parts: readonly { words: string; column: 0 | 1 | 2; row: 0 | 1; marks: Mark[] }[] = [
  {
    words: 'agreed limits',
    column: 0,
    row: 0,
    marks: [{ kind: 'rect', x: 0, y: 1, width: 14, height: 8, fill: 'wash' }, upright(0, 'verdigris', 0.5), upright(14, 'verdigris', 0.5)],
  },
  { words: 'reference', column: 0, row: 1, marks: [upright(7, 'verdigris', 1.1, [2.4, 1.6])] },
  {
    words: '95 % interval and best value',
    column: 1,
    row: 0,
    marks: [{ kind: 'rect', x: 0, y: 3, width: 14, height: 4, fill: 'ink' }, upright(7, 'ink', 2)],
  },
  {
    words: 'both ends hinged … clamped',
    column: 1,
    row: 1,
    marks: [
      { kind: 'line', x1: 0, x2: 14, y1: 5, y2: 5, stroke: { pigment: 'muted', width: 1 } },
      upright(0, 'muted', 1, undefined, 3),
      upright(14, 'muted', 1, undefined, 3),
    ],
  },
  {
    words: 'last survey',
    column: 2,
    row: 0,
    marks: [{ kind: 'circle', cx: 7, cy: 5, r: 2.6, fill: 'sheet', stroke: { pigment: 'ink', width: 1.1 } }],
  },
];
const columnAt = [146, 232, 384];

/** What the parts of an interval bar are, beside an example of one. */
export function setBarKey(sheet: Sheet): void {
  sheet.need(36);
  const [x, y] = [sheet.left, sheet.y];
  const alt = `Key to the interval bars: ${parts.map(({ words }) => words).join(', ')}.`;
  sheet.tag('Figure', { alt, bbox: [x, y, sheet.room.right, y + 28] }, () => {
    drawFigure(sheet.doc, sheet.faces, intervalBar(example, { from: 0.93, to: 1.07 }, { width: 178, height: 34 }), { x, y, scale: 0.7 });
    for (const { words, column, row, marks } of parts) {
      const named: Mark = { kind: 'text', x: 19, y: 8, text: words, size: 8, anchor: 'start', pigment: 'ink', font: 'text' };
      drawFigure(
        sheet.doc,
        sheet.faces,
        { width: 14, height: 10, marks: [...marks, named] },
        { x: x + columnAt[column]!, y: y + row * 13 },
      );
    }
  });
  sheet.y += 32;
}

function upright(x: number, pigment: Pigment, width: number, dash?: readonly number[], from = 0): Mark {
  return { kind: 'line', x1: x, x2: x, y1: from, y2: 10 - from, stroke: dash ? { pigment, width, dash } : { pigment, width } };
}
