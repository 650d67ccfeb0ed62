/**
 * SI inside, SI or US customary at the edges.
 *
 * Exact by definition: 1 ft = 0.3048 m, 1 in = 0.0254 m, 1 lb = 0.45359237 kg (international yard and pound agreement, 1959);
 * 1 lbf = 1 lb × 9.80665 m/s² (CGPM 1901); °F = °C × 9/5 + 32. Hence 1 kip = 4448.2216152605 N and 1 lb/ft = 1.488163943…
 * kg/m.
 */

/** Systems that a person may choose. */
export type UnitSystem = 'si' | 'us';

/** Quantities that are entered or shown. */
export type Quantity =
  | 'force'
  | 'length'
  | 'small-length'
  | 'mass-per-length'
  | 'temperature'
  | 'temperature-difference'
  | 'frequency'
  | 'area'
  | 'modulus'
  | 'bending-stiffness'
  | 'rotational-stiffness'
  | 'angle'
  | 'percent'
  | 'ratio'
  | 'count';

/** How a unit is written, and how it turns into SI: value in SI = shown × factor + offset. */
export interface Unit {
  symbol: string;
  factor: number;
  offset: number;
}

const foot = 0.3048;
const inch = 0.0254;
const pound = 0.45359237;
const kip = 1000 * pound * 9.80665;

function unit(symbol: string, factor: number, offset = 0): Unit {
  return { symbol, factor, offset };
}

const units: Record<Quantity, Record<UnitSystem, Unit>> = {
  force: { si: unit('kN', 1000), us: unit('kip', kip) },
  length: { si: unit('m', 1), us: unit('ft', foot) },
  'small-length': { si: unit('mm', 1e-3), us: unit('in', inch) },
  'mass-per-length': { si: unit('kg/m', 1), us: unit('lb/ft', pound / foot) },
  temperature: { si: unit('°C', 1), us: unit('°F', 5 / 9, -160 / 9) },
  'temperature-difference': { si: unit('°C', 1), us: unit('°F', 5 / 9) },
  frequency: { si: unit('Hz', 1), us: unit('Hz', 1) },
  area: { si: unit('mm²', 1e-6), us: unit('in²', inch ** 2) },
  modulus: { si: unit('GPa', 1e9), us: unit('ksi', kip / inch ** 2) },
  'bending-stiffness': { si: unit('kN·m²', 1000), us: unit('kip·ft²', kip * foot ** 2) },
  'rotational-stiffness': { si: unit('kN·m/rad', 1000), us: unit('kip·ft/rad', kip * foot) },
  angle: { si: unit('°', Math.PI / 180), us: unit('°', Math.PI / 180) },
  percent: { si: unit('%', 0.01), us: unit('%', 0.01) },
  ratio: { si: unit('', 1), us: unit('', 1) },
  count: { si: unit('', 1), us: unit('', 1) },
};

/**
 * The unit that a quantity is shown in.
 *
 * @param quantity what is shown
 * @param system chosen by the person
 * @returns symbol, factor and offset to SI (temperature: °C)
 * Source: see the head of this file.
 */
export function unitOf(quantity: Quantity, system: UnitSystem): Unit {
  return units[quantity][system];
}

/**
 * From a shown value to SI.
 *
 * @param shown value in the unit of the system
 * @returns value in SI (temperature: °C)
 */
export function toSi(shown: number, quantity: Quantity, system: UnitSystem): number {
  const { factor, offset } = units[quantity][system];
  return shown * factor + offset;
}

/**
 * From SI to the value that is shown.
 *
 * @param value SI (temperature: °C)
 * @returns value in the unit of the system
 */
export function fromSi(value: number, quantity: Quantity, system: UnitSystem): number {
  const { factor, offset } = units[quantity][system];
  return (value - offset) / factor;
}
