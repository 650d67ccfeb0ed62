import type { CampaignDetail, SavedEstimates } from '@strandnote/api/contract';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { useOutbox } from '../../lib/use-outbox.ts';
import { Button, Heading, Link, Notice, Panel, Problem, Row, Text } from '../../ui/index.ts';
import { useSaveEstimatesMutation } from '../campaigns/campaigns.api.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { entryHref } from './entry-href.ts';

/** The step from the field to the office: the server computes every tension again and keeps it; a report starts from these. */
export function SaveEstimates({ survey, rows }: { survey: CampaignDetail; rows: readonly ChecklistRow[] }) {
  const firm = useFirm();
  const save = useSaveEstimatesMutation(firm.firmId, survey.id);
  const { entries } = useOutbox();
  const [saved, setSaved] = useState<SavedEstimates | null>(null);
  const measured = rows.filter(({ state }) => state === 'measured');
  const unsaved = measured.filter((row) => row.output !== null && !row.saved).length;
  const impossible = measured.filter((row) => row.output === null).length;
  const waiting = entries.filter(({ path }) => path.includes(`/campaigns/${survey.id}/`)).length;
  const why = whyNot({ waiting, measured: measured.length, unsaved: unsaved + impossible, open: survey.state === 'open' });
  return (
    <Panel>
      <Heading level={2} size="lead">
        Estimates and report
      </Heading>
      <Text>{keptWords(measured.length - impossible, unsaved, impossible)}</Text>
      <Row align="flex-start">
        <Button onPress={() => save.mutate(null, { onSuccess: setSaved })} busy={save.isPending} why={why}>
          Save estimates
        </Button>
        <Button href={`/${firm.firmId}/reports/new?campaign=${survey.id}`} why={measured.length === 0 ? 'Nothing is measured yet.' : null}>
          Start a report
        </Button>
      </Row>
      {save.isError ? <Problem error={save.error} onRetry={() => save.mutate(null, { onSuccess: setSaved })} /> : null}
      {saved ? <Saved saved={saved} rows={rows} listHref={`/${firm.firmId}/site/${survey.id}`} /> : null}
    </Panel>
  );
}

function keptWords(tensions: number, unsaved: number, impossible: number): string {
  const refused =
    impossible === 0 ? '' : ` ${impossible} measured ${impossible === 1 ? 'cable' : 'cables'} cannot be estimated as entered.`;
  if (tensions === 0) return `What is measured is computed again by the server and kept; a report starts from that.${refused}`;
  if (unsaved === 0) return `All ${tensions} tensions are kept on the server with their inputs.${refused}`;
  return `${unsaved} of ${tensions} tensions were computed on this device only. The server computes them again and keeps its own.${refused}`;
}

function whyNot({
  waiting,
  measured,
  unsaved,
  open,
}: {
  waiting: number;
  measured: number;
  unsaved: number;
  open: boolean;
}): string | null {
  if (!open) return 'The campaign is closed.';
  if (waiting > 0) return `${waiting === 1 ? 'One entry is' : `${waiting} entries are`} still on this phone. They are sent first.`;
  if (measured === 0) return 'Nothing is measured yet.';
  return unsaved === 0 ? 'Every estimate is saved.' : null;
}

/** What was kept and what was refused, each with its reason and the way to it. */
function Saved({ saved, rows, listHref }: { saved: SavedEstimates; rows: readonly ChecklistRow[]; listHref: string }) {
  const rowOf = (measurementId: string) => rows.find(({ entry }) => entry.measurements.some(({ id }) => id === measurementId));
  return (
    <Notice kind={saved.refused.length > 0 ? 'caution' : 'info'} title={`${saved.items.length} estimates are kept`} alert>
      {saved.refused.map(({ measurementId, message }) => {
        const row = rowOf(measurementId);
        return (
          <Text key={measurementId}>
            {row ? (
              <Link href={entryHref(listHref, row)} inline>
                {row.name}
              </Link>
            ) : (
              'A measurement'
            )}
            {` was refused: ${message}`}
          </Text>
        );
      })}
    </Notice>
  );
}
