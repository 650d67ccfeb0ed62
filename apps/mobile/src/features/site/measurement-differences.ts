import type { Measurement, ModalPeak, PutMeasurement } from '@strandnote/api/contract';
import type { ShowQuantity } from './show-quantity.ts';
import { dampingWords, excitationWords, planeWords } from './site-words.ts';

/** One thing that two people entered differently, in words. */
export interface Difference {
  what: string;
  mine: string;
  theirs: string;
}

/** Where two versions of a measurement differ, peak by peak and answer by answer. */
export function differencesOf(mine: PutMeasurement, theirs: Measurement, show: ShowQuantity): Difference[] {
  const [left, right] = [inWords(mine, show), inWords(theirs, show)];
  const keys = [...new Set([...left.keys(), ...right.keys()])];
  return keys
    .map((what) => ({ what, mine: left.get(what) ?? '–', theirs: right.get(what) ?? '–' }))
    .filter((difference) => difference.mine !== difference.theirs);
}

function inWords(entry: PutMeasurement | Measurement, show: ShowQuantity): Map<string, string> {
  const peaks = entry.peaks
    .toSorted((a, b) => a.mode - b.mode || a.plane.localeCompare(b.plane))
    .map((peak) => [`Mode ${peak.mode}, ${planeWords[peak.plane]}${peak.used ? '' : ', set aside'}`, peakWords(peak)] as const);
  return new Map([
    ...peaks,
    ['Lower damper', dampingWords[entry.lowerDamperState]],
    ['Upper damper', dampingWords[entry.upperDamperState]],
    ['Bushing', dampingWords[entry.bushingState]],
    ['Tied to another cable', entry.crossTied ? 'yes' : 'no'],
    ['Excitation', excitationWords[entry.excitation]],
    ['Sensor from the lower end', show(entry.sensorPosition, 'length')],
    ['Steel temperature', show(entry.steelTemperature, 'temperature', 1)],
    ['Note', entry.note || '–'],
  ]);
}

function peakWords({ frequency, standardUncertainty, used, setAsideReason }: ModalPeak): string {
  // Nine figures are more than anybody types, and hide the noise of binary fractions.
  const plain = (value: number) => String(Number(value.toPrecision(9)));
  const uncertainty = standardUncertainty === null ? '' : ` \u00B1 ${plain(standardUncertainty)}`;
  return `${plain(frequency)}${uncertainty} Hz${used ? '' : ` (${setAsideReason})`}`;
}
