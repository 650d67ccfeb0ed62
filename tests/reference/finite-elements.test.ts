import { type Cable, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';
import { seededRandom } from '../core/seeded-random.ts';
import { elementFrequencies } from './finite-elements.ts';

const random = seededRandom(31);
const count = process.env.STRANDNOTE_CAMPAIGN === 'full' ? 200 : 60;

/** A cable as random as cables get: short or slender, any ends, with or without sag, masses and supports. */
function randomCable() {
  const length = random.uniform(5, 150);
  const massPerLength = random.uniform(5, 150);
  const tension = massPerLength * random.uniform(40, 250) ** 2;
  const xi = Math.exp(random.uniform(Math.log(6), Math.log(150)));
  const bendingStiffness = (tension * length ** 2) / xi ** 2;
  const end = () =>
    [0, Number.POSITIVE_INFINITY, Math.exp(random.uniform(-2, 3)) * Math.sqrt(tension * bendingStiffness)][random.integer(3)]!;
  const ends: [number, number] = [end(), end()];
  const place = () => random.uniform(0.05, 0.95) * length;
  const masses = random.integer(2) === 0 ? [] : [{ position: place(), mass: random.uniform(0.01, 0.3) * massPerLength * length }];
  const supports = random.integer(2) === 0 ? [] : [{ position: place(), stiffness: (random.uniform(0.1, 30) * tension) / length }];
  const sags = random.integer(2) === 0;
  const axialStiffness = tension * random.uniform(100, 2000);
  const inclination = random.uniform(0, 1.2);
  const slope = (massPerLength * 9.80665 * Math.cos(inclination)) / tension;
  const sagStiffness = sags ? (slope ** 2 * axialStiffness) / (length * (1 + (slope * length) ** 2 / 8)) : 0;
  const cable: Cable = {
    length,
    massPerLength,
    ends: [endOf(ends[0]), endOf(ends[1])],
    ...(sags ? { axialStiffness, inclination } : {}),
    attachments: [
      ...masses.map((lump) => ({ kind: 'mass' as const, ...lump })),
      ...supports.map((lump) => ({ kind: 'support' as const, ...lump })),
    ],
  };
  return { cable, elements: { length, massPerLength, tension, bendingStiffness, ends, masses, supports, sagStiffness } };
}

function endOf(stiffness: number): 'clamped' | { rotationalStiffness: number } {
  return Number.isFinite(stiffness) ? { rotationalStiffness: stiffness } : 'clamped';
}

test(`${count} random cables have the frequencies of their finite elements, none missed`, { timeout: 600_000 }, () => {
  let worst = 0;
  for (let i = 0; i < count; i++) {
    const { cable, elements } = randomCable();
    const { tension, bendingStiffness } = elements;
    const exact = naturalFrequencies(cable, { tension, bendingStiffness }, 6);
    const approximate = elementFrequencies(elements, 6);
    exact.forEach((frequency, n) => {
      worst = Math.max(worst, Math.abs(approximate[n]! / frequency - 1));
    });
  }
  expect(worst).toBeLessThan(2e-4);
});
