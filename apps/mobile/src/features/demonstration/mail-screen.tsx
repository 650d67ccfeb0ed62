import { demonstrationMailList } from '@strandnote/api/contract';
import { useQuery } from '@tanstack/react-query';
import { get } from '../../lib/api-client.ts';
import { showTime } from '../../lib/show-time.ts';
import { Empty, Heading, Loading, Notice, Page, Panel, Problem, Text } from '../../ui/index.ts';

/** The mail of a demonstration: it goes to a fake server on this machine and is shown here instead of being delivered. */
export function DemonstrationMailScreen() {
  const mail = useQuery({
    queryKey: ['demonstration', 'mail'],
    queryFn: ({ signal }) => get('/demonstration/mail', demonstrationMailList, signal),
    refetchInterval: 3000,
  });
  const title = 'Mail of the demonstration';
  if (mail.isPending) return <Page title={title}>{<Loading />}</Page>;
  if (mail.isError) return <Page title={title}>{<Problem error={mail.error} onRetry={mail.refetch} />}</Page>;
  return (
    <Page title={title} narrow>
      <Notice kind="caution">A fake mail server on this machine took these messages. Nothing left it.</Notice>
      {mail.data.items.length === 0 ? <Empty>Invitations, review requests, returns and issue notices appear here.</Empty> : null}
      {mail.data.items.map((message) => (
        <Panel key={message.id} gap={2}>
          <Heading level={2}>{message.subject}</Heading>
          <Text size="note" tone="muted">{`To ${message.to}, ${showTime(message.at, 'UTC')}`}</Text>
          <Text>{message.text}</Text>
        </Panel>
      ))}
    </Page>
  );
}
