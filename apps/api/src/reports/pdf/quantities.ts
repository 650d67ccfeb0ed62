import {
  decimalsOfUncertainty,
  formatInterval,
  formatNumber,
  formatWithUncertainty,
  fromSi,
  type Quantity,
  type TensionEstimate,
  type UnitSystem,
  unitOf,
} from '@strandnote/core';
import type { FrozenInput } from '@strandnote/core/report-content';

/** Numbers as the report prints them, in the units that it is asked for. */
export class Quantities {
  readonly system: UnitSystem;

  constructor(system: UnitSystem) {
    this.system = system;
  }

  symbol(quantity: Quantity): string {
    return unitOf(quantity, this.system).symbol;
  }

  /** A value without its unit. Without an uncertainty it has four significant figures, and no fewer than its integer part. */
  figure(value: number, quantity: Quantity, uncertainty: number | null = null): string {
    const shown = fromSi(value, quantity, this.system);
    const spread = uncertainty === null ? 0 : uncertainty / unitOf(quantity, this.system).factor;
    return formatNumber(shown, spread > 0 ? decimalsOfUncertainty(spread) : significant(shown, 4));
  }

  /** An uncertainty without its unit, to two significant figures. */
  spread(uncertainty: number, quantity: Quantity): string {
    const shown = uncertainty / unitOf(quantity, this.system).factor;
    return formatNumber(shown, shown > 0 ? decimalsOfUncertainty(shown) : 0);
  }

  /** A value with its unit. */
  text(value: number, quantity: Quantity): string {
    const unit = this.symbol(quantity);
    return `${this.figure(value, quantity)}${unit === '°' ? '' : '\u00A0'}${unit}`;
  }

  temperature(celsius: number | null): string | null {
    return celsius === null ? null : `${formatNumber(fromSi(celsius, 'temperature', this.system), 0)}\u00A0${this.symbol('temperature')}`;
  }

  /** Tension and its expanded uncertainty, rounded to the same place; of an estimate that allows a single tension. */
  tension({ tension, expanded }: TensionEstimate): { value: string; uncertainty: string; symbol: string } {
    return formatWithUncertainty(tension, expanded.U, 'force', this.system);
  }

  /** The 95 % interval, "3 410 – 3 630", without its unit. */
  interval({ interval95 }: TensionEstimate): string {
    const { low, high } = formatInterval(interval95, 'force', this.system);
    return `${low} – ${high}`;
  }

  /** A tension that stands beside an estimate, rounded as the estimate is. */
  tensionBeside(value: number, { expanded }: TensionEstimate): string {
    return this.figure(value, 'force', expanded.U);
  }
}

/** The difference to a reference with the interval that it has, in per cent: "+11.6 ± 2.1". */
export function shareWithUncertainty(share: number, uncertainty: number): string {
  const decimals = Math.max(0, decimalsOfUncertainty(100 * uncertainty));
  return `${signed(100 * share, decimals)} ± ${formatNumber(100 * uncertainty, decimals)}`;
}

export function signed(value: number, decimals: number): string {
  const text = formatNumber(value, decimals);
  return value > 0 && /[1-9]/.test(text) ? `+${text}` : text;
}

export function percent(share: number, decimals = 1): string {
  return formatNumber(100 * share, decimals);
}

/** "95 %", "92.5 %": no more decimals than there are. */
export function roundPercent(share: number): string {
  const shown = Number((100 * share).toFixed(2));
  return `${formatNumber(shown, Number.isInteger(shown) ? 0 : Number.isInteger(shown * 10) ? 1 : 2)}\u00A0%`;
}

/** Decimals that show a value with so many significant figures. */
export function significant(value: number, figures: number): number {
  return value === 0 || !Number.isFinite(value) ? 0 : Math.max(0, figures - 1 - Math.floor(Math.log10(Math.abs(value))));
}

/** What kind of quantity an input is. */
export const quantityOfInput: Record<FrozenInput['quantity'], Quantity> = {
  'chord-length': 'length',
  'lower-deduction': 'length',
  'upper-deduction': 'length',
  'free-length': 'length',
  inclination: 'angle',
  'steel-area': 'area',
  modulus: 'modulus',
  'steel-mass': 'mass-per-length',
  'sheath-mass': 'mass-per-length',
  'grout-mass': 'mass-per-length',
  'mass-per-length': 'mass-per-length',
  'bending-stiffness-low': 'bending-stiffness',
  'bending-stiffness-high': 'bending-stiffness',
  'breaking-load': 'force',
};
