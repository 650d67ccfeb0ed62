import type { CableDetail, Span } from '@strandnote/api/contract';
import { freeLength, massPerLength, naturalFrequencies } from '@strandnote/core';
import { formatNumber } from '@strandnote/core/units';
import { useMemo } from 'react';
import { StringFigure } from '../../drawings/index.ts';
import { useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Heading, Stack, Text } from '../../ui/index.ts';

interface Prediction {
  mode: number;
  hinged: number;
  clamped: number;
}

const modeCount = 6;

/** What the cable should sound like under its design tension, with both ends hinged and with both clamped. */
export function PredictedFrequencies({ cable }: { cable: CableDetail }) {
  const units = useUnits();
  const design = cable.references.find(({ kind, retiredAt }) => kind === 'design' && retiredAt === null);
  const span = cable.spans[0];
  const rows = useMemo(() => (design && span ? predict(cable, span, design.value) : []), [cable, span, design]);
  if (!design || rows.length === 0) return null;
  return (
    <Stack gap={2}>
      <Heading level={2}>Frequencies to expect</Heading>
      <Text tone="muted">{`Under the design tension of ${units.show(design.value, 'force')}${cable.spans.length > 1 ? ', first span' : ''}.`}</Text>
      <DataTable caption="Frequencies to expect, mode by mode" columns={columns} rows={rows} rowKey={(row) => String(row.mode)} />
    </Stack>
  );
}

function predict({ section }: CableDetail, span: Span, tension: number): Prediction[] {
  const body = { length: freeLength(span).length, massPerLength: massPerLength(section).value };
  const bendingStiffness = Math.sqrt(section.bendingStiffnessLow * section.bendingStiffnessHigh);
  const hinged = naturalFrequencies({ ...body, ends: ['hinged', 'hinged'] }, { tension, bendingStiffness }, modeCount);
  const clamped = naturalFrequencies({ ...body, ends: ['clamped', 'clamped'] }, { tension, bendingStiffness }, modeCount);
  return hinged.map((frequency, index) => ({ mode: index + 1, hinged: frequency, clamped: clamped[index]! }));
}

const columns: Column<Prediction>[] = [
  { key: 'mode', header: 'Mode', cell: (row) => String(row.mode), figures: true, align: 'left', onPhone: 'title' },
  { key: 'shape', header: 'Shape', cell: (row) => <StringFigure mode={row.mode} />, width: 140, onPhone: 'across' },
  { key: 'hinged', header: 'Hinged ends, Hz', cell: (row) => formatNumber(row.hinged, 3), figures: true, align: 'right' },
  { key: 'clamped', header: 'Clamped ends, Hz', cell: (row) => formatNumber(row.clamped, 3), figures: true, align: 'right' },
];
