import { heardShare } from '@strandnote/core/drawing';

/** Below this share of a mode's largest displacement a peak drowns in noise or in a neighbour (common practice). */
const hardlyHeard = 0.15;
/** Near an end every low mode is small and still heard well; only the smallest are not (common practice). */
const hardlyHeardAtEnd = 0.04;

/** Why the sensor cannot hear a mode, in words; null when it can, or when its place is not known. */
export function deafnessOf(mode: number, place: number | null): string | null {
  if (place === null || !(place >= 0 && place <= 1)) return null;
  const share = heardShare(mode, place);
  const node = Math.round(mode * place);
  const atEnd = node === 0 || node === mode;
  if (share >= (atEnd ? hardlyHeardAtEnd : hardlyHeard)) return null;
  const percent = `${Math.round(100 * share)} %`;
  return atEnd
    ? `The sensor is so near the end that it feels only ${percent} of mode ${mode}.`
    : `The sensor stands near a node of mode ${mode} and feels only ${percent} of it.`;
}
