import type { Figure, Mark, Stroke, TextFont } from '@strandnote/core/drawing';
import { drawLine } from './draw-text.ts';
import type { Face, Faces } from './faces.ts';
import { ink } from './ink.ts';
import type { PdfDocument } from './pdf-document.ts';
import { layoutLines } from './text-layout.ts';

const faceOf: Record<TextFont, Face> = { text: 'text', 'text-strong': 'text-strong', figures: 'figures', symbol: 'symbol' };

/**
 * Prints a drawing of the core: the same display list that the app shows.
 *
 * @param place of its upper left corner, and points for each unit of its sheet
 */
export function drawFigure(doc: PdfDocument, faces: Faces, figure: Figure, place: { x: number; y: number; scale?: number }): void {
  doc.save();
  doc.translate(place.x, place.y);
  if (place.scale !== undefined) doc.scale(place.scale);
  for (const mark of figure.marks) drawMark(doc, faces, mark);
  doc.restore();
}

function drawMark(doc: PdfDocument, faces: Faces, mark: Mark): void {
  if (mark.kind === 'text') {
    drawWords(doc, faces, mark);
    return;
  }
  if (mark.kind === 'line') doc.moveTo(mark.x1, mark.y1).lineTo(mark.x2, mark.y2);
  else if (mark.kind === 'path') doc.path(mark.d);
  else if (mark.kind === 'rect') doc.rect(mark.x, mark.y, mark.width, mark.height);
  else doc.circle(mark.cx, mark.cy, mark.r);
  paint(doc, mark.stroke, mark.kind === 'line' ? undefined : mark.fill);
}

function paint(doc: PdfDocument, stroke?: Stroke, fill?: keyof typeof ink): void {
  if (stroke) setStroke(doc, stroke);
  if (stroke && fill) doc.fillAndStroke(ink[fill], ink[stroke.pigment]);
  else if (fill) doc.fill(ink[fill]);
  else if (stroke) doc.stroke(ink[stroke.pigment]);
}

function setStroke(doc: PdfDocument, { width, dash, round }: Stroke): void {
  doc
    .lineWidth(width)
    .lineCap(round ? 'round' : 'butt')
    .lineJoin(round ? 'round' : 'miter');
  if (dash) doc.dash(dash as never, {});
  else doc.undash();
}

function drawWords(doc: PdfDocument, faces: Faces, { text, x, y, size, anchor, pigment, font }: Extract<Mark, { kind: 'text' }>): void {
  const [line] = layoutLines(faces, text, { face: faceOf[font], size, leading: 1, pigment });
  const shift = anchor === 'end' ? line!.width : anchor === 'middle' ? line!.width / 2 : 0;
  drawLine(doc, line!, x - shift, y);
}
