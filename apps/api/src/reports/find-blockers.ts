import type { FrozenCable, FrozenSpan, ReportContent, ReportTexts } from '@strandnote/core/report-content';

/** Something that stands in the way of submitting, in words; of one cable or of the whole. */
export interface Blocker {
  cableId: string | null;
  message: string;
}

const missingText: Record<keyof ReportTexts, string> = {
  scope: 'Write the scope: what was asked for and which cables were surveyed.',
  conditions: 'Write the conditions: weather, traffic and whatever else bore on the survey.',
  deviations: 'Write the deviations from what was agreed, or that there were none.',
  conclusion: 'Write the conclusion.',
};

/**
 * What stands in the way of submitting this content.
 *
 * @param staleEstimates ids of estimates whose inputs or engine have changed since they were saved
 */
export function findBlockers(content: ReportContent, staleEstimates: ReadonlySet<string>): Blocker[] {
  const texts = Object.entries(missingText)
    .filter(([name]) => content.texts[name as keyof ReportTexts].trim() === '')
    .map(([, message]) => ({ cableId: null, message }));
  const none = content.cables.length === 0 ? [{ cableId: null, message: 'The report covers no cable of the campaign.' }] : [];
  const cables = content.cables.flatMap((cable) =>
    blockersOfCable(cable, staleEstimates).map((message) => ({ cableId: cable.id, message })),
  );
  return [...texts, ...none, ...cables];
}

function blockersOfCable(cable: FrozenCable, staleEstimates: ReadonlySet<string>): string[] {
  const estimated = cable.spans.filter(({ estimate }) => estimate !== null);
  if (cable.notMeasuredReason !== null && estimated.length === cable.spans.length) {
    return [`${cable.reference} is marked as not measured, but it has an estimate: clear the reason, or set its peaks aside.`];
  }
  return cable.spans.flatMap((span) => {
    const name = cable.spans.length > 1 ? `${cable.reference}, span ${span.name || cable.spans.indexOf(span) + 1},` : cable.reference;
    return blockersOfSpan(name, span, cable.notMeasuredReason, staleEstimates);
  });
}

function blockersOfSpan(name: string, span: FrozenSpan, notMeasuredReason: string | null, staleEstimates: ReadonlySet<string>): string[] {
  if (span.estimate !== null) {
    return staleEstimates.has(span.estimate.id) ? [`${name} has changed since its estimate was saved: save the estimate again.`] : [];
  }
  if (notMeasuredReason !== null) return [];
  if (span.measurement === null) return [`${name} was not measured: enter its peaks, or say why it was not measured.`];
  return [`${name} has no estimate: save one, or say why the cable was not measured.`];
}
