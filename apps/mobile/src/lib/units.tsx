import type { UnitSystem } from '@strandnote/api/contract';
import { formatNumber, fromSi, type Quantity, unitOf } from '@strandnote/core/units';
import { createContext, type ReactNode, use, useMemo } from 'react';
import { decimalsOf } from './display-units.ts';

export interface Units {
  system: UnitSystem;
  /** "kN", "ft"; empty for a plain number. */
  symbol: (kind: Quantity) => string;
  /** The number alone, for a column whose head names the unit. */
  figure: (si: number, kind: Quantity, decimals?: number) => string;
  /** Number and unit. */
  show: (si: number | null, kind: Quantity, decimals?: number) => string;
  /** The number in the person's units, for drawings. */
  value: (si: number, kind: Quantity) => number;
}

function unitsOf(system: UnitSystem): Units {
  const figure: Units['figure'] = (si, kind, decimals) => {
    return formatNumber(fromSi(si, kind, system), decimals ?? decimalsOf(kind, system));
  };
  return {
    system,
    figure,
    symbol: (kind) => unitOf(kind, system).symbol,
    show: (si, kind, decimals) => {
      if (si === null) return 'not stated';
      const { symbol } = unitOf(kind, system);
      const space = symbol === '' || symbol === '°' ? '' : '\u00A0';
      return `${figure(si, kind, decimals)}${space}${symbol}`;
    },
    value: (si, kind) => fromSi(si, kind, system),
  };
}

const UnitsContext = createContext<Units>(unitsOf('si'));

/** The person's units within one firm; SI outside. */
export function UnitsProvider({ system, children }: { system: UnitSystem; children: ReactNode }) {
  const units = useMemo(() => unitsOf(system), [system]);
  return <UnitsContext value={units}>{children}</UnitsContext>;
}

export function useUnits(): Units {
  return use(UnitsContext);
}
