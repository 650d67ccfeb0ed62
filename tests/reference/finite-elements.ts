/**
 * Natural frequencies of a cable by Hermite beam elements with geometric stiffness: an independent way to the same answer.
 *
 * Source: Clough & Penzien, Dynamics of Structures (consistent mass, elastic and geometric stiffness of a beam element).
 */
import { CholeskyDecomposition, EigenvalueDecomposition, inverse, Matrix } from 'ml-matrix';

export interface ElementCable {
  length: number;
  massPerLength: number;
  tension: number;
  bendingStiffness: number;
  /** N·m/rad; Infinity clamped. */
  ends: [number, number];
  masses: { position: number; mass: number }[];
  supports: { position: number; stiffness: number }[];
  /** κ² EA/L_e, N/m³. */
  sagStiffness: number;
}

/** Nodes evenly spread, moved onto the attachments, and crowded into the boundary layers of the ends. */
function places(cable: ElementCable, elements: number): number[] {
  const layer = Math.min(cable.length / 10, 4 * Math.sqrt(cable.bendingStiffness / cable.tension));
  const special = [...cable.masses, ...cable.supports].map(({ position }) => position);
  const anchors = [0, layer, ...special.flatMap((p) => [p - layer / 3, p, p + layer / 3]), cable.length - layer, cable.length]
    .filter((p) => p >= 0 && p <= cable.length)
    .sort((a, b) => a - b)
    .filter((p, i, all) => i === 0 || p - all[i - 1]! > 1e-6 * cable.length);
  const within = anchors.slice(1).map((to, i) => ({ from: anchors[i]!, to }));
  return [
    0,
    ...within.flatMap(({ from, to }) => {
      const pieces = Math.max(4, Math.round((elements * (to - from)) / cable.length));
      return Array.from({ length: pieces }, (_, k) => from + ((to - from) * (k + 1)) / pieces);
    }),
  ];
}

/** Lowest natural frequencies, Hz. */
export function elementFrequencies(cable: ElementCable, count: number, elements = 40): number[] {
  const nodes = places(cable, elements);
  const size = 2 * nodes.length;
  const stiffness = Matrix.zeros(size, size);
  const mass = Matrix.zeros(size, size);
  const area = new Float64Array(size);
  for (let i = 1; i < nodes.length; i++) addElement(cable, nodes[i]! - nodes[i - 1]!, 2 * (i - 1), stiffness, mass, area);
  const nodeAt = (position: number) =>
    nodes.reduce((best, place, i) => (Math.abs(place - position) < Math.abs(nodes[best]! - position) ? i : best), 0);
  for (const { position, mass: lump } of cable.masses) bump(mass, 2 * nodeAt(position), lump);
  for (const { position, stiffness: spring } of cable.supports) bump(stiffness, 2 * nodeAt(position), spring);
  const held = new Set([0, size - 2]);
  [1, size - 1].forEach((row, end) => {
    if (Number.isFinite(cable.ends[end]!)) bump(stiffness, row, cable.ends[end]!);
    else held.add(row);
  });
  for (let a = 0; a < size; a++)
    for (let b = 0; b < size; b++) stiffness.set(a, b, stiffness.get(a, b) + cable.sagStiffness * area[a]! * area[b]!);
  const free = Array.from({ length: size }, (_, i) => i).filter((i) => !held.has(i));
  return eigenFrequencies(stiffness.selection(free, free), mass.selection(free, free), count);
}

function bump(matrix: Matrix, row: number, value: number) {
  matrix.set(row, row, matrix.get(row, row) + value);
}

function addElement(
  { bendingStiffness, tension, massPerLength }: ElementCable,
  l: number,
  at: number,
  stiffness: Matrix,
  mass: Matrix,
  area: Float64Array,
) {
  const elastic = [
    [12, 6 * l, -12, 6 * l],
    [6 * l, 4 * l * l, -6 * l, 2 * l * l],
    [-12, -6 * l, 12, -6 * l],
    [6 * l, 2 * l * l, -6 * l, 4 * l * l],
  ];
  const geometric = [
    [36, 3 * l, -36, 3 * l],
    [3 * l, 4 * l * l, -3 * l, -l * l],
    [-36, -3 * l, 36, -3 * l],
    [3 * l, -l * l, -3 * l, 4 * l * l],
  ];
  const consistent = [
    [156, 22 * l, 54, -13 * l],
    [22 * l, 4 * l * l, 13 * l, -3 * l * l],
    [54, 13 * l, 156, -22 * l],
    [-13 * l, -3 * l * l, -22 * l, 4 * l * l],
  ];
  const load = [l / 2, (l * l) / 12, l / 2, -(l * l) / 12];
  for (let a = 0; a < 4; a++) {
    area[at + a]! += load[a]!;
    for (let b = 0; b < 4; b++) {
      const k = (bendingStiffness / l ** 3) * elastic[a]![b]! + (tension / (30 * l)) * geometric[a]![b]!;
      stiffness.set(at + a, at + b, stiffness.get(at + a, at + b) + k);
      mass.set(at + a, at + b, mass.get(at + a, at + b) + ((massPerLength * l) / 420) * consistent[a]![b]!);
    }
  }
}

/** K φ = ω² M φ through the inverse of K, so that the lowest frequencies are the largest eigenvalues and keep their digits. */
function eigenFrequencies(stiffness: Matrix, mass: Matrix, count: number): number[] {
  // Scaled to unit diagonal of K: rotations and displacements differ by many orders.
  const scale = stiffness.diagonal().map((value) => 1 / Math.sqrt(value));
  const scaled = (matrix: Matrix) => {
    const result = matrix.clone();
    for (let a = 0; a < matrix.rows; a++)
      for (let b = 0; b < matrix.columns; b++) result.set(a, b, matrix.get(a, b) * (scale[a]! * scale[b]!));
    return result;
  };
  const flexibility = inverse(scaled(stiffness));
  const product = new CholeskyDecomposition(scaled(mass)).lowerTriangularMatrix;
  const symmetric = product.transpose().mmul(flexibility).mmul(product);
  const values = new EigenvalueDecomposition(symmetric, { assumeSymmetric: true }).realEigenvalues;
  return values
    .sort((a, b) => b - a)
    .slice(0, count)
    .map((value) => 1 / Math.sqrt(value) / (2 * Math.PI));
}
