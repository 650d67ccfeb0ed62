import type { InvitationByToken } from '@strandnote/api/contract';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { Button, Definitions, Form, FormPasswordField, Loading, Notice, Page, Problem, Stack } from '../../ui/index.ts';
import { useAcceptInvitationMutation, useInvitationQuery } from './account.api.ts';
import { problemOfNewPassword } from './password-rules.ts';

export function InvitationScreen() {
  const { token } = useLocalSearchParams<{ token: string }>();
  const invitation = useInvitationQuery(token);
  return (
    <Page title={invitation.data ? `Join ${invitation.data.firmName}` : 'Invitation'} narrow>
      {invitation.isPending ? <Loading /> : null}
      {invitation.isError ? <Problem error={invitation.error} onRetry={invitation.refetch} /> : null}
      {invitation.data ? <AcceptForm token={token} invitation={invitation.data} /> : null}
    </Page>
  );
}

function AcceptForm({ token, invitation }: { token: string; invitation: InvitationByToken }) {
  const router = useRouter();
  const accept = useAcceptInvitationMutation(token);
  const form = useForm({ defaultValues: { password: '' } });
  const submit = form.handleSubmit(({ password }) =>
    accept.mutateAsync({ password, email: invitation.email }).then(
      () => router.replace('/'),
      (error: unknown) => showProblem(form, error),
    ),
  );
  const { root } = form.formState.errors;
  const known = invitation.hasAccount;
  return (
    <Stack gap={5}>
      <Definitions
        items={[
          { term: 'Name', value: invitation.name },
          { term: 'E-mail address', value: invitation.email },
          { term: invitation.roles.length > 1 ? 'Roles' : 'Role', value: invitation.roles.join(', ') },
        ]}
      />
      <Form onSubmit={submit} label="Accept the invitation">
        <FormPasswordField
          control={form.control}
          name="password"
          label={known ? 'Your password' : 'Choose a password'}
          purpose={known ? 'current-password' : 'new-password'}
          hint={known ? 'You have an account already: the same password goes on.' : 'At least 12 characters.'}
          check={problemOfNewPassword}
        />
        {root?.message ? <Notice kind="problem">{root.message}</Notice> : null}
        <Button kind="primary" wide onPress={submit} busy={accept.isPending}>
          {`Join ${invitation.firmName}`}
        </Button>
      </Form>
    </Stack>
  );
}
