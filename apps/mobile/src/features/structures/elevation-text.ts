import { readNumber } from '../../lib/read-number.ts';

interface Vertex {
  x: number;
  z: number;
}

/** Polylines as they are pasted from a spreadsheet: x and z a line, an empty line between two. */
export function linesAsText(lines: readonly (readonly Vertex[])[]): string {
  return lines.map((line) => line.map(({ x, z }) => `${x} ${z}`).join('\n')).join('\n\n');
}

/** The same back again; null where a line does not hold two numbers. */
export function readLines(text: string): Vertex[][] | null {
  const blocks = text.trim() === '' ? [] : text.trim().split(/\n\s*\n/);
  const lines = blocks.map((block) => block.split('\n').map(readVertex));
  return lines.flat().includes(null) ? null : (lines as Vertex[][]);
}

function readVertex(row: string): Vertex | null {
  const [x, z, ...rest] = row
    .trim()
    .split(/[\t; ]+/)
    .map(readNumber);
  return x === null || x === undefined || z === null || z === undefined || rest.length > 0 ? null : { x, z };
}
