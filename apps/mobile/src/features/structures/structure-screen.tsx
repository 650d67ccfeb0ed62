import type { Cable, Campaign, Structure } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { type DrawnCable, Elevation } from '../../drawings/index.ts';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { showDay } from '../../lib/show-time.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { Button, type Column, DataTable, Empty, Heading, Loading, Page, Problem, Stack, Text } from '../../ui/index.ts';
import { cableKindWords, structureKindWords } from './structure-words.ts';
import { useCablesQuery, useCampaignsOfStructureQuery, useStructureQuery } from './structures.api.ts';

/** One structure: its elevation, its cables, its campaigns. */
export function StructureScreen() {
  const firm = useFirm();
  const { structure: structureId } = useLocalSearchParams<{ structure: string }>();
  const structure = useStructureQuery(firm.firmId, structureId);
  const cables = useCablesQuery(firm.firmId, structureId);
  const campaigns = useCampaignsOfStructureQuery(firm.firmId, structureId);
  const title = structure.data?.name ?? 'Structure';
  if (structure.isPending || cables.isPending || campaigns.isPending) return <Page title={title}>{<Loading />}</Page>;
  if (structure.isError || cables.isError || campaigns.isError) {
    const retry = () => Promise.all([structure.refetch(), cables.refetch(), campaigns.refetch()]);
    return <Page title={title}>{<Problem error={structure.error ?? cables.error ?? campaigns.error} onRetry={retry} />}</Page>;
  }
  return <StructureView structure={structure.data} cables={cables.data.items} campaigns={campaigns.data.items} />;
}

interface StructureViewProps {
  structure: Structure;
  cables: readonly Cable[];
  campaigns: readonly Campaign[];
}

function StructureView({ structure, cables, campaigns }: StructureViewProps) {
  const firm = useFirm();
  const units = useUnits();
  const columns = useMemo(() => cableColumns(units), [units]);
  const here = `/${firm.firmId}/structures`;
  const about = [structureKindWords[structure.kind], structure.place, structure.ownerName, structure.reference].filter(
    (part) => part !== '',
  );
  return (
    <Page
      title={structure.name}
      breadcrumb={[{ label: 'Structures', href: here }]}
      actions={<StructureActs structureId={structure.id} hasCables={cables.length > 0} />}
    >
      <Text tone="muted">{about.join(' · ')}</Text>
      {structure.notes ? <Text>{structure.notes}</Text> : null}
      <StructureDrawing structure={structure} cables={cables} />
      <Stack gap={3}>
        <Heading level={2}>Cables</Heading>
        <DataTable
          caption={`Cables of ${structure.name}`}
          columns={columns}
          rows={cables}
          rowKey={(row) => row.id}
          hrefOf={(row) => `${here}/cables/${row.id}`}
          empty={<Empty>The cables of the structure stand here, each with its section, free length and ends. Add the first one.</Empty>}
        />
      </Stack>
      <Stack gap={3}>
        <Heading level={2}>Campaigns</Heading>
        <DataTable
          caption={`Campaigns on ${structure.name}`}
          columns={campaignColumns}
          rows={campaigns}
          rowKey={(row) => row.id}
          hrefOf={(row) => `/${firm.firmId}/site/${row.id}`}
          empty={<Empty>Surveys of this structure stand here, the latest first.</Empty>}
        />
      </Stack>
    </Page>
  );
}

function StructureActs({ structureId, hasCables }: { structureId: string; hasCables: boolean }) {
  const firm = useFirm();
  const here = `/${firm.firmId}/structures/${structureId}`;
  if (!hasRole(firm, 'admin', 'engineer')) return null;
  return (
    <>
      <Button href={`${here}/edit`}>Edit the structure</Button>
      {hasRole(firm, 'engineer') ? (
        <Button href={`/${firm.firmId}/site/new?structure=${structureId}`} why={hasCables ? null : 'Add its cables first.'}>
          Open a campaign
        </Button>
      ) : null}
      <Button kind="primary" href={`${here}/add-cable`}>
        Add a cable
      </Button>
    </>
  );
}

function StructureDrawing({ structure, cables }: { structure: Structure; cables: readonly Cable[] }) {
  const firm = useFirm();
  const drawn = cables.flatMap(({ id, reference, lowerAnchor, upperAnchor }): DrawnCable[] =>
    lowerAnchor && upperAnchor
      ? [{ id, reference, lower: lowerAnchor, upper: upperAnchor, y: lowerAnchor.y, zone: 'no-limit-agreed', zoneLabel: 'open the cable' }]
      : [],
  );
  if (drawn.length === 0) return null;
  return (
    <Elevation
      name={structure.name}
      deck={structure.elevation?.deck ?? []}
      supports={structure.elevation?.supports ?? []}
      cables={drawn}
      hrefOf={(id) => `/${firm.firmId}/structures/cables/${id}`}
    />
  );
}

function cableColumns(units: Units): Column<Cable>[] {
  const lengthOf = ({ spans }: Cable) => spans.reduce((sum, span) => sum + span.chordLength - span.lowerDeduction - span.upperDeduction, 0);
  const massOf = ({ section }: Cable) => section.steelMass + section.sheathMass + section.groutMass;
  const designOf = ({ references }: Cable) =>
    references.find(({ kind, retiredAt }) => kind === 'design' && retiredAt === null)?.value ?? null;
  return [
    {
      key: 'reference',
      header: 'Cable',
      cell: (row) => row.reference,
      figures: true,
      align: 'left',
      sortBy: (row) => row.reference,
      onPhone: 'title',
    },
    { key: 'kind', header: 'Kind', cell: (row) => cableKindWords[row.kind], onPhone: 'aside' },
    { key: 'mark', header: 'Painted mark', cell: (row) => row.paintedMark || '–', onPhone: 'line' },
    { key: 'section', header: 'Section', cell: (row) => row.section.name, sortBy: (row) => row.section.name },
    {
      key: 'length',
      header: `Free length, ${units.symbol('length')}`,
      cell: (row) => units.figure(lengthOf(row), 'length', 2),
      figures: true,
      align: 'right',
      sortBy: lengthOf,
    },
    {
      key: 'mass',
      header: `Mass, ${units.symbol('mass-per-length')}`,
      cell: (row) => units.figure(massOf(row), 'mass-per-length', 1),
      figures: true,
      align: 'right',
      sortBy: massOf,
      onPhone: 'none',
    },
    {
      key: 'design',
      header: `Design, ${units.symbol('force')}`,
      cell: (row) => {
        const design = designOf(row);
        return design === null ? '–' : units.figure(design, 'force');
      },
      figures: true,
      align: 'right',
      sortBy: designOf,
    },
  ];
}

const campaignColumns: Column<Campaign>[] = [
  { key: 'name', header: 'Campaign', cell: (row) => row.name, onPhone: 'title' },
  { key: 'starts', header: 'Starts', cell: (row) => showDay(row.startsOn), sortBy: (row) => row.startsOn },
  { key: 'measured', header: 'Measured', cell: (row) => `${row.measuredCount} of ${row.cableCount}`, figures: true, align: 'right' },
  { key: 'state', header: 'State', cell: (row) => row.state, onPhone: 'aside' },
];
