/** Random numbers that are the same in every run. */
export interface SeededRandom {
  /** Between two numbers, 0 and 1 unless given. */
  uniform(low?: number, high?: number): number;
  normal(): number;
  /** 0 … below − 1 */
  integer(below: number): number;
}

/** Mulberry32 with Box–Muller. */
export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return {
    uniform: (low = 0, high = 1) => low + (high - low) * next(),
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
    integer: (below) => Math.floor(below * next()),
  };
}
