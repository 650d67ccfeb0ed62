import type { UnitSystem } from '@strandnote/api/contract';

/** What is entered or shown, in the units that people of the trade use for it. */
export type QuantityKind =
  | 'length'
  | 'small-length'
  | 'force'
  | 'mass-per-length'
  | 'frequency'
  | 'temperature'
  | 'temperature-difference'
  | 'area'
  | 'modulus'
  | 'bending-stiffness'
  | 'rotational-stiffness'
  | 'angle'
  | 'percent'
  | 'ratio'
  | 'count';

export interface DisplayUnit {
  symbol: string;
  /** SI = shown × factor + offset. */
  factor: number;
  offset: number;
  /** Decimals that show the value with about the accuracy of the trade. */
  decimals: number;
}

const foot = 0.3048;
const inch = 0.0254;
/** Pound-force (N): 0.45359237 kg at 9.80665 m/s², exact by definition. */
const poundForce = 0.45359237 * 9.80665;

function unit(symbol: string, factor: number, decimals: number, offset = 0): DisplayUnit {
  return { symbol, factor, decimals, offset };
}

function both(same: DisplayUnit): Record<UnitSystem, DisplayUnit> {
  return { si: same, us: same };
}

const displayUnits: Record<QuantityKind, Record<UnitSystem, DisplayUnit>> = {
  length: { si: unit('m', 1, 3), us: unit('ft', foot, 2) },
  'small-length': { si: unit('mm', 1e-3, 0), us: unit('in', inch, 2) },
  force: { si: unit('kN', 1e3, 0), us: unit('kip', 1e3 * poundForce, 1) },
  'mass-per-length': { si: unit('kg/m', 1, 2), us: unit('lb/ft', 0.45359237 / foot, 2) },
  frequency: both(unit('Hz', 1, 3)),
  temperature: { si: unit('°C', 1, 0), us: unit('°F', 5 / 9, 0, -160 / 9) },
  'temperature-difference': { si: unit('°C', 1, 0), us: unit('°F', 5 / 9, 0) },
  area: { si: unit('mm²', 1e-6, 0), us: unit('in²', inch ** 2, 3) },
  modulus: { si: unit('GPa', 1e9, 0), us: unit('ksi', (1e3 * poundForce) / inch ** 2, 0) },
  'bending-stiffness': { si: unit('kN·m²', 1e3, 1), us: unit('kip·ft²', 1e3 * poundForce * foot ** 2, 0) },
  'rotational-stiffness': { si: unit('kN·m/rad', 1e3, 0), us: unit('kip·ft/rad', 1e3 * poundForce * foot, 0) },
  angle: both(unit('°', Math.PI / 180, 1)),
  percent: both(unit('%', 0.01, 1)),
  ratio: both(unit('', 1, 2)),
  count: both(unit('', 1, 0)),
};

export function displayUnit(kind: QuantityKind, system: UnitSystem): DisplayUnit {
  return displayUnits[kind][system];
}

export function toSi(shown: number, { factor, offset }: DisplayUnit): number {
  return shown * factor + offset;
}

export function fromSi(value: number, { factor, offset }: DisplayUnit): number {
  return (value - offset) / factor;
}

const thinSpace = '\u2009';

/** A number as the product prints it: thin spaces between thousands, a real minus sign. */
export function formatNumber(value: number, decimals: number): string {
  const [whole = '0', fraction] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  const digits = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  return value < 0 && /[1-9]/.test(digits) ? `\u2212${digits}` : digits;
}
