import type { Desk } from '@strandnote/api/contract';
import { useMemo } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { showDay } from '../../lib/show-time.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { Caution, type Column, DataTable } from '../../ui/index.ts';

type Moved = Desk['moved'][number];

/** Both intervals and both temperatures, never a bare difference. */
export function MovedCables({ moved }: { moved: Desk['moved'] }) {
  const firm = useFirm();
  const units = useUnits();
  const columns = useMemo(() => movedColumns(units), [units]);
  return (
    <>
      <DataTable
        caption="Cables whose intervals of the last two campaigns do not overlap"
        columns={columns}
        rows={moved}
        rowKey={(row) => row.cableId}
        hrefOf={(row) => `/${firm.firmId}/structures/cables/${row.cableId}`}
      />
      <Caution />
    </>
  );
}

function movedColumns(units: Units): Column<Moved>[] {
  const side = (point: Moved['before']) =>
    `${point.interval95.map((bound) => units.figure(bound, 'force')).join(' to ')}, ${showDay(point.startsOn)}, ${point.steelTemperature === null ? 'temperature not recorded' : units.show(point.steelTemperature, 'temperature')}`;
  return [
    { key: 'cable', header: 'Cable', cell: (row) => row.reference, figures: true, onPhone: 'title' },
    { key: 'structure', header: 'Structure', cell: (row) => row.structureName, onPhone: 'line' },
    { key: 'before', header: `Before, ${units.symbol('force')}, 95 %`, cell: (row) => side(row.before), figures: true, onPhone: 'line' },
    { key: 'after', header: `After, ${units.symbol('force')}, 95 %`, cell: (row) => side(row.after), figures: true, onPhone: 'line' },
  ];
}
