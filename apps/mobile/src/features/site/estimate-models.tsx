import type { StoredEstimate } from '@strandnote/core/report-content';
import { formatNumber } from '@strandnote/core/units';
import { useMemo } from 'react';
import { type Units, useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Heading, Stack } from '../../ui/index.ts';

type Model = StoredEstimate['models'][number];

/** Every rung of the ladder on the same peaks: what a simpler model would have said. */
export function EstimateModels({ output }: { output: StoredEstimate }) {
  const units = useUnits();
  const columns = useMemo(() => modelColumns(output.tension, units), [output.tension, units]);
  return (
    <Stack gap={3}>
      <Heading level={2}>Models side by side</Heading>
      <DataTable caption="Models side by side" columns={columns} rows={output.models} rowKey={({ id }) => id} />
    </Stack>
  );
}

function modelColumns(adopted: number, units: Units): Column<Model>[] {
  const figures = { figures: true, align: 'right' } as const;
  const optional = (value: number | null, decimals: number) => (value === null ? '–' : formatNumber(value, decimals));
  return [
    { key: 'name', header: 'Model', cell: ({ name }) => name },
    { key: 'tension', header: `Tension ${units.symbol('force')}`, cell: ({ tension }) => units.figure(tension, 'force'), ...figures },
    { key: 'to-adopted', header: 'to the estimate', cell: ({ tension }) => signedPercent(tension / adopted - 1), ...figures },
    {
      key: 'stiffness',
      header: `Bending stiffness ${units.symbol('bending-stiffness')}`,
      cell: ({ bendingStiffness }) => (bendingStiffness === null ? '–' : units.figure(bendingStiffness, 'bending-stiffness')),
      ...figures,
    },
    { key: 'chi', header: 'χ²', cell: ({ chiSquared }) => optional(chiSquared, 1), ...figures },
    { key: 'freedom', header: 'Degrees of freedom', cell: ({ degreesOfFreedom }) => optional(degreesOfFreedom, 0), ...figures },
    { key: 'aicc', header: 'AICc', cell: ({ aicc }) => optional(aicc, 1), ...figures },
    { key: 'note', header: 'Note', cell: ({ note }) => note },
  ];
}

function signedPercent(share: number): string {
  return `${share > 0 ? '+' : ''}${formatNumber(100 * share, 1)} %`;
}
