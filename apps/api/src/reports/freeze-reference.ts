import type { Cable, CampaignDetail } from '@strandnote/api/contract';
import { chooseReference, referenceAtMeanChord } from '@strandnote/core';
import type { FrozenReference } from '@strandnote/core/report-content';

/** The reference that the cable is compared with, as a report freezes it: as given, and brought to the mean chord. */
export function freezeReference(cable: Cable, campaign: Pick<CampaignDetail, 'basis' | 'stage'>): FrozenReference | null {
  const chosen = chooseReference(cable.references, campaign);
  if (chosen === null) return null;
  const { kind, stage, place, value, relativeUncertainty, source, dated } = chosen;
  return { kind, stage, place, value, meanChordValue: referenceAtMeanChord(chosen, cable), relativeUncertainty, source, dated };
}
