import type { ReportContent } from '@strandnote/core/report-content';
import { type DrawnCable, Elevation } from '../../drawings/index.ts';
import { Text } from '../../ui/index.ts';
import { countByZone, type ResultRow } from './result-rows.ts';
import { zonesByUrgency, zoneTone, zoneWords } from './zone-words.ts';

/** The structure of a report with each cable by its zone, and the zones counted in words below it. */
export function StructureElevation({
  content,
  rows,
  hrefOf,
}: {
  content: ReportContent;
  rows: readonly ResultRow[];
  hrefOf: (cableId: string) => string;
}) {
  const cables = content.cables.flatMap((cable): DrawnCable[] => {
    if (!cable.lowerAnchor || !cable.upperAnchor) return [];
    const zones = rows.filter((row) => row.cable.id === cable.id).map((row) => row.zone);
    const zone = zonesByUrgency.find((candidate) => zones.includes(candidate)) ?? 'not-measured';
    return [
      {
        id: cable.id,
        reference: cable.reference,
        lower: cable.lowerAnchor,
        upper: cable.upperAnchor,
        y: cable.lowerAnchor.y,
        zone,
        zoneLabel: zoneWords[zone],
      },
    ];
  });
  const { elevation } = content.structure;
  return (
    <>
      {cables.length > 0 ? (
        <Elevation
          name={content.structure.name}
          deck={elevation?.deck ?? []}
          supports={elevation?.supports ?? []}
          cables={cables}
          hrefOf={hrefOf}
        />
      ) : null}
      <ZoneCounts rows={rows} />
    </>
  );
}

function ZoneCounts({ rows }: { rows: readonly ResultRow[] }) {
  const signs: Partial<Record<ResultRow['zone'], string>> = {
    'within-not-proven': ' (dashed, ?)',
    'outside-not-proven': ' (dash-dot, ?!)',
    outside: ' (heavy, !)',
  };
  return (
    <Text>
      {countByZone(rows).map(({ zone, count }, index) => (
        <Text key={zone}>
          {index > 0 ? '  ·  ' : ''}
          <Text strong figures tone={zoneTone[zone]}>
            {String(count)}
          </Text>{' '}
          {zoneWords[zone]}
          {signs[zone] ?? ''}
        </Text>
      ))}
    </Text>
  );
}
