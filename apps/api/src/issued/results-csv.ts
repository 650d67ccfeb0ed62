import type { FrozenCable, FrozenSpan, ReportContent } from '@strandnote/core/report-content';
import papaparse from 'papaparse';

type Cell = string | number | null;
interface Row {
  content: ReportContent;
  cable: FrozenCable;
  span: FrozenSpan;
}

/** One column of the table of results: its heading with the unit, and its value for a span. Quantities are SI. */
const columns: Record<string, (row: Row) => Cell> = {
  report: ({ content }) => content.report.number,
  revision: ({ content }) => content.report.letter,
  structure: ({ content }) => content.structure.name,
  campaign: ({ content }) => content.campaign.name,
  stage: ({ content }) => content.campaign.stage,
  cable: ({ cable }) => cable.reference,
  owner_reference: ({ cable }) => cable.ownerReference,
  painted_mark: ({ cable }) => cable.paintedMark,
  cable_kind: ({ cable }) => cable.kind,
  section: ({ cable }) => cable.sectionName,
  span: ({ span }) => span.name,
  free_length_m: ({ span }) => inputOf(span, 'free-length'),
  mass_per_length_kg_per_m: ({ span }) => inputOf(span, 'mass-per-length'),
  visited_at: ({ span }) => span.measurement?.visitedAt ?? null,
  steel_temperature_degC: ({ span, content }) => span.measurement?.steelTemperature ?? content.campaign.steelTemperature,
  modes_used: ({ span }) => span.measurement && modesUsed(span),
  tension_N: ({ span }) => singleValue(span)?.tension ?? null,
  tension_standard_uncertainty_N: ({ span }) => singleValue(span)?.standardUncertainty ?? null,
  tension_95_low_N: ({ span }) => span.estimate?.output.interval95[0] ?? null,
  tension_95_high_N: ({ span }) => span.estimate?.output.interval95[1] ?? null,
  tension_if_hinged_N: ({ span }) => span.estimate?.output.bracket.hinged ?? null,
  tension_if_clamped_N: ({ span }) => span.estimate?.output.bracket.clamped ?? null,
  reference_kind: ({ cable }) => cable.referenceTension?.kind ?? null,
  reference_mean_chord_N: ({ cable }) => cable.referenceTension?.meanChordValue ?? null,
  tension_to_reference_minus_1: ({ span }) => span.decision.toReference,
  lower_limit_N: ({ span }) => span.decision.lowerLimit,
  upper_limit_N: ({ span }) => span.decision.upperLimit,
  zone: ({ span }) => span.decision.zone,
  zone_reason: ({ span }) => span.decision.reason,
  last_survey_tension_N: ({ span }) => span.lastSurvey?.tension ?? null,
  last_survey: ({ span }) => span.lastSurvey?.campaignName ?? null,
  last_survey_steel_temperature_degC: ({ span }) => span.lastSurvey?.steelTemperature ?? null,
  not_measured_reason: ({ cable }) => cable.notMeasuredReason,
  engine_version: ({ span }) => span.estimate?.engineVersion ?? null,
  caution: ({ span }) => span.estimate && caution,
};

const caution =
  'Estimated from vibration: an average over the record at the stated temperature and traffic. The interval holds only if cable, mode numbers, length and mass are right. It does not show that wires or anchorages are sound, nor capacity under live load. The decision belongs to a licensed engineer.';

/**
 * The results of a report as a table for a spreadsheet: comma separated, UTF-8 with its mark (spreadsheets guess another
 * encoding without), full precision, one row for each span in the order of the report.
 */
export function resultsCsv(content: ReportContent): string {
  const rows = content.cables.flatMap((cable) => cable.spans.map((span) => ({ content, cable, span })));
  const cells = rows.map((row) => Object.values(columns).map((cell) => cell(row)));
  // A text that begins with = + - or @ would run as a formula in a spreadsheet; numbers are left as they are.
  return `\uFEFF${papaparse.unparse({ fields: Object.keys(columns), data: cells }, { escapeFormulae: true })}\r\n`;
}

/** The estimate where a single tension may be given; where only bounds may, a table gives no number that somebody could copy. */
function singleValue({ estimate }: FrozenSpan) {
  return estimate !== null && estimate.output.boundsOnly === null ? estimate.output : null;
}

function inputOf(span: FrozenSpan, quantity: FrozenSpan['inputs'][number]['quantity']): number | null {
  return span.inputs.find((input) => input.quantity === quantity)?.value ?? null;
}

function modesUsed(span: FrozenSpan): string {
  return (span.measurement?.peaks ?? [])
    .filter(({ used }) => used)
    .map(({ mode }) => mode)
    .join(' ');
}
