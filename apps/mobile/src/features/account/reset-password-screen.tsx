import { useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { Button, Form, FormPasswordField, Link, Notice, Page, Stack } from '../../ui/index.ts';
import { useResetPasswordMutation } from './account.api.ts';
import { problemOfNewPassword } from './password-rules.ts';

export function ResetPasswordScreen() {
  const { token } = useLocalSearchParams<{ token?: string }>();
  return (
    <Page title="Choose a new password" narrow>
      {token ? (
        <NewPasswordForm token={token} />
      ) : (
        <Stack gap={4}>
          <Notice kind="problem" title="This link has been used or is too old">
            Ask for a new one; each works once, within the hour.
          </Notice>
          <Link href="/forgot-password">Ask for a new password</Link>
        </Stack>
      )}
    </Page>
  );
}

function NewPasswordForm({ token }: { token: string }) {
  const reset = useResetPasswordMutation();
  const form = useForm({ defaultValues: { password: '' } });
  const submit = form.handleSubmit(({ password }) =>
    reset.mutateAsync({ token, password }).catch((error: unknown) => showProblem(form, error)),
  );
  const { root } = form.formState.errors;
  if (reset.isSuccess) {
    return (
      <Stack gap={4} align="flex-start">
        <Notice title="The new password is set" alert>
          Sessions on other devices have ended.
        </Notice>
        <Button kind="primary" href="/sign-in">
          Sign in
        </Button>
      </Stack>
    );
  }
  return (
    <Form onSubmit={submit} label="Choose a new password">
      <FormPasswordField
        control={form.control}
        name="password"
        label="New password"
        purpose="new-password"
        hint="At least 12 characters."
        check={problemOfNewPassword}
      />
      {root?.message ? <Notice kind="problem">{root.message}</Notice> : null}
      <Button kind="primary" wide onPress={submit} busy={reset.isPending}>
        Set the new password
      </Button>
    </Form>
  );
}
