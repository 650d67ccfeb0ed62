import { Redirect } from 'expo-router';
import { hasRole, type Membership, useMeQuery } from '../../lib/session.tsx';
import type { ThemePreference } from '../../theme/themes.ts';
import { useTheme } from '../../theme/use-theme.tsx';
import { Button, Choice, Heading, Loading, Notice, Page, Panel, Problem, Row, Stack, Text } from '../../ui/index.ts';
import { homeOf } from '../shell/places.ts';
import { useEditMeMutation, useSignOutEverywhereMutation, useSignOutMutation } from './account.api.ts';
import { AccountSessions } from './account-sessions.tsx';
import { FirmLinks } from './firm-links.tsx';
import { LicenceForm } from './licence-form.tsx';

export function AccountScreen() {
  const me = useMeQuery();
  if (me.isPending)
    return (
      <Page title="Account">
        <Loading />
      </Page>
    );
  if (me.isError)
    return (
      <Page title="Account" narrow>
        <Problem error={me.error} onRetry={me.refetch} />
      </Page>
    );
  if (!me.data) return <Redirect href={'/sign-in?next=/account' as '/'} />;
  const { name, email, firms } = me.data;
  return (
    <Page title={name} narrow breadcrumb={firms.map((firm) => ({ label: firm.firmName, href: homeOf(firm) }))}>
      <Text tone="muted">{email}</Text>
      {firms.map((firm) => (
        <FirmPanel key={firm.firmId} firm={firm} />
      ))}
      <ThemePanel />
      <AccountSessions />
      <SignOut />
    </Page>
  );
}

function FirmPanel({ firm }: { firm: Membership }) {
  const edit = useEditMeMutation(firm.firmId);
  return (
    <Panel>
      <Heading level={2}>{firm.firmName}</Heading>
      <Text>{[...firm.roles, firm.clientName].filter(Boolean).join(', ')}</Text>
      {hasRole(firm, 'admin', 'engineer', 'checker') ? <FirmLinks firm={firm} /> : null}
      <Choice
        label="Units"
        row
        value={edit.isPending ? (edit.variables.units ?? firm.units) : firm.units}
        onChange={(units) => edit.mutate({ units })}
        options={[
          { value: 'si', label: 'SI (kN, m, kg/m, °C)' },
          { value: 'us', label: 'US customary (kip, ft, lb/ft, °F)' },
        ]}
      />
      {edit.isError ? <Problem error={edit.error} /> : null}
      {hasRole(firm, 'engineer', 'checker') ? <LicenceForm firm={firm} /> : null}
    </Panel>
  );
}

function ThemePanel() {
  const { preference, setPreference } = useTheme();
  return (
    <Panel>
      <Heading level={2}>On this device</Heading>
      <Choice<ThemePreference>
        label="Light or dark"
        row
        value={preference}
        onChange={setPreference}
        options={[
          { value: 'system', label: 'As the device says' },
          { value: 'light', label: 'Light, for the sun' },
          { value: 'dark', label: 'Dark' },
        ]}
      />
    </Panel>
  );
}

function SignOut() {
  const signOut = useSignOutMutation();
  const everywhere = useSignOutEverywhereMutation();
  return (
    <Stack gap={3}>
      <Row>
        <Button onPress={() => signOut.mutate()} busy={signOut.isPending}>
          Sign out
        </Button>
        <Button kind="destructive" onPress={() => everywhere.mutate()} busy={everywhere.isPending}>
          Sign out everywhere
        </Button>
      </Row>
      {signOut.isError ? <Problem error={signOut.error} /> : null}
      {everywhere.isError ? <Problem error={everywhere.error} /> : null}
      <Notice>What you entered on this phone and has not been sent stays here, and is sent when you sign in again.</Notice>
    </Stack>
  );
}
