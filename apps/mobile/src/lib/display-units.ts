import type { UnitSystem } from '@strandnote/api/contract';
import type { Quantity } from '@strandnote/core/units';

/** Decimals that show a value with about the accuracy of the trade, in SI and in US customary units. */
const decimals: Record<Quantity, Record<UnitSystem, number>> = {
  length: { si: 3, us: 2 },
  'small-length': { si: 0, us: 2 },
  force: { si: 0, us: 1 },
  'mass-per-length': { si: 2, us: 2 },
  frequency: { si: 3, us: 3 },
  temperature: { si: 0, us: 0 },
  'temperature-difference': { si: 0, us: 0 },
  area: { si: 0, us: 3 },
  modulus: { si: 0, us: 0 },
  'bending-stiffness': { si: 1, us: 0 },
  'rotational-stiffness': { si: 0, us: 0 },
  angle: { si: 1, us: 1 },
  percent: { si: 1, us: 1 },
  ratio: { si: 2, us: 2 },
  count: { si: 0, us: 0 },
};

export function decimalsOf(quantity: Quantity, system: UnitSystem): number {
  return decimals[quantity][system];
}
