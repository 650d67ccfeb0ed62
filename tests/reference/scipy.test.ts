/**
 * The same inverse problems solved by SciPy (general-purpose, from Debian's python3-scipy): characteristic determinant in
 * place of phase closure, optimize.least_squares in place of the product's Gauss–Newton.
 */
import { execFileSync } from 'node:child_process';
import { type Cable, estimateTension, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';
import { seededRandom } from '../core/seeded-random.ts';

const program = `
import json, sys
import numpy as np
from scipy.optimize import brentq, least_squares

def determinant(x, xi, k1, k2):
    y = np.hypot(x, xi)
    e = np.exp(-y)
    s, c = np.sin(x), np.cos(x)
    # v = P sin + Q cos + R e^{-yz} + S e^{-y(1-z)}; rows: v(0), v(1), moment and rotation at both ends.
    rows = np.array([
        [0, 1, 1, e],
        [s, c, e, 1],
        [-k1 * x, -x * x, y * y + k1 * y, (y * y - k1 * y) * e],
        [-x * x * s + k2 * x * c, -x * x * c - k2 * x * s, (y * y - k2 * y) * e, y * y + k2 * y],
    ])
    return np.linalg.det(rows / np.abs(rows).max(axis=1, keepdims=True))

def frequencies(problem, tension, stiffness):
    L, m = problem['length'], problem['mass']
    xi = L * np.sqrt(tension / stiffness)
    k = [r * L / stiffness for r in problem['springs']]
    found = []
    for n in problem['modes']:
        # Rayleigh's interlacing: a spring moves a root from n pi up to at most one and a half steps of a clamped beam.
        low, high = n * np.pi * (1 - 1e-9), (n + 0.51) * np.pi
        grid = np.linspace(low, high, 60)
        values = [determinant(x, xi, *k) for x in grid]
        brackets = [(a, b) for a, b, fa, fb in zip(grid, grid[1:], values, values[1:]) if fa * fb <= 0]
        x = brentq(determinant, *brackets[0], args=(xi, *k), xtol=1e-14, rtol=1e-14)
        found.append(x / (2 * np.pi * L * L) * np.sqrt((stiffness * x * x + tension * L * L) / m))
    return np.array(found)

answers = []
for problem in json.load(sys.stdin):
    measured = np.array(problem['frequencies'])
    def residuals(p):
        return (np.log(measured) - np.log(frequencies(problem, np.exp(p[0]), np.exp(p[1])))) / problem['relative']
    fit = least_squares(residuals, [np.log(problem['start']), np.log(problem['stiffnessStart'])], xtol=1e-14, ftol=1e-14, gtol=1e-14, x_scale=[0.01, 0.1])
    answers.append(float(np.exp(fit.x[0])))
json.dump(answers, sys.stdout)
`;

const count = process.env.STRANDNOTE_CAMPAIGN === 'full' ? 50 : 12;

test(`${count} inverse problems have the tension that SciPy finds`, { timeout: 300_000 }, () => {
  const random = seededRandom(99);
  const problems = Array.from({ length: count }, () => {
    const length = random.uniform(20, 150);
    const mass = random.uniform(20, 120);
    const tension = mass * random.uniform(60, 250) ** 2;
    const xi = Math.exp(random.uniform(Math.log(8), Math.log(40)));
    const stiffness = (tension * length ** 2) / xi ** 2;
    const springs: [number, number] = [random.uniform(0, 6), random.uniform(0, 6)].map((s) => s * Math.sqrt(tension * stiffness)) as [
      number,
      number,
    ];
    const ends = springs.map((rotationalStiffness) => ({ rotationalStiffness })) as NonNullable<Cable['ends']>;
    const exact = naturalFrequencies({ length, massPerLength: mass, ends }, { tension, bendingStiffness: stiffness }, 6);
    const frequencies = exact.map((f) => f * (1 + 0.0005 * random.normal()));
    return { length, mass, tension, stiffness, springs, ends, frequencies };
  });
  const asked = problems.map((p) => ({
    ...p,
    modes: [1, 2, 3, 4, 5, 6],
    relative: 0.0005,
    start: 1.05 * p.tension,
    stiffnessStart: 0.9 * p.stiffness,
  }));
  const answers: number[] = JSON.parse(
    execFileSync('/usr/bin/python3', ['-c', program], { input: JSON.stringify(asked), encoding: 'utf8' }),
  );
  problems.forEach(({ length, mass, ends, stiffness, frequencies }, i) => {
    const cable: Cable = {
      length,
      massPerLength: mass,
      ends,
      bendingStiffness: stiffness,
      // A prior this wide adds nothing: both minimise the same sum of squares.
      relativeUncertainty: { length: 0.001, massPerLength: 0.001, bendingStiffness: 5 },
    };
    const peaks = frequencies.map((frequency, k) => ({ mode: k + 1, frequency, standardUncertainty: 0.0005 * frequency }));
    expect(Math.abs(estimateTension(cable, peaks).tension / answers[i]! - 1)).toBeLessThan(1e-6);
  });
});
