import type { CampaignDetail } from '@strandnote/api/contract';
import { type DrawnCable, Elevation } from '../../drawings/index.ts';
import { Text, useWide } from '../../ui/index.ts';
import { zonesByUrgency, zoneTone, zoneWords } from '../reports/zone-words.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { stateWords } from './row-state.tsx';

interface ChecklistElevationProps {
  survey: CampaignDetail;
  rows: readonly ChecklistRow[];
  listHref: string;
}

/** The structure with each cable by its zone, and the same counted in words. */
export function ChecklistElevation({ survey, rows, listHref }: ChecklistElevationProps) {
  const wide = useWide();
  const cables = survey.cables.flatMap(({ cable }): DrawnCable[] => {
    const worst = worstOf(rows.filter(({ entry }) => entry.cable.id === cable.id));
    if (!cable.lowerAnchor || !cable.upperAnchor || !worst) return [];
    return [
      {
        id: cable.id,
        reference: cable.reference,
        lower: cable.lowerAnchor,
        upper: cable.upperAnchor,
        y: cable.lowerAnchor.y,
        zone: worst.decision.zone,
        zoneLabel: stateWords(worst),
      },
    ];
  });
  return (
    <>
      {cables.length > 0 ? (
        <Elevation
          name={survey.structureName}
          deck={survey.elevation?.deck ?? []}
          supports={survey.elevation?.supports ?? []}
          cables={cables}
          hrefOf={(cableId) => `${listHref}/${cableId}`}
          maxHeight={wide ? 240 : 150}
        />
      ) : null}
      <Counts rows={rows} />
    </>
  );
}

function worstOf(rows: readonly ChecklistRow[]): ChecklistRow | undefined {
  return rows.toSorted((a, b) => zonesByUrgency.indexOf(a.decision.zone) - zonesByUrgency.indexOf(b.decision.zone))[0];
}

const signs: Partial<Record<ChecklistRow['decision']['zone'], string>> = {
  'within-not-proven': ' (dashed, ?)',
  'outside-not-proven': ' (dash-dot, ?!)',
  outside: ' (heavy, !)',
};

function Counts({ rows }: { rows: readonly ChecklistRow[] }) {
  const judged = rows.filter(({ output }) => output !== null);
  const zones = zonesByUrgency
    .map((zone) => ({ zone, count: judged.filter(({ decision }) => decision.zone === zone).length }))
    .filter(({ count }) => count > 0);
  const waiting = rows.filter(({ state }) => state === 'to measure').length;
  return (
    <Text>
      {zones.map(({ zone, count }) => (
        <Text key={zone}>
          <Text strong figures tone={zoneTone[zone]}>
            {String(count)}
          </Text>
          {` ${zoneWords[zone]}${signs[zone] ?? ''}  ·  `}
        </Text>
      ))}
      <Text strong figures>
        {String(waiting)}
      </Text>
      {' to measure'}
    </Text>
  );
}
