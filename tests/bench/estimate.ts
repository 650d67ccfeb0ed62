/**
 * Times of the core beside SciPy doing the same fit at the same nodes. Printed, never tested.
 * Run by hand: node --import tsx tests/bench/estimate.ts (from the folder tests: node --import tsx bench/estimate.ts)
 */
import { execFileSync } from 'node:child_process';
import { type Cable, estimateTension, naturalFrequencies, numberModes } from '@strandnote/core';

function median(run: () => unknown, times: number): number {
  for (let i = 0; i < times / 4; i++) run();
  const durations = Array.from({ length: times }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  });
  return durations.sort((a, b) => a - b)[Math.floor(times / 2)]! * 1000;
}

function show(name: string, microseconds: number) {
  console.info(`${name.padEnd(64)} ${microseconds.toFixed(1).padStart(10)} µs`);
}

const tension = 3e6;
const bare: Cable = { length: 100, massPerLength: 60 };
const state = (xi: number) => ({ tension, bendingStiffness: (tension * 100 ** 2) / xi ** 2 });
const unequal: Cable = { ...bare, ends: ['clamped', { rotationalStiffness: 1e6 }] };
const sagging: Cable = { ...unequal, axialStiffness: 1.5e9, inclination: 0.4 };

show(
  'naturalFrequencies, 10 modes, unequal ends',
  median(() => naturalFrequencies(unequal, state(120), 10), 20_000),
);
show(
  'naturalFrequencies, 10 modes, unequal ends, sag',
  median(() => naturalFrequencies(sagging, state(120), 10), 5000),
);

for (const xi of [20, 60, 150, 400]) {
  for (const sag of [false, true]) {
    const cable = sag ? sagging : unequal;
    const peaks = naturalFrequencies(cable, state(xi), 8).map((frequency, i) => ({
      mode: i + 1,
      frequency,
      standardUncertainty: 0.002 * frequency,
    }));
    const told: Cable = {
      ...cable,
      ends: ['unknown', 'unknown'],
      bendingStiffness: state(xi).bendingStiffness,
      relativeUncertainty: { length: 0.003, massPerLength: 0.01, bendingStiffness: 0.3, axialStiffness: 0.05 },
    };
    show(
      `estimateTension, ends unknown, ξ = ${xi}${sag ? ', sag' : ''}`,
      median(() => estimateTension(told, peaks), 60),
    );
  }
}

const series = [1, 2, 3, 4, 6, 7, 8, 9].map((n) => n * Math.sqrt(1 + 0.001 * n * n));
const expected = { cable: { length: 100, massPerLength: 60 }, tension: { value: 4 * 60 * 100 ** 2, relativeUncertainty: 0.2 } };
show(
  'numberModes, 8 peaks, expected tension',
  median(() => numberModes(series, expected), 200),
);
show(
  'numberModes, 8 peaks',
  median(() => numberModes(series), 200),
);

const program = `
import time, numpy as np
from scipy.optimize import least_squares
n = np.arange(1, 9)
def model(p, eta):
    xi = 100 * np.exp((p[0] - p[1]) / 2)
    x = n * np.pi
    for _ in range(12):
        y = np.hypot(x, xi)
        x = n * np.pi + 2 * np.arctan2(eta * xi * x, (1 - eta) * (2 * x * x + xi * xi) + eta * xi * y)
    return np.log(x * np.hypot(x, xi)) + (p[1] - np.log(60)) / 2 - np.log(2 * np.pi * 1e4)
truth = np.array([np.log(3e6), np.log(3e6 * 1e4 / 60 ** 2)])
measured = model(truth, 0.5)
start = time.perf_counter()
for eta in np.linspace(0.02, 0.98, 31):
    least_squares(lambda p: np.append((measured - model(p, eta)) / 0.002, (p[1] - truth[1]) / 0.3), truth + [0.02, 0.1])
print((time.perf_counter() - start) * 1e6)
`;
show('SciPy least_squares at 31 nodes, ξ = 60', Number(execFileSync('/usr/bin/python3', ['-c', program], { encoding: 'utf8' })));
