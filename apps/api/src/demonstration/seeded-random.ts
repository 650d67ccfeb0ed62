/** A repeatable source of randomness for simulated data: the same seed gives the same survey. */
export interface SeededRandom {
  /** Uniform in [0, 1). */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** A version-4-shaped identifier. */
  uuid(): string;
}

/** Source: G. Marsaglia 2003, Xorshift RNGs, J. Stat. Softw. 8(14), the (13, 17, 5) generator; normals by Box and Muller 1958. */
export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0 || 1;
  const uniform = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
  const normal = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  const hex = (digits: number) => Array.from({ length: digits }, () => Math.floor(uniform() * 16).toString(16)).join('');
  const uuid = () => `${hex(8)}-${hex(4)}-4${hex(3)}-8${hex(3)}-${hex(12)}`;
  for (let i = 0; i < 20; i++) uniform();
  return { uniform, normal, uuid };
}
