import type { AuditEvent } from '@strandnote/api/contract';
import { useMemo, useState } from 'react';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, type Column, DataTable, Empty, Link, Loading, Page, Problem, Row, Text, TextField } from '../../ui/index.ts';
import { useClientsQuery } from '../clients/clients.api.ts';
import { instantText } from '../site/visit-time.ts';
import { actText, detailsText, nameInDetails, subjectPath, subjectText } from './audit-words.ts';
import { useAuditQuery, useMembersQuery } from './firm.api.ts';
import { VerifyChain } from './verify-chain.tsx';

const breadcrumb = [{ label: 'Account', href: '/account' }];

/** Who did what, and when: the newest first. */
export function AuditScreen() {
  const firm = useFirm();
  const audit = useAuditQuery(firm.firmId);
  if (audit.isPending) return <Page title="Audit trail">{<Loading />}</Page>;
  if (audit.data === undefined) return <Page title="Audit trail">{<Problem error={audit.error} onRetry={audit.refetch} />}</Page>;
  return (
    <Page title="Audit trail" breadcrumb={breadcrumb}>
      <Text tone="muted">
        {`${hasRole(firm, 'admin') ? 'Everything done in the firm.' : 'What you did, and what was done with the reports that you write or check.'} Times in ${firm.timeZone}, quantities in N, m, kg and Hz.`}
      </Text>
      {hasRole(firm, 'admin') ? <VerifyChain /> : null}
      <Trail pages={audit.data.pages} />
      {audit.isError ? <Problem error={audit.error} onRetry={audit.refetch} /> : null}
      {audit.hasNextPage ? (
        <Row>
          <Button onPress={() => audit.fetchNextPage()} busy={audit.isFetchingNextPage}>
            Show earlier events
          </Button>
        </Row>
      ) : null}
    </Page>
  );
}

interface Line {
  event: AuditEvent;
  at: string;
  act: string;
  subject: string;
  href: string | null;
  details: string;
}

function Trail({ pages }: { pages: readonly { items: AuditEvent[] }[] }) {
  const lines = useLines(pages);
  const [filter, setFilter] = useState('');
  const shown = useMemo(() => lines.filter((line) => holds(line, filter)), [lines, filter]);
  return (
    <>
      <TextField label="Filter" value={filter} onChange={setFilter} hint="Words that an event holds: a name, an act, a structure" />
      <Text size="note" tone="muted" live>
        {filter.trim() === '' ? `${lines.length} events loaded.` : `${shown.length} of ${lines.length} loaded events.`}
      </Text>
      <DataTable
        caption="Events, the newest first"
        columns={columns}
        rows={shown}
        rowKey={({ event }) => String(event.sequence)}
        empty={<Empty>{filter.trim() === '' ? 'Nothing was done yet.' : 'No loaded event holds these words.'}</Empty>}
      />
    </>
  );
}

const columns: Column<Line>[] = [
  { key: 'act', header: 'Act', cell: (line) => `${line.event.actorName} ${line.act}`, onPhone: 'title' },
  { key: 'at', header: 'When', cell: (line) => line.at, figures: true, sortBy: (line) => line.event.sequence },
  {
    key: 'subject',
    header: 'Subject',
    cell: (line) => (line.href === null ? line.subject : <Link href={line.href}>{line.subject}</Link>),
    sortBy: (line) => line.subject,
  },
  { key: 'details', header: 'In particular', cell: (line) => line.details },
  { key: 'sequence', header: 'Event', cell: (line) => String(line.event.sequence), figures: true, align: 'right', onPhone: 'aside' },
];

function useLines(pages: readonly { items: AuditEvent[] }[]): Line[] {
  const { firmId, timeZone } = useFirm();
  const members = useMembersQuery(firmId).data;
  const clients = useClientsQuery(firmId).data;
  return useMemo(() => {
    const events = pages.flatMap(({ items }) => items);
    const names = new Map([...(members?.items ?? []), ...(clients?.items ?? [])].map(({ id, name }) => [id, name]));
    // The newest event that gives a name comes first, and what the lists of today say before it.
    for (const event of events) {
      const name = nameInDetails(event);
      if (name !== null && !names.has(event.subjectId)) names.set(event.subjectId, name);
    }
    return events.map((event) => {
      const path = subjectPath(event);
      return {
        event,
        at: instantText(event.at, timeZone),
        act: actText(event),
        subject: subjectText(event, names),
        href: path === null ? null : `/${firmId}/${path}`,
        details: detailsText(event),
      };
    });
  }, [pages, members, clients, firmId, timeZone]);
}

/** Every word of the filter stands somewhere in the line. */
function holds({ event, at, act, subject, details }: Line, filter: string): boolean {
  const text = `${event.actorName} ${act} ${at} ${subject} ${details} ${event.sequence}`.toLowerCase();
  return filter
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}
