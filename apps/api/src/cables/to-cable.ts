import type { Cable, ReferenceTension, Section, Span } from '@strandnote/api/contract';
import type { schema } from '@strandnote/db';

type CableRow = typeof schema.cables.$inferSelect;
type SectionRow = typeof schema.sections.$inferSelect;
type SpanRow = typeof schema.spans.$inferSelect;
type ReferenceRow = typeof schema.referenceTensions.$inferSelect;

export interface CableRows {
  cable: CableRow;
  section: SectionRow;
  spans: readonly SpanRow[];
  references: readonly ReferenceRow[];
}

export function toCable({ cable, section, spans, references }: CableRows): Cable {
  const { firmId: _firm, createdAt: _created, ...fields } = cable;
  return { ...fields, section: toSection(section), spans: spans.map(toSpan), references: references.map(toReference) };
}

export function toSection({ firmId: _firm, createdAt: _created, ...fields }: SectionRow): Section {
  return fields;
}

export function toSpan({ firmId: _firm, retiredAt: _retired, ...fields }: SpanRow): Span {
  return fields;
}

export function toReference({ firmId: _firm, createdAt: _created, retiredAt, ...fields }: ReferenceRow): ReferenceTension {
  return { ...fields, retiredAt: retiredAt?.toISOString() ?? null };
}
