import { drawLine } from './draw-text.ts';
import { ink } from './ink.ts';
import type { Sheet } from './sheet.ts';
import { layoutLines, marked, styles, type TextStyle } from './text-layout.ts';

/** A part of a formula while it is laid out: a box with a baseline. */
interface Box {
  width: number;
  /** Above and below the baseline. */
  ascent: number;
  descent: number;
  draw: (x: number, y: number) => void;
}

/** A formula as it is written down: marked text, fractions, roots, what stands within parentheses, and rows of them. */
export type Formula = string | { over: Formula; under: Formula } | { root: Formula } | { within: Formula } | readonly Formula[];

const size = 10.5;
const style: TextStyle = { ...styles.body, size, leading: 1 };
/** Height of the bar of a fraction above the baseline: the middle of a minus sign. */
const axis = size * 0.3;

/** Sets a formula on a line of its own. */
export function setFormula(sheet: Sheet, formula: Formula): void {
  const box = layout(sheet, formula);
  const height = box.ascent + box.descent + 6;
  sheet.need(height);
  sheet.tag('Formula', { alt: spoken(formula) }, () => box.draw(sheet.left + 24, sheet.y + 3 + box.ascent));
  sheet.y += height;
}

/** The same in one line of text, for those who hear it. */
export function spoken(formula: Formula): string {
  if (typeof formula === 'string')
    return marked(formula)
      .map(({ text }) => text)
      .join('');
  if ('over' in formula) return `(${spoken(formula.over)}) / (${spoken(formula.under)})`;
  if ('root' in formula) return `√(${spoken(formula.root)})`;
  if ('within' in formula) return `(${spoken(formula.within)})`;
  return formula.map(spoken).join('');
}

function layout(sheet: Sheet, formula: Formula): Box {
  if (typeof formula === 'string') return words(sheet, formula);
  if ('over' in formula) return fraction(sheet, layout(sheet, formula.over), layout(sheet, formula.under));
  if ('root' in formula) return root(sheet, layout(sheet, formula.root));
  if ('within' in formula) return within(sheet, layout(sheet, formula.within));
  return row(formula.map((part) => layout(sheet, part)));
}

/** Spaces of a formula are kept as they stand: they part its equations. */
function words(sheet: Sheet, text: string): Box {
  const parts = text.split(/( {2,}|^ | $)/).filter((part) => part !== '');
  return row(parts.map((part) => (part.trim() === '' ? space(sheet, part.length) : stretch(sheet, part))));
}

function space({ faces }: Sheet, count: number): Box {
  return { width: count * faces.widthOf(' ', 'text', size), ascent: 0, descent: 0, draw: () => undefined };
}

function stretch(sheet: Sheet, text: string): Box {
  const [line] = layoutLines(sheet.faces, marked(text), style);
  return { width: line!.width, ascent: size * 0.78, descent: size * 0.26, draw: (x, y) => drawLine(sheet.doc, line!, x, y) };
}

function fraction(sheet: Sheet, over: Box, under: Box): Box {
  const width = Math.max(over.width, under.width) + 6;
  const gap = 2.2;
  return {
    width: width + 2,
    ascent: axis + gap + over.descent + over.ascent,
    descent: gap + under.ascent + under.descent - axis,
    draw: (x, y) => {
      over.draw(x + 1 + (width - over.width) / 2, y - axis - gap - over.descent);
      under.draw(x + 1 + (width - under.width) / 2, y - axis + gap + under.ascent);
      sheet.rule(x + 1, x + 1 + width, y - axis, 0.6, ink.ink);
    },
  };
}

function root(sheet: Sheet, inner: Box): Box {
  const hook = 7;
  return {
    width: inner.width + hook + 4,
    ascent: inner.ascent + 3,
    descent: inner.descent,
    draw: (x, y) => {
      const [top, foot] = [y - inner.ascent - 2, y + inner.descent];
      sheet.doc
        .moveTo(x, y - size * 0.25)
        .lineTo(x + 2, y - size * 0.32)
        .lineTo(x + 4, foot)
        .lineTo(x + hook, top)
        .lineTo(x + hook + inner.width + 3, top);
      sheet.doc.lineWidth(0.6).lineJoin('miter').strokeColor(ink.ink).stroke();
      inner.draw(x + hook + 1.5, y);
    },
  };
}

/** Parentheses as tall as what they hold. */
function within(sheet: Sheet, inner: Box): Box {
  const tall = inner.ascent + inner.descent;
  // The parentheses of STIX are as tall as their size, two tenths of it below the baseline.
  const parenthesis = { ...style, face: 'fallback', size: tall } as const;
  const width = sheet.faces.widthOf('(', 'fallback', tall) * narrow;
  const drawOne = (text: string, x: number, y: number) => {
    sheet.doc.save();
    sheet.doc.translate(x, y).scale(narrow, 1);
    sheet.textAt(text, 0, -tall / 2 - axis * 0.2, parenthesis);
    sheet.doc.restore();
  };
  return {
    width: inner.width + 2 * width + 1.5,
    ascent: inner.ascent,
    descent: inner.descent,
    draw: (x, y) => {
      const middle = y + (inner.descent - inner.ascent) / 2;
      drawOne('(', x, middle);
      inner.draw(x + width, y);
      drawOne(')', x + width + inner.width, middle);
    },
  };
}

/** A tall parenthesis is set narrower, or its strokes would be heavier than the letters. */
const narrow = 0.6;

function row(parts: readonly Box[]): Box {
  return {
    width: parts.reduce((sum, { width }) => sum + width, 0),
    ascent: Math.max(...parts.map(({ ascent }) => ascent)),
    descent: Math.max(...parts.map(({ descent }) => descent)),
    draw: (x, y) => {
      let at = x;
      for (const part of parts) {
        part.draw(at, y);
        at += part.width;
      }
    },
  };
}
