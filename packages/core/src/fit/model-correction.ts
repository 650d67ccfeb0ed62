/**
 * What sag and attachments add to ln f of the bare cable, inside the fit. Sag alone has its own short way (./sag-correction).
 *
 * Masses and supports: the exact frequencies of ../models/attachments, their shift and its derivatives by central differences,
 * taken anew whenever the state has moved and followed linearly between.
 */
import { type AttachedCable, attachedFrequencies, type LumpedAttachment, lumpedAttachments } from '../models/attachments.ts';
import { type EndForm, wavenumber } from '../models/end-rotation.ts';
import { type SagProperties, sagProperties, sagStiffnessOf } from '../models/sag.ts';
import type { FitProblem } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { setEndForm } from './node-fit.ts';
import type { ModelCorrection } from './node-workspace.ts';
import { emptyCorrection, sagCorrection } from './sag-correction.ts';

/** The correction of a problem; null for a bare cable without sag. */
export function modelCorrection(problem: FitProblem): ModelCorrection | null {
  const sag = sagProperties(problem.cable, problem.gravity);
  const inPlane = problem.peaks.some(({ plane }) => plane === 'in-plane');
  const lumps = lumpedAttachments(problem.cable);
  if (lumps.length > 0) return attachmentCorrection(problem, sag, lumps);
  return sag !== null && inPlane ? sagCorrection(problem, sag) : null;
}

/** How far (ln T, ln EI) may move before the frequencies with attachments are computed anew. */
const linearReach = { t: 1e-4, e: 0.03 };

function attachmentCorrection(problem: FitProblem, sag: SagProperties | null, lumps: LumpedAttachment[]): ModelCorrection {
  const { length, massPerLength, peaks } = problem;
  const out = emptyCorrection(peaks.length);
  const centre = { t: Number.NaN, e: Number.NaN, first: null as EndNode | null, second: null as EndNode | null };
  const value = new Float64Array(peaks.length);
  const planes = [...new Set(peaks.map(({ plane }) => plane))];
  const shiftAt = (t: number, e: number, one: EndNode, other: EndNode): Float64Array => {
    const [tension, bendingStiffness] = [Math.exp(t), Math.exp(e)];
    const xi = length * Math.exp((t - e) / 2);
    const [first, second]: [EndForm, EndForm] = [
      { a: 1, b: 0 },
      { a: 1, b: 0 },
    ];
    setEndForm(first, one, length, e, xi);
    setEndForm(second, other, length, e, xi);
    const cable: AttachedCable = { length, massPerLength, tension, bendingStiffness, first, second, attachments: lumps, sagStiffness: 0 };
    const shift = new Float64Array(peaks.length);
    for (const plane of planes) {
      const highest = Math.max(...peaks.filter((peak) => peak.plane === plane).map(({ mode }) => mode));
      const sagStiffness = plane === 'in-plane' && sag !== null ? sagStiffnessOf(sag, length, tension) : 0;
      const found = attachedFrequencies({ ...cable, sagStiffness }, highest);
      peaks.forEach(({ mode, plane: own }, i) => {
        if (own !== plane) return;
        const x = wavenumber(mode, xi, first, second);
        const bare = (x * Math.sqrt((bendingStiffness * (x * x + xi * xi)) / massPerLength)) / (length * length);
        shift[i] = Math.log(found[mode - 1]! / bare);
      });
    }
    return shift;
  };
  const evaluate = (t: number, e: number, first: EndNode, second: EndNode) => {
    const near = Math.abs(t - centre.t) < linearReach.t && Math.abs(e - centre.e) < linearReach.e;
    if (!near || centre.first !== first || centre.second !== second) {
      Object.assign(centre, { t, e, first, second });
      const h = 1e-4;
      value.set(shiftAt(t, e, first, second));
      const [tUp, tDown, eUp, eDown] = [
        shiftAt(t + h, e, first, second),
        shiftAt(t - h, e, first, second),
        shiftAt(t, e + h, first, second),
        shiftAt(t, e - h, first, second),
      ];
      for (let i = 0; i < peaks.length; i++) {
        out.byTension[i] = (tUp[i]! - tDown[i]!) / (2 * h);
        out.byStiffness[i] = (eUp[i]! - eDown[i]!) / (2 * h);
      }
    }
    for (let i = 0; i < peaks.length; i++) {
      out.shift[i] = value[i]! + out.byTension[i]! * (t - centre.t) + out.byStiffness[i]! * (e - centre.e);
    }
  };
  return { ...out, evaluate };
}
