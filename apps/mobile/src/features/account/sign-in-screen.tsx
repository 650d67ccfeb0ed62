import { Redirect, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useMeQuery } from '../../lib/session.tsx';
import { useOutbox } from '../../lib/use-outbox.ts';
import { Button, Form, FormPasswordField, FormTextField, Link, Notice, Page, Stack, Text } from '../../ui/index.ts';
import { useDemonstrationQuery, useSignInMutation } from './account.api.ts';
import { nextAddress } from './next-address.ts';

export function SignInScreen() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  const me = useMeQuery();
  if (me.data) return <Redirect href={nextAddress(next) as '/'} />;
  return (
    <Page title="Sign in" narrow>
      <Stack gap={6}>
        <WaitingNote />
        <SignInForm />
        <Stack gap={2} align="flex-start">
          <Link href="/forgot-password">Ask for a new password</Link>
          <Text tone="muted" size="note">
            Accounts exist by invitation: the administrator of your firm sends them.
          </Text>
        </Stack>
        <DemonstrationNote />
      </Stack>
    </Page>
  );
}

function SignInForm() {
  const signIn = useSignInMutation();
  const form = useForm({ defaultValues: { email: '', password: '' } });
  const submit = form.handleSubmit((values) => signIn.mutateAsync(values).catch((error: unknown) => showProblem(form, error)));
  const { root } = form.formState.errors;
  return (
    <Form onSubmit={submit} label="Sign in">
      <FormTextField
        control={form.control}
        name="email"
        label="E-mail address"
        inputMode="email"
        autoComplete="username"
        check={(value: string) => (value.trim() === '' ? 'Type your e-mail address.' : null)}
      />
      <FormPasswordField
        control={form.control}
        name="password"
        label="Password"
        purpose="current-password"
        check={(value: string) => (value === '' ? 'Type your password.' : null)}
      />
      {root?.message ? <Notice kind="problem">{root.message}</Notice> : null}
      <Button kind="primary" wide onPress={submit} busy={signIn.isPending}>
        {signIn.isPending ? 'Signing in' : 'Sign in'}
      </Button>
    </Form>
  );
}

/** Whoever was signed out in the middle of the work sees that nothing is lost. */
function WaitingNote() {
  const waiting = useOutbox().entries.length;
  if (waiting === 0) return null;
  return (
    <Notice>{`${waiting === 1 ? 'One entry is' : `${waiting} entries are`} on this phone and will be sent once you are signed in.`}</Notice>
  );
}

function DemonstrationNote() {
  const { data } = useDemonstrationQuery();
  if (!data?.demonstration) return null;
  return (
    <Notice title="A demonstration">
      <Text>The bridges, people and surveys in it are invented. Its accounts and passwords were printed where the server was started.</Text>
      <Link href="/demonstration/mail">Read the mail that it sent</Link>
    </Notice>
  );
}
