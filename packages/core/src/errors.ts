/** Why an input cannot be used. Codes are stable: screens, interface and tests rely on them. */
export type EstimationErrorCode =
  | 'not-finite'
  | 'out-of-range'
  | 'missing'
  | 'no-peaks'
  | 'mode-invalid'
  | 'mode-repeated'
  | 'frequencies-not-increasing'
  | 'too-few-peaks'
  | 'ends-unknown'
  | 'attachment-outside'
  | 'attachment-unknown'
  | 'cross-tied'
  | 'damper-position-missing'
  | 'not-converged';

/**
 * An input outside its physical range, or a question that these inputs cannot answer.
 *
 * `field` is the path of the input at fault as the caller wrote it (`length`, `peaks[2].mode`, `ends[0]`); `message` is a
 * full sentence saying what is wrong and what would be right, in SI units.
 */
export class EstimationError extends Error {
  readonly code: EstimationErrorCode;
  readonly field: string;

  constructor(code: EstimationErrorCode, field: string, message: string) {
    super(message);
    this.name = 'EstimationError';
    this.code = code;
    this.field = field;
  }
}

/** Throws unless `value` is a finite number. */
export function assertFinite(value: unknown, field: string): asserts value is number {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new EstimationError('not-finite', field, `${sentenceName(field)} must be a number, and it is ${shown(value)}.`);
  }
}

/** Throws unless `value` is finite and lies between the two bounds, the lower one excluded when `open`. */
export function assertRange(value: unknown, field: string, low: number, high: number, open = false): asserts value is number {
  assertFinite(value, field);
  if (value > high || value < low || (open && value === low)) {
    throw new EstimationError('out-of-range', field, `${sentenceName(field)} must be ${rangeWords(low, high, open)}, and it is ${value}.`);
  }
}

function rangeWords(low: number, high: number, open: boolean): string {
  const above = `${open ? 'above' : 'at least'} ${low}`;
  return high === Number.POSITIVE_INFINITY || high >= 1e15 ? above : `${above} and at most ${high}`;
}

/** "massPerLength" → "The mass per length"; paths keep their last name. */
function sentenceName(field: string): string {
  const words = field
    .replace(/\[(\d+)\]/g, (_, index: string) => ` ${Number(index) + 1} `)
    .replace(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`)
    .replace(/\./g, ' ')
    .replace(/\s+/g, ' ')
    .trim();
  return `The ${words}`;
}

function shown(value: unknown): string {
  if (value === undefined) return 'missing';
  if (value === null) return 'empty';
  return typeof value === 'number' ? String(value) : `a ${typeof value}`;
}
