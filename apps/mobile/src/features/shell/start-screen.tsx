import { Redirect } from 'expo-router';
import { useMeQuery } from '../../lib/session.tsx';
import { Button, Loading, Page, Problem, Stack, Text } from '../../ui/index.ts';
import { homeOf } from './places.ts';

/** The bare address: to the person's firm, to a choice where there are several, or to signing in. */
export function StartScreen() {
  const me = useMeQuery();
  if (me.isPending)
    return (
      <Page title="Strandnote">
        <Loading />
      </Page>
    );
  if (me.isError) {
    return (
      <Page title="Strandnote" narrow>
        <Problem error={me.error} onRetry={me.refetch} />
      </Page>
    );
  }
  if (!me.data) return <Redirect href={'/sign-in' as '/'} />;
  const [first, ...others] = me.data.firms;
  if (first && others.length === 0) return <Redirect href={homeOf(first) as '/'} />;
  return (
    <Page title={first ? 'Which firm' : 'No firm yet'} narrow>
      {first ? (
        <Stack gap={3}>
          {me.data.firms.map((firm) => (
            <Button key={firm.firmId} href={homeOf(firm)}>
              {firm.firmName}
            </Button>
          ))}
        </Stack>
      ) : (
        <Text>Your account belongs to no firm at present. Its administrator can invite you again.</Text>
      )}
    </Page>
  );
}
