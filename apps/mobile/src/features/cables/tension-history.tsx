import type { CableDetail, TensionOfCampaign } from '@strandnote/api/contract';
import { type IntervalBarValues, sharedScale } from '@strandnote/core/drawing';
import { useMemo } from 'react';
import { IntervalBar } from '../../drawings/index.ts';
import { useFirm } from '../../lib/session.tsx';
import { showDay } from '../../lib/show-time.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Empty } from '../../ui/index.ts';

/** Every campaign's tension on one scale, with interval and temperature. */
export function TensionHistory({ cable }: { cable: CableDetail }) {
  const firm = useFirm();
  const units = useUnits();
  const columns = useMemo(() => historyColumns(cable, units), [cable, units]);
  return (
    <DataTable
      caption={`Tensions of ${cable.reference}`}
      columns={columns}
      rows={cable.history}
      rowKey={(row) => `${row.campaignId} ${row.spanId}`}
      hrefOf={(row) => `/${firm.firmId}/site/${row.campaignId}`}
      empty={<Empty>Tensions appear here when a campaign has saved its estimates.</Empty>}
    />
  );
}

function historyColumns(cable: CableDetail, units: Units): Column<TensionOfCampaign>[] {
  const design = cable.references.find(({ kind, retiredAt }) => kind === 'design' && retiredAt === null)?.value ?? null;
  const bars = new Map(cable.history.map((row) => [row, barOf(row, design)]));
  const scale = sharedScale([...bars.values()]);
  const several = cable.spans.length > 1;
  const spanName = (spanId: string) => {
    const index = cable.spans.findIndex(({ id }) => id === spanId);
    return cable.spans[index]?.name || `span ${index + 1}`;
  };
  return [
    {
      key: 'campaign',
      header: 'Campaign',
      cell: (row) => (several ? `${row.campaignName}, ${spanName(row.spanId)}` : row.campaignName),
      onPhone: 'title',
    },
    { key: 'day', header: 'Day', cell: (row) => showDay(row.startsOn), sortBy: (row) => row.startsOn },
    {
      key: 'tension',
      header: `Tension ${units.symbol('force')}, 95 %`,
      cell: (row) => `${units.figure(row.tension, 'force')} (${row.interval95.map((bound) => units.figure(bound, 'force')).join(' to ')})`,
      figures: true,
      align: 'right',
    },
    { key: 'temperature', header: 'Steel', cell: (row) => units.show(row.steelTemperature, 'temperature'), figures: true, align: 'right' },
    { key: 'bar', header: 'Interval', cell: (row) => <IntervalBar values={bars.get(row)!} scale={scale} />, width: 240, onPhone: 'across' },
    { key: 'checked', header: 'Check', cell: (row) => (row.checked ? 'checked' : 'not checked'), onPhone: 'aside' },
  ];
}

function barOf({ tension, interval95, bracket }: TensionOfCampaign, reference: number | null): IntervalBarValues {
  return { zone: 'no-limit-agreed', tension, interval: interval95, bracket, reference };
}
