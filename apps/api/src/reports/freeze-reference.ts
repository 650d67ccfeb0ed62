import type { Cable, CampaignDetail, ReferenceTension } from '@strandnote/api/contract';
import { massPerLength, tensionAt } from '@strandnote/core';
import type { FrozenReference } from '@strandnote/core/report-content';
import { sameStage } from './decide-span.ts';

/**
 * The reference tension that a cable is compared with: of the kind agreed in the basis of assessment, not retired, for the
 * campaign's stage where there is one, and the latest of those.
 */
export function chooseReference(cable: Cable, campaign: Pick<CampaignDetail, 'basis' | 'stage'>): ReferenceTension | null {
  const candidates = cable.references.filter(({ kind, retiredAt }) => kind === campaign.basis.referenceKind && retiredAt === null);
  const atStage = candidates.filter(({ stage }) => sameStage(stage, campaign.stage));
  const ranked = (atStage.length > 0 ? atStage : candidates).toSorted(
    (a, b) => (b.dated ?? '').localeCompare(a.dated ?? '') || a.id.localeCompare(b.id),
  );
  return ranked[0] ?? null;
}

/** The chosen reference as a report freezes it, as given and brought to the mean chord. */
export function freezeReference(cable: Cable, campaign: Pick<CampaignDetail, 'basis' | 'stage'>): FrozenReference | null {
  const chosen = chooseReference(cable, campaign);
  if (chosen === null) return null;
  const { kind, stage, place, value, relativeUncertainty, source, dated } = chosen;
  const hung = { massPerLength: massPerLength(cable.section).value, rise: riseOf(cable) };
  const meanChordValue = tensionAt(value, place, 'mean-chord', hung);
  return { kind, stage, place, value, meanChordValue, relativeUncertainty, source, dated };
}

/** Height of the upper anchor above the lower (m), never below zero; from the chords where the anchors have no coordinates. */
function riseOf(cable: Cable): number {
  if (cable.lowerAnchor !== null && cable.upperAnchor !== null) return Math.max(0, cable.upperAnchor.z - cable.lowerAnchor.z);
  return cable.spans.reduce((rise, span) => rise + span.chordLength * Math.sin(span.inclination), 0);
}
