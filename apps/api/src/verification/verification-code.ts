import { randomBytes } from 'node:crypto';

/** Digits and letters without I, L, O and U, which are mistaken for others or make words (D. Crockford's base 32). */
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/** A code of 80 random bits in four groups of four: too many to be found by trying. */
export function makeVerificationCode(): string {
  const letters = [...randomBytes(16)].map((byte) => alphabet[byte % alphabet.length]).join('');
  return letters.match(/.{4}/g)!.join('-');
}

/** The code that somebody typed or pasted, brought to the printed form; null when it cannot be one. */
export function readVerificationCode(typed: string): string | null {
  const letters = typed.toUpperCase().replace(/[\s-]/g, '').replace(/O/g, '0').replace(/[IL]/g, '1');
  if (letters.length !== 16 || [...letters].some((letter) => !alphabet.includes(letter))) return null;
  return letters.match(/.{4}/g)!.join('-');
}
