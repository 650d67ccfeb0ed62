import type { Quantity } from '@strandnote/core/units';

/** How a quantity is said in the person's units: `show` of `useUnits()`. */
export type ShowQuantity = (si: number | null, kind: Quantity, decimals?: number) => string;
