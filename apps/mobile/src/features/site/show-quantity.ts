import type { QuantityKind } from '../../lib/display-units.ts';

/** How a quantity is said in the person's units: `show` of `useUnits()`. */
export type ShowQuantity = (si: number | null, kind: QuantityKind, decimals?: number) => string;
