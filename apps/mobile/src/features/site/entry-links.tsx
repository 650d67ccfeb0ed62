import { showTime } from '../../lib/show-time.ts';
import { Button, KeyHint, Link, Notice, Row, Stack, Text } from '../../ui/index.ts';
import { type ChecklistRow, visitsOf } from './checklist-rows.ts';
import { useDraftedVisits } from './entry-store.ts';
import type { EntryViewProps } from './entry-view.tsx';

interface EntryLinksProps extends EntryViewProps {
  neighbours: { previous: ChecklistRow | null; following: ChecklistRow | null };
  hrefOf: (row: ChecklistRow) => string;
  onExcuse: () => void;
}

/** Where to go from a cable besides the next that waits. */
export function EntryLinks({ survey, row, measurement, neighbours, hrefOf, listHref, onExcuse }: EntryLinksProps) {
  const { previous, following } = neighbours;
  const { cable, notMeasuredReason } = row.entry;
  const estimate = `${listHref}/${cable.id}/estimate${cable.spans.length > 1 ? `?span=${row.span.id}` : ''}`;
  return (
    <Stack gap={3}>
      {notMeasuredReason === null ? null : (
        <Notice title="Marked as not measured">
          <Text>{notMeasuredReason}</Text>
        </Notice>
      )}
      <Row gap={3}>
        {previous ? <Button href={hrefOf(previous)}>{`Back to ${previous.name}`}</Button> : null}
        {following ? <Button href={hrefOf(following)}>{`On to ${following.name}`}</Button> : null}
        <Button onPress={onExcuse}>{notMeasuredReason === null ? 'Not measured: say why' : 'Change why it is not measured'}</Button>
      </Row>
      <Visits survey={survey} row={row} measurement={measurement} hrefOf={hrefOf} />
      {measurement ? <Link href={estimate}>The estimate in full</Link> : null}
      <Row gap={4}>
        <KeyHint keys={['Enter']}>next row</KeyHint>
        <KeyHint keys={['Ctrl', 'Enter']}>save and go on</KeyHint>
        <KeyHint keys={['Alt', 'PageUp']}>cable before</KeyHint>
        <KeyHint keys={['Alt', 'PageDown']}>cable after</KeyHint>
      </Row>
    </Stack>
  );
}

/** A control cable is visited several times in a campaign. */
function Visits({ survey, row, measurement, hrefOf }: Pick<EntryLinksProps, 'survey' | 'row' | 'measurement' | 'hrefOf'>) {
  const drafted = useDraftedVisits(survey.id, row.key);
  const visits = visitsOf(row.entry.measurements, row.key);
  const hrefTo = (visit: string) => {
    const href = hrefOf(row);
    return `${href}${href.includes('?') ? '&' : '?'}visit=${visit}`;
  };
  const waiting = drafted.includes('new') && measurement !== null;
  if (visits.length === 0) return null;
  return (
    <Stack gap={1}>
      {visits.length > 1 || measurement === null ? (
        <Row gap={3}>
          <Text>Visits in this campaign:</Text>
          {visits.map(({ id, visitedAt }) =>
            id === measurement?.id ? (
              <Text key={id} strong>
                {showTime(visitedAt, survey.structureTimeZone)}
              </Text>
            ) : (
              <Link key={id} href={hrefTo(id)}>
                {showTime(visitedAt, survey.structureTimeZone)}
              </Link>
            ),
          )}
        </Row>
      ) : null}
      {waiting ? (
        <Notice kind="caution" title="Another visit was typed here and is not saved">
          <Link href={hrefTo('new')}>Open what was typed</Link>
        </Notice>
      ) : measurement === null ? null : (
        <Link href={hrefTo('new')}>Enter another visit to this cable</Link>
      )}
    </Stack>
  );
}
