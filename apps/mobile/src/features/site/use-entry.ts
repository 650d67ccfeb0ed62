import type { CampaignDetail, Measurement } from '@strandnote/api/contract';
import { freeLength } from '@strandnote/core';
import { useDeferredValue, useEffect, useMemo } from 'react';
import { useMeQuery } from '../../lib/session.tsx';
import { useUnits } from '../../lib/units.tsx';
import type { ChecklistRow } from './checklist-rows.ts';
import { draftOf, type EntryDraft, inSystem, newDraft } from './entry-draft.ts';
import { findingsOf } from './entry-findings.ts';
import { useEntryDraft } from './entry-store.ts';
import { expectedFrequencies } from './expected-frequencies.ts';
import { warmUp } from './live-estimate.ts';
import { numberingFindings } from './numbering-audit.ts';
import { sisterFrequencies, sisterOf } from './sister-cable.ts';
import { agreedReference } from './survey-decision.ts';

export interface EntryPlace {
  survey: CampaignDetail;
  row: ChecklistRow;
  /** The visit that is opened; null for a new one. */
  measurement: Measurement | null;
}

export type Entry = ReturnType<typeof useEntry>;

/** A measurement while it is typed, with all that the device can say of it at once. */
export function useEntry({ survey, row, measurement }: EntryPlace) {
  const { system, show } = useUnits();
  const me = useMeQuery();
  const timeZone = survey.structureTimeZone;
  const { span, entry } = row;
  const kept = useEntryDraft(
    { userId: me.data?.userId ?? '', campaignId: survey.id, spanId: span.id, measurementId: measurement?.id ?? null },
    () => (measurement ? draftOf(measurement, { system, timeZone }) : newDraft({ system, now: new Date(), timeZone })),
    (draft) => inSystem(draft, system),
    measurement?.version ?? 0,
  );
  const { draft } = kept;
  const findings = useMemo(
    () => (draft ? findingsOf(draft, { section: entry.cable.section, span, timeZone, show }) : null),
    [draft, entry.cable.section, span, timeZone, show],
  );
  return {
    ...kept,
    findings,
    timeZone,
    sensor: sensorShare(draft, row),
    ...useComparison(survey, row, draft, findings?.outcome?.output ?? null),
  };
}

/** What the peaks are held against: where they should lie, where those of the sister lie, and how else they could be numbered. */
function useComparison(
  survey: CampaignDetail,
  row: ChecklistRow,
  draftNow: EntryDraft | null,
  fitNow: Parameters<typeof expectedFrequencies>[2]['fit'],
) {
  const { entry, span } = row;
  // What is expected may come a moment after the tension: the frame of a keystroke belongs to the estimate.
  const fit = useDeferredValue(fitNow);
  const draft = useDeferredValue(draftNow);
  const reference = agreedReference(entry.cable, survey)?.meanChordValue ?? null;
  const last = entry.lastSurvey.find(({ spanId }) => spanId === span.id)?.tension ?? null;
  const expected = useMemo(
    () => expectedFrequencies(entry.cable.section, span, { fit, tension: last ?? reference }),
    [entry.cable.section, span, fit, last, reference],
  );
  const { section } = entry.cable;
  const known = expected.length > 0;
  // biome-ignore lint/correctness/useExhaustiveDependencies: once for a cable, not with every fit
  useEffect(() => {
    const timer = setTimeout(() => warmUp(section, span, expected), 300);
    return () => clearTimeout(timer);
  }, [section, span, known]);
  const sister = useMemo(() => {
    const found = sisterOf(survey, entry);
    return found ? { name: found.cable.reference, frequencies: sisterFrequencies(found) } : null;
  }, [survey, entry]);
  const numbering = useMemo(
    () => (draft ? numberingFindings(draft, { section: entry.cable.section, span, tension: last ?? reference }) : null),
    [draft, entry.cable.section, span, last, reference],
  );
  return { expected, sister, numbering };
}

/** Place of the sensor as a share of the free length from its lower end. */
function sensorShare(draft: EntryDraft | null, { span }: ChecklistRow): number | null {
  const position = draft?.visit.sensor.si ?? null;
  if (position === null) return null;
  const share = position / freeLength(span).length;
  return share >= 0 && share <= 1 ? share : null;
}
