import { ink } from './ink.ts';
import type { PdfDocument } from './pdf-document.ts';
import type { Line } from './text-layout.ts';

/** Prints a line that was laid out, from a place on its baseline. */
export function drawLine(doc: PdfDocument, line: Line, x: number, y: number): void {
  let at = x;
  for (const { text, face, size, rise, width, pigment } of line.pieces) {
    doc.font(face).fontSize(size).fillColor(ink[pigment]);
    doc.text(text, at, y - rise, { lineBreak: false, baseline: 'alphabetic' });
    at += width;
  }
}
