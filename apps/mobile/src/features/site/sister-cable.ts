import type { CampaignCable, CampaignDetail, Measurement, Point } from '@strandnote/api/contract';
import { reportedMeasurement } from './checklist-rows.ts';

/** The cable that stands to this one as its mirror image across the structure: same place along and up, other side. */
export function sisterOf(survey: Pick<CampaignDetail, 'cables'>, entry: CampaignCable): CampaignCable | null {
  const others = survey.cables.filter(({ cable }) => cable.id !== entry.cable.id && cable.kind === entry.cable.kind);
  const { lowerAnchor, upperAnchor } = entry.cable;
  if (lowerAnchor && upperAnchor) {
    const mirrored = others.find(({ cable }) => facing(cable.lowerAnchor, lowerAnchor) && facing(cable.upperAnchor, upperAnchor));
    if (mirrored) return mirrored;
  }
  // Without coordinates the reference may tell: W-07u and W-07d.
  const stem = stemOf(entry.cable.reference);
  const alike = stem === null ? [] : others.filter(({ cable }) => stemOf(cable.reference) === stem);
  return alike.length === 1 ? alike[0]! : null;
}

/** Frequencies of the sister's visit by plane and mode: "in-plane 3" → Hz. */
export function sisterFrequencies(sister: CampaignCable | null): Map<string, number> {
  const measurement = sister ? latestVisit(sister) : null;
  const used = measurement?.peaks.filter((peak) => peak.used) ?? [];
  return new Map(used.map(({ plane, mode, frequency }) => [`${plane} ${mode}`, frequency]));
}

function latestVisit({ cable, measurements }: CampaignCable): Measurement | null {
  return cable.spans.length === 1 ? reportedMeasurement(measurements, cable.spans[0]!.id) : null;
}

/** Half a metre: drawings of the two sides differ in camber and rounding. */
const sameWithin = 0.5;

function facing(a: Point | null, b: Point): boolean {
  return a !== null && Math.abs(a.x - b.x) < sameWithin && Math.abs(a.z - b.z) < sameWithin && Math.abs(a.y - b.y) > sameWithin;
}

function stemOf(reference: string): string | null {
  return /^(.*\d)[a-z]$/i.exec(reference.trim())?.[1]?.toLowerCase() ?? null;
}
