/** Units and numbers alone, for pages that do not need the engine. */
export { decimalsOfUncertainty, formatInterval, formatNumber, formatWithUncertainty, parseNumber, type RoundedQuantity } from './format.ts';
export { fromSi, type Quantity, toSi, type Unit, type UnitSystem, unitOf } from './units.ts';
