import { type Figure, type Mark, type Place, polylinePath } from './figure.ts';
import { type DrawnZone, zoneStyle } from './zone-style.ts';

/** A point of the structure's own axes: x along, z up (m). */
export interface ElevationPoint {
  x: number;
  z: number;
}

export interface ElevationCable {
  id: string;
  reference: string;
  lower: ElevationPoint;
  upper: ElevationPoint;
  zone: DrawnZone;
}

export interface ElevationInput {
  deck: readonly ElevationPoint[];
  supports: readonly (readonly ElevationPoint[])[];
  cables: readonly ElevationCable[];
}

/** Where a cable's line lies on the sheet. */
export interface ElevationLine {
  id: string;
  reference: string;
  zone: DrawnZone;
  x1: number;
  y1: number;
  x2: number;
  y2: number;
}

export interface ElevationFigure extends Figure {
  lines: ElevationLine[];
}

const margin = 12;

/**
 * The elevation: deck and supports in heavy ink, each cable as a line whose form tells its zone, a sign at those that need a look.
 * The scale is the same along and up.
 *
 * @param input deck, supports and cable anchors (m)
 * @param sheet width to fill and largest height
 * @returns the display list, with the place of each cable's line for touch; height as it comes out
 */
export function elevation(input: ElevationInput, sheet: { width: number; maxHeight: number }): ElevationFigure {
  const points = [...input.deck, ...input.supports.flat(), ...input.cables.flatMap((cable) => [cable.lower, cable.upper])];
  if (points.length === 0) return { width: sheet.width, height: 0, marks: [], lines: [] };
  const { place, height } = fitToSheet(points, sheet);
  const lines = input.cables.map((cable): ElevationLine => {
    const [lower, upper] = [place(cable.lower), place(cable.upper)];
    return { id: cable.id, reference: cable.reference, zone: cable.zone, x1: lower.x, y1: lower.y, x2: upper.x, y2: upper.y };
  });
  // Those that need a look are drawn last, over the others.
  const byWeight = lines.toSorted((a, b) => zoneStyle(a.zone).line.width - zoneStyle(b.zone).line.width);
  const marks: Mark[] = [
    ...input.supports.map((support) => heavy(support.map(place), 5)),
    heavy(input.deck.map(place), 4),
    ...byWeight.map(({ x1, y1, x2, y2, zone }): Mark => ({ kind: 'line', x1, y1, x2, y2, stroke: zoneStyle(zone).line })),
    ...signs(byWeight, sheet.width < 500 ? 14 : 18),
  ];
  return { width: sheet.width, height, marks: marks.filter((mark) => mark.kind !== 'path' || mark.d !== ''), lines };
}

/**
 * Cables in the planes in which they hang, by the place of their lower anchors across the structure: in one elevation the
 * planes would hide each other.
 *
 * @param cables anything with an anchor's place across, y (m)
 * @param apart how far planes are apart at least (m)
 * @returns groups from the smallest y on, each with its mean y
 */
export function cablePlanes<Cable extends { y: number }>(cables: readonly Cable[], apart = 2): { y: number; cables: Cable[] }[] {
  const planes: Cable[][] = [];
  let last: number | null = null;
  for (const cable of cables.toSorted((a, b) => a.y - b.y)) {
    if (last === null || cable.y - last > apart) planes.push([]);
    planes.at(-1)?.push(cable);
    last = cable.y;
  }
  return planes.map((plane) => ({ y: plane.reduce((sum, { y }) => sum + y, 0) / plane.length, cables: plane }));
}

function fitToSheet(points: readonly ElevationPoint[], { width, maxHeight }: { width: number; maxHeight: number }) {
  const [left, right] = [Math.min(...points.map(({ x }) => x)), Math.max(...points.map(({ x }) => x))];
  const [foot, top] = [Math.min(...points.map(({ z }) => z)), Math.max(...points.map(({ z }) => z))];
  const across = (width - 2 * margin) / Math.max(right - left, 1e-9);
  const up = (maxHeight - 2 * margin) / Math.max(top - foot, 1e-9);
  const scale = Math.max(0, Math.min(across, up));
  const indent = (width - scale * (right - left)) / 2;
  const place = ({ x, z }: ElevationPoint): Place => ({ x: indent + (x - left) * scale, y: margin + (top - z) * scale });
  return { place, height: 2 * margin + (top - foot) * scale };
}

function heavy(points: readonly Place[], width: number): Mark {
  return { kind: 'path', d: polylinePath(points), stroke: { pigment: 'ink', width } };
}

/** A sign on each line that needs one, where it covers no other sign: a third of the way up, or further along. */
function signs(lines: readonly ElevationLine[], size: number): Mark[] {
  const taken: Place[] = [];
  return lines.flatMap((line) => {
    const { sign } = zoneStyle(line.zone);
    if (sign === null) return [];
    const at =
      [0.33, 0.45, 0.57, 0.22, 0.69, 0.81].map((share) => along(line, share)).find((place) => isFree(place, taken, size)) ??
      along(line, 0.33);
    taken.push(at);
    return signMarks(sign, at, size, zoneStyle(line.zone).line.pigment);
  });
}

function along({ x1, y1, x2, y2 }: ElevationLine, share: number): Place {
  return { x: x1 + (x2 - x1) * share, y: y1 + (y2 - y1) * share };
}

function isFree(place: Place, taken: readonly Place[], size: number): boolean {
  return taken.every((other) => Math.abs(other.x - place.x) > size + 2 || Math.abs(other.y - place.y) > size + 2);
}

function signMarks(sign: string, { x, y }: Place, size: number, pigment: Extract<Mark, { kind: 'text' }>['pigment']): Mark[] {
  const width = sign.length > 1 ? size * 1.3 : size;
  return [
    { kind: 'rect', x: x - width / 2, y: y - size / 2, width, height: size, fill: 'sheet', stroke: { pigment, width: 1 } },
    { kind: 'text', x, y: y + size * 0.28, text: sign, size: size * 0.78, anchor: 'middle', pigment, font: 'text-strong' },
  ];
}
