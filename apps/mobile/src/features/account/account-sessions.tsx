import type { SessionRow } from '../../lib/identity.ts';
import { Button, Heading, Loading, Panel, Problem, Row, Stack, Text } from '../../ui/index.ts';
import { useRevokeSessionMutation, useSessionsQuery } from './account.api.ts';
import { deviceName } from './device-name.ts';

/** Where the person is signed in; each session can be ended from here. */
export function AccountSessions() {
  const sessions = useSessionsQuery();
  return (
    <Panel>
      <Heading level={2}>Signed in on</Heading>
      {sessions.isPending ? <Loading /> : null}
      {sessions.isError ? <Problem error={sessions.error} onRetry={sessions.refetch} /> : null}
      <Stack gap={3}>
        {sessions.data?.map((session) => (
          <SessionLine key={session.id} session={session} />
        ))}
      </Stack>
    </Panel>
  );
}

function SessionLine({ session }: { session: SessionRow }) {
  const revoke = useRevokeSessionMutation();
  const device = deviceName(session.userAgent ?? '');
  const since = session.createdAt.toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' });
  return (
    <Row justify="space-between">
      <Stack gap={0} grow>
        <Text>{device}</Text>
        <Text size="note" tone="muted">
          {`since ${since}${session.ipAddress ? `, from ${session.ipAddress}` : ''}`}
        </Text>
      </Stack>
      <Button onPress={() => revoke.mutate(session.token)} busy={revoke.isPending} label={`End the session on ${device} since ${since}`}>
        End
      </Button>
      {revoke.isError ? <Problem error={revoke.error} /> : null}
    </Row>
  );
}
