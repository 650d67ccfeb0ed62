import type { Revision } from '@strandnote/api/contract';
import { useFirm } from '../../lib/session.tsx';
import { Link, Notice, Stack, Text } from '../../ui/index.ts';

/** What stands in the way of submitting, each with the place where it is mended. */
export function Blockers({ revision }: { revision: Revision }) {
  const firm = useFirm();
  if (revision.blockers.length === 0) return null;
  const count = revision.blockers.length;
  return (
    <Notice kind="caution" title={`${count} ${count === 1 ? 'thing stands' : 'things stand'} in the way of submitting`}>
      <Stack gap={1}>
        {revision.blockers.slice(0, 12).map((blocker) => (
          <Text key={`${blocker.cableId} ${blocker.message}`}>{blocker.message}</Text>
        ))}
        {count > 12 ? <Text tone="muted">{`and ${count - 12} more like these`}</Text> : null}
        {revision.blockers.some((blocker) => blocker.cableId !== null) ? (
          <Link href={`/${firm.firmId}/site/${revision.campaignId}`}>Open the campaign</Link>
        ) : null}
      </Stack>
    </Notice>
  );
}
