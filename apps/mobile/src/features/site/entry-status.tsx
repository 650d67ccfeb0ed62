import { useOutboxStatus } from '../../lib/use-outbox.ts';
import { Tag } from '../../ui/index.ts';
import { measurementKey } from './entry-store.ts';

/** Where what was entered is now. */
export function EntryStatus({ measurementId, typed, saved }: { measurementId: string; typed: boolean; saved: boolean }) {
  const status = useOutboxStatus(measurementKey(measurementId));
  if (typed) return <Tag tone="ochre">typed, not saved</Tag>;
  if (status?.kind === 'on this phone') return <Tag>on this phone</Tag>;
  if (status?.kind === 'refused') return <Tag tone="minium">refused</Tag>;
  if (status?.kind === 'sent') return <Tag tone="verdigris">sent</Tag>;
  return saved ? <Tag tone="muted">stored</Tag> : null;
}
