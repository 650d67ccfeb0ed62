import { cablePlanes, type ElevationFigure, elevation, zoneStyle } from '@strandnote/core/drawing';
import type { FrozenCable } from '@strandnote/core/report-content';
import { drawFigure } from './draw-figure.ts';
import { type Report, zoneCounts, zoneOfCable } from './report-input.ts';
import type { Sheet } from './sheet.ts';
import { styles, type TextStyle } from './text-layout.ts';
import { counted, listed, zoneWords } from './words.ts';

/** Points on paper for a unit of the drawing: its lines are made for a screen. */
const scale = 0.72;
const label: TextStyle = { face: 'figures', size: 6.5, leading: 1, pigment: 'ink' };

type Drawn = FrozenCable & { lowerAnchor: NonNullable<FrozenCable['lowerAnchor']>; upperAnchor: NonNullable<FrozenCable['upperAnchor']> };

/**
 * The elevation of the structure, each plane of cables by itself, every cable drawn by its zone.
 *
 * @param maxHeight of all planes together, in points
 */
export function setElevation(report: Report, { maxHeight }: { maxHeight: number }): void {
  const { sheet, content } = report;
  const drawn = content.cables.filter((cable): cable is Drawn => cable.lowerAnchor !== null && cable.upperAnchor !== null);
  if (drawn.length === 0) return;
  const planes = cablePlanes(drawn.map((cable) => ({ cable, y: cable.lowerAnchor.y })));
  for (const { cables } of planes)
    setPlane(
      report,
      cables.map(({ cable }) => cable),
      Math.max(70, maxHeight / planes.length),
    );
  const without = content.cables.length - drawn.length;
  if (without > 0) {
    sheet.paragraph(
      `${counted(without, 'cable has', 'cables have')} no coordinates of anchors in the registry and ${without === 1 ? 'is' : 'are'} not drawn.`,
      styles.note,
    );
  }
}

function setPlane({ sheet, content, rows }: Report, cables: readonly Drawn[], maxHeight: number): void {
  const { deck, supports } = content.structure.elevation ?? { deck: [], supports: [] };
  const figure = elevation(
    {
      deck,
      supports,
      cables: cables.map((cable) => ({
        id: cable.id,
        reference: cable.reference,
        lower: cable.lowerAnchor,
        upper: cable.upperAnchor,
        zone: zoneOfCable(cable),
      })),
    },
    { width: sheet.width / scale, maxHeight: maxHeight / scale },
  );
  const height = Math.max(figure.height * scale, footOfReferences(sheet, figure));
  sheet.need(height + 20);
  const names = cables.map(({ reference }) => reference);
  sheet.tag('Caption', {}, () => {
    sheet.textAt(`Elevation by zone, ${names.length > 1 ? `${names[0]} to ${names.at(-1)}` : names[0]}`, sheet.left, sheet.y, styles.head);
  });
  sheet.y += 10;
  const own = rows.filter(({ cable }) => cables.includes(cable as Drawn));
  const alt = `Elevation of ${counted(cables.length, 'cable')}: ${listed(zoneCounts(own).map(({ zone, count }) => `${count} ${zoneWords[zone]}`))}.`;
  sheet.tag('Figure', { alt, bbox: [sheet.left, sheet.y, sheet.room.right, sheet.y + height] }, () => {
    drawFigure(sheet.doc, sheet.faces, figure, { x: sheet.left, y: sheet.y, scale });
    drawReferences(sheet, figure);
  });
  sheet.y += height + 8;
}

/** How far below the top of the drawing the longest name of a cable reaches. */
function footOfReferences({ faces }: Sheet, { lines }: ElevationFigure): number {
  return Math.max(
    ...lines.map(({ reference, y1, y2 }) => Math.max(y1, y2) * scale + 5 + faces.widthOf(reference, 'figures-strong', label.size)),
  );
}

/** The name of every cable beside its lower anchor, upright, as far as there is room; of those that want a look always. */
function drawReferences(sheet: Sheet, figure: ElevationFigure): void {
  const { doc } = sheet;
  const anchors = figure.lines
    .map(({ reference, zone, x1, y1, x2, y2 }) => ({
      reference,
      flagged: zoneStyle(zone).sign !== null,
      x: y1 > y2 ? x1 : x2,
      y: Math.max(y1, y2),
    }))
    .toSorted((a, b) => Number(b.flagged) - Number(a.flagged) || a.x - b.x);
  const taken: number[] = [];
  for (const { reference, flagged, x, y } of anchors) {
    const at = sheet.left + x * scale;
    if (taken.some((other) => Math.abs(other - at) < label.size + 1)) continue;
    taken.push(at);
    const top = sheet.y + y * scale + 5;
    doc.save();
    doc.rotate(90, { origin: [at, top] });
    sheet.textAt(reference, at, top - label.size / 2, flagged ? { ...label, face: 'figures-strong' } : label);
    doc.restore();
  }
}
