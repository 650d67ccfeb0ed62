import type { UnitSystem } from '@strandnote/api/contract';
import { createContext, type ReactNode, use, useMemo } from 'react';
import { displayUnit, formatNumber, fromSi, type QuantityKind } from './display-units.ts';

export interface Units {
  system: UnitSystem;
  /** "kN", "ft"; empty for a plain number. */
  symbol: (kind: QuantityKind) => string;
  /** The number alone, for a column whose head names the unit. */
  figure: (si: number, kind: QuantityKind, decimals?: number) => string;
  /** Number and unit. */
  show: (si: number | null, kind: QuantityKind, decimals?: number) => string;
  /** The number in the person's units, for drawings. */
  value: (si: number, kind: QuantityKind) => number;
}

function unitsOf(system: UnitSystem): Units {
  const figure: Units['figure'] = (si, kind, decimals) => {
    const unit = displayUnit(kind, system);
    return formatNumber(fromSi(si, unit), decimals ?? unit.decimals);
  };
  return {
    system,
    figure,
    symbol: (kind) => displayUnit(kind, system).symbol,
    show: (si, kind, decimals) => {
      if (si === null) return 'not stated';
      const { symbol } = displayUnit(kind, system);
      const space = symbol === '' || symbol === '°' ? '' : '\u00A0';
      return `${figure(si, kind, decimals)}${space}${symbol}`;
    },
    value: (si, kind) => fromSi(si, displayUnit(kind, system)),
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
