import { verificationCode } from '@strandnote/api/contract';
import { expect, test } from 'vitest';
import { makeVerificationCode, readVerificationCode } from '../../../apps/api/src/verification/verification-code.ts';

test('makes codes of the printed form that do not repeat', () => {
  const codes = Array.from({ length: 2000 }, makeVerificationCode);
  for (const code of codes) expect(verificationCode.safeParse(code).success).toBe(true);
  expect(new Set(codes).size).toBe(codes.length);
});

test('uses every letter of the alphabet', () => {
  const letters = new Set(Array.from({ length: 500 }, makeVerificationCode).join('').replace(/-/g, ''));
  expect([...letters].sort().join('')).toBe('0123456789ABCDEFGHJKMNPQRSTVWXYZ');
});

test('reads a code however it was typed', () => {
  expect(readVerificationCode('a1b2-c3d4-e5f6-g7h8')).toBe('A1B2-C3D4-E5F6-G7H8');
  expect(readVerificationCode(' A1B2C3D4 E5F6G7H8 ')).toBe('A1B2-C3D4-E5F6-G7H8');
  expect(readVerificationCode('OIL0-0000-0000-0000')).toBe('0110-0000-0000-0000');
});

test('tells what cannot be a code', () => {
  expect(readVerificationCode('A1B2-C3D4-E5F6')).toBeNull();
  expect(readVerificationCode('A1B2-C3D4-E5F6-G7HU')).toBeNull();
  expect(readVerificationCode('')).toBeNull();
});
