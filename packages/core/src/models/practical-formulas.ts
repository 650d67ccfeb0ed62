/**
 * Formulas in use in practice, for comparison only: a reader sees what they would have said and why it differs.
 *
 * All are for clamped ends, with C = √(EI/(m L⁴)).
 *
 * Sources: Zui, Shinke & Namita 1996 (J. Struct. Eng. 122:651); Ren, Chen & Hu 2005 (Struct. Eng. Mech. 20:363). Their branches
 * jump at their limits (3.4 % at ξ = 17 in the first).
 */
import { checkString } from './taut-string.ts';

/** What a formula needs of the cable. */
export interface FormulaCable {
  /** m */
  length: number;
  /** kg/m */
  massPerLength: number;
  /** N·m², > 0 */
  bendingStiffness: number;
}

/** One formula's answer. */
export interface FormulaTension {
  id: 'zui-1' | 'zui-2' | 'zui-high' | 'ren';
  name: string;
  /** N */
  tension: number;
  /** The branch used, and whether its own ξ lies in its range. */
  note: string;
}

interface Branch {
  /** Range of ξ. */
  from: number;
  to: number;
  tension: number;
}

/** The branch whose answer lies in its own range; of branches that all miss, the one that misses least. */
function chooseBranch(
  branches: readonly Branch[],
  { length, bendingStiffness }: FormulaCable,
): { branch: Branch; inRange: boolean } | null {
  const judged = branches
    .filter(({ tension }) => tension > 0 && Number.isFinite(tension))
    .map((branch) => {
      const xi = length * Math.sqrt(branch.tension / bendingStiffness);
      return { branch, miss: xi < branch.from ? branch.from / xi : xi > branch.to ? xi / branch.to : 1 };
    });
  if (judged.length === 0) return null;
  const best = judged.reduce((a, b) => (b.miss < a.miss ? b : a));
  return { branch: best.branch, inRange: best.miss === 1 };
}

const endless = Number.POSITIVE_INFINITY;

function firstModeBranches({ length, massPerLength, bendingStiffness }: FormulaCable, frequency: number): Branch[] {
  const c = Math.sqrt(bendingStiffness / massPerLength) / length ** 2 / frequency;
  const string = 4 * massPerLength * (frequency * length) ** 2;
  return [
    { from: 17, to: endless, tension: string * (1 - 2.2 * c - 0.55 * c ** 2) },
    { from: 6, to: 17, tension: string * (0.865 - 11.6 * c ** 2) },
    { from: 0, to: 6, tension: string * (0.828 - 10.5 * c ** 2) },
  ];
}

function secondModeBranches({ length, massPerLength, bendingStiffness }: FormulaCable, frequency: number): Branch[] {
  const c = Math.sqrt(bendingStiffness / massPerLength) / length ** 2 / frequency;
  const string = massPerLength * (frequency * length) ** 2;
  return [
    { from: 60, to: endless, tension: string * (1 - 4.4 * c - 1.1 * c ** 2) },
    { from: 17, to: 60, tension: string * (1.03 - 6.33 * c - 1.58 * c ** 2) },
    { from: 0, to: 17, tension: string * (0.882 - 85 * c ** 2) },
  ];
}

function highModeBranch({ length, massPerLength, bendingStiffness }: FormulaCable, mode: number, frequency: number): Branch[] {
  const c = Math.sqrt(bendingStiffness / massPerLength) / length ** 2 / frequency;
  const string = (4 * massPerLength * (frequency * length) ** 2) / mode ** 2;
  return [{ from: 200, to: endless, tension: string * (1 - 2.2 * mode * c) }];
}

function renBranches({ length, massPerLength, bendingStiffness }: FormulaCable, frequency: number): Branch[] {
  const middle = 2 * length * frequency - (2.363 / length) * Math.sqrt(bendingStiffness / massPerLength);
  return [
    { from: 0, to: 18, tension: 3.432 * massPerLength * (length * frequency) ** 2 - (45.191 * bendingStiffness) / length ** 2 },
    { from: 18, to: 210, tension: middle > 0 ? massPerLength * middle ** 2 : Number.NaN },
    { from: 210, to: endless, tension: 4 * massPerLength * (length * frequency) ** 2 },
  ];
}

/**
 * What the practical formulas say of these peaks.
 *
 * @param cable length (m), mass per length (kg/m), bending stiffness (N·m²), all > 0
 * @param peaks numbered frequencies, Hz
 * @returns one answer (N) a formula that applies
 * @throws EstimationError `out-of-range` naming the field
 * Source: see the head of this file.
 */
export function practicalFormulas(cable: FormulaCable, peaks: readonly { mode: number; frequency: number }[]): FormulaTension[] {
  checkString(cable);
  const rows: FormulaTension[] = [];
  const add = (id: FormulaTension['id'], name: string, branches: Branch[]) => {
    const chosen = chooseBranch(branches, cable);
    if (chosen === null) return;
    const { from, to } = chosen.branch;
    const range = to === endless ? `ξ ≥ ${from}` : `ξ from ${from} to ${to}`;
    const note = `Clamped ends; branch for ${range}${chosen.inRange ? '' : ', outside which this cable lies'}.`;
    rows.push({ id, name, tension: chosen.branch.tension, note });
  };
  const first = peaks.find(({ mode }) => mode === 1);
  const second = peaks.find(({ mode }) => mode === 2);
  const highest = peaks.reduce<{ mode: number; frequency: number } | null>(
    (best, peak) => (peak.mode > (best?.mode ?? 2) ? peak : best),
    null,
  );
  if (first) add('zui-1', 'Zui et al. 1996, mode 1', firstModeBranches(cable, first.frequency));
  if (second) add('zui-2', 'Zui et al. 1996, mode 2', secondModeBranches(cable, second.frequency));
  if (highest) add('zui-high', `Zui et al. 1996, mode ${highest.mode}`, highModeBranch(cable, highest.mode, highest.frequency));
  if (first) add('ren', 'Ren et al. 2005, mode 1', renBranches(cable, first.frequency));
  return rows;
}
