/**
 * Nodes of the quadrature over what is not known of the ends.
 *
 * Two ends of one unknown fixity are a mixture: 60 % "both alike" on the diagonal, 40 % "each on its own" on a product grid.
 * Assuming alike ends alone covers too little when they differ on short cables; assuming independent ends alone covers too
 * little when they are alike. A known end collapses its axis to one node.
 *
 * Gauss–Legendre nodes by Newton on the Legendre polynomial (Abramowitz & Stegun 25.4.29).
 */
import type { EndCondition } from '../cable/cable.ts';

/** An end at one node: a fixity, or a rotational stiffness (N·m/rad) that keeps its value. */
export interface EndNode {
  fixity: number;
  /** null: the fixity counts. */
  stiffness: number | null;
}

/** A pair of ends and its share of the prior; shares sum to 1. */
export interface FixityNode {
  first: EndNode;
  second: EndNode;
  prior: number;
  /** Stands for the exchanged pair as well. */
  mirrored: boolean;
}

/** Nodes and weights on [0, 1], weights summing to 1. */
export interface Quadrature {
  nodes: number[];
  weights: number[];
}

// Rules are pure numbers; they are worked out once.
const rules = new Map<number, Quadrature>();

/** Gauss–Legendre rule of `count` nodes on [0, 1]. */
export function gaussLegendre(count: number): Quadrature {
  const known = rules.get(count);
  if (known) return known;
  const rule = legendreRule(count);
  rules.set(count, rule);
  return rule;
}

function legendreRule(count: number): Quadrature {
  const nodes: number[] = [];
  const weights: number[] = [];
  for (let i = 1; i <= count; i++) {
    let z = Math.cos((Math.PI * (i - 0.25)) / (count + 0.5));
    let slope = 1;
    for (let turn = 0; turn < 100; turn++) {
      let [previous, current] = [1, z];
      for (let k = 2; k <= count; k++) [previous, current] = [current, ((2 * k - 1) * z * current - (k - 1) * previous) / k];
      slope = (count * (z * current - previous)) / (z * z - 1);
      const step = current / slope;
      z -= step;
      if (Math.abs(step) < 1e-15) break;
    }
    nodes.push((1 - z) / 2);
    weights.push(1 / ((1 - z * z) * slope * slope));
  }
  return { nodes, weights };
}

/** Fixity range of an end as the prior takes it; a stiffness has none. */
export function fixityRange(end: EndCondition): [number, number] | null {
  if (end === 'unknown') return [0, 1];
  if (end === 'hinged') return [0, 0];
  if (end === 'clamped') return [1, 1];
  return 'fixity' in end ? end.fixity : null;
}

/** Whether nothing of the end is left to integrate over. */
export function isKnownEnd(end: EndCondition): boolean {
  const range = fixityRange(end);
  return range === null || range[0] === range[1];
}

/**
 * Prior share of ends that are alike: with a half, intervals of cables of ξ 20–50 whose ends were alike held the tension in 91.9 %
 * of 2400 simulated cases, with this share in 92.3 %, and no group of unlike ends suffered.
 */
const alikeShare = 0.6;

/**
 * The quadrature of a pair of ends.
 *
 * @param ends conditions of both ends
 * @param sharp whether the cable is short and its frequencies good, so that twice the nodes are needed
 * @param symmetric whether exchanging the ends changes nothing, as on a bare cable
 * @returns nodes with prior shares summing to 1
 */
export function fixityNodes(ends: readonly [EndCondition, EndCondition], sharp: boolean, symmetric = true): FixityNode[] {
  const alike = gaussLegendre(sharp ? 20 : 10);
  const own = gaussLegendre(sharp ? 10 : 6);
  const [first, second] = ends;
  const at = (u: number, v: number, prior: number, mirrored = false): FixityNode => ({
    first: endAt(first, u),
    second: endAt(second, v),
    prior,
    mirrored,
  });
  if (isKnownEnd(first) && isKnownEnd(second)) return [at(0, 0, 1)];
  if (isKnownEnd(first) || isKnownEnd(second)) return alike.nodes.map((u, i) => at(u, u, alike.weights[i]!));
  const grid = own.nodes.flatMap((u, i) => own.nodes.map((v, j) => ({ u, v, i, j, share: own.weights[i]! * own.weights[j]! })));
  const [a, b] = [fixityRange(first)!, fixityRange(second)!];
  if (a[0] !== b[0] || a[1] !== b[1]) return grid.map(({ u, v, share }) => at(u, v, share));
  const diagonal = alike.nodes.map((u, i) => at(u, u, alikeShare * alike.weights[i]!));
  if (!symmetric) return [...diagonal, ...grid.map(({ u, v, share }) => at(u, v, (1 - alikeShare) * share))];
  // Half the grid, off-diagonal shares doubled.
  const folded = grid
    .filter(({ i, j }) => i <= j)
    .map(({ u, v, i, j, share }) => at(u, v, (i === j ? 1 : 2) * (1 - alikeShare) * share, i !== j));
  return [...diagonal, ...folded];
}

/** The end at place u of its range, 0 to 1. */
function endAt(end: EndCondition, u: number): EndNode {
  const range = fixityRange(end);
  if (range === null) return { fixity: 0, stiffness: (end as { rotationalStiffness: number }).rotationalStiffness };
  return { fixity: range[0] + (range[1] - range[0]) * u, stiffness: null };
}
