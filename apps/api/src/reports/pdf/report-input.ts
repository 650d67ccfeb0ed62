import type { Signature } from '@strandnote/api/contract';
import type { UnitSystem } from '@strandnote/core';
import type { FrozenCable, FrozenSpan, ReportContent, Zone } from '@strandnote/core/report-content';
import type { Quantities } from './quantities.ts';
import type { Sheet } from './sheet.ts';
import { zonesByConcern } from './words.ts';

/** What a report is made of: the frozen content, and what is known about it at the time of rendering. */
export interface ReportInput {
  content: ReportContent;
  /** Canonical JSON of the content: the text that was hashed, attached to the file byte for byte. */
  contentJson: string;
  contentSha256: string;
  /** Those of this content, in the order in which they were given. */
  signatures: readonly Signature[];
  verificationCode: string;
  verificationUrl: string;
  /** Head of the firm's audit chain at the time of rendering. */
  auditHead: { sequence: number; hash: string } | null;
  renderedAt: Date;
  /** A draft is marked on every page and has no place for a signature. */
  draft: boolean;
  units?: UnitSystem;
  paper?: 'a4' | 'letter';
}

/** One row of results: a span of a cable. */
export interface ResultRow {
  cable: FrozenCable;
  span: FrozenSpan;
  /** "W-07u", or "T-03, span 2" where a cable has several. */
  name: string;
  /** Where in the document its page is found. */
  destination: string;
}

/** A report while it is being set. */
export interface Report {
  sheet: Sheet;
  input: ReportInput;
  content: ReportContent;
  quantities: Quantities;
  rows: readonly ResultRow[];
}

export function resultRows(content: ReportContent): ResultRow[] {
  return content.cables.flatMap((cable, index) =>
    cable.spans.map((span, position) => ({
      cable,
      span,
      name: cable.spans.length === 1 ? cable.reference : `${cable.reference}, ${span.name || `span ${position + 1}`}`,
      destination: `cable-${String(index + 1).padStart(4, '0')}-${position + 1}`,
    })),
  );
}

export function isMeasured({ span }: ResultRow): boolean {
  return span.estimate !== null;
}

/** The zone of a cable: of its spans the one that wants a look first. */
export function zoneOfCable(cable: FrozenCable): Zone {
  return zonesByConcern.find((zone) => cable.spans.some(({ decision }) => decision.zone === zone)) ?? 'not-measured';
}

const readingOrder: readonly Zone[] = [
  'within',
  'within-not-proven',
  'outside-not-proven',
  'outside',
  'bounds-only',
  'not-comparable',
  'no-limit-agreed',
  'not-measured',
];

/** How many rows each zone has, from within to outside; zones without a row are left out. */
export function zoneCounts(rows: readonly ResultRow[]): { zone: Zone; count: number }[] {
  return readingOrder
    .map((zone) => ({ zone, count: rows.filter(({ span }) => span.decision.zone === zone).length }))
    .filter(({ count }) => count > 0);
}
