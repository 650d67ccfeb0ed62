/**
 * Exact dynamic stiffness of a tensioned beam segment, and of a string segment.
 *
 * For EI v'''' − T v'' − mω² v = 0 on a length l, with nodal v, θ and forces, and α² − β² = T/EI:
 *
 *   Δ = 2αβ(1 − cos βl cosh αl) + (α² − β²) sin βl sinh αl
 *
 * All entries are scaled by 2e^{−αl}, so that nothing overflows on slender cables. A uniform force −w along the segment has
 * the constant particular solution v_0 = w/(mω²); with e = (1, 0, 1, 0) it acts on the nodes as v_0 K e.
 *
 * Source: dynamic stiffness of Euler–Bernoulli members under axial force (e.g. Clough & Penzien); re-derived and checked
 * against a direct solution of the boundary value problem.
 */

/** Entries of the symmetric 4 × 4 matrix over (v1, θ1, v2, θ2), and the scaled Δ. */
export interface SegmentStiffness {
  /** (v1, v1) = (v2, v2) */
  k11: number;
  /** (v1, θ1) = −(v2, θ2) */
  k12: number;
  /** (v1, v2) */
  k13: number;
  /** (v1, θ2) = −(θ1, v2) */
  k14: number;
  /** (θ1, θ1) = (θ2, θ2) */
  k22: number;
  /** (θ1, θ2) */
  k24: number;
  /** Δ scaled by 2e^{−αl}: zero at the frequencies of the segment held at both ends. */
  delta: number;
}

/** Room for one segment. */
export function emptySegment(): SegmentStiffness {
  return { k11: 0, k12: 0, k13: 0, k14: 0, k22: 0, k24: 0, delta: 1 };
}

/**
 * Fills in a beam segment.
 *
 * @param alpha α, 1/m
 * @param beta β, 1/m
 * @param length m
 * @param bendingStiffness N·m²
 */
export function beamSegment(alpha: number, beta: number, length: number, bendingStiffness: number, out: SegmentStiffness): void {
  const e = Math.exp(-alpha * length);
  const one = 2 * e;
  const ch = 1 + e * e;
  const sh = 1 - e * e;
  const s = Math.sin(beta * length);
  const c = Math.cos(beta * length);
  const aa = alpha * alpha;
  const bb = beta * beta;
  const ab = alpha * beta;
  const delta = 2 * ab * (one - c * ch) + (aa - bb) * s * sh;
  const n = (bendingStiffness * (aa + bb)) / delta;
  out.k11 = n * ab * (beta * s * ch + alpha * c * sh);
  out.k13 = -n * ab * (beta * s * one + alpha * sh);
  out.k22 = n * (alpha * s * ch - beta * c * sh);
  out.k24 = n * (beta * sh - alpha * s * one);
  out.k14 = n * ab * (ch - c * one);
  out.k12 = (bendingStiffness * ab * (2 * ab * s * sh - (aa - bb) * (one - c * ch))) / delta;
  out.delta = delta;
}

/** Fills in a string segment: only k11 and k13 are used. */
export function stringSegment(beta: number, length: number, tension: number, out: SegmentStiffness): void {
  const [s, c] = [Math.sin(beta * length), Math.cos(beta * length)];
  out.k11 = (tension * beta * c) / s;
  out.k13 = (-tension * beta) / s;
  out.delta = s;
}

/** How many frequencies of the segment held at both ends lie below this one (Wittrick & Williams 1971). */
export function heldFrequenciesBelow(beta: number, length: number, segment: SegmentStiffness, isString: boolean): number {
  const hinged = Math.max(0, Math.ceil((beta * length) / Math.PI) - 1);
  if (isString) return hinged;
  // A hinged segment is a held one with its rotations let go: negative pivots of their block are the difference.
  const second = segment.k22 - (segment.k24 * segment.k24) / segment.k22;
  return hinged - (segment.k22 < 0 ? 1 : 0) - (second < 0 ? 1 : 0);
}
