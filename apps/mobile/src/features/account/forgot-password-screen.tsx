import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { Button, Form, FormTextField, Link, Notice, Page, Stack, Text } from '../../ui/index.ts';
import { useForgotPasswordMutation } from './account.api.ts';

export function ForgotPasswordScreen() {
  const ask = useForgotPasswordMutation();
  const form = useForm({ defaultValues: { email: '' } });
  const submit = form.handleSubmit((values) => ask.mutateAsync(values).catch((error: unknown) => showProblem(form, error)));
  const { root } = form.formState.errors;
  return (
    <Page title="Ask for a new password" narrow>
      <Stack gap={6}>
        {ask.isSuccess ? (
          <Notice title="Look into your mail" alert>
            If this address belongs to an account, a link to choose a new password is on its way. It works once, within the hour.
          </Notice>
        ) : (
          <Form onSubmit={submit} label="Ask for a new password">
            <Text>Type the address that your invitation went to. A link to choose a new password is sent there.</Text>
            <FormTextField
              control={form.control}
              name="email"
              label="E-mail address"
              inputMode="email"
              autoComplete="username"
              check={(value: string) => (/^\S+@\S+\.\S+$/.test(value.trim()) ? null : 'An e-mail address looks like name@firm.example.')}
            />
            {root?.message ? <Notice kind="problem">{root.message}</Notice> : null}
            <Button kind="primary" wide onPress={submit} busy={ask.isPending}>
              Send the link
            </Button>
          </Form>
        )}
        <Link href="/sign-in">Back to signing in</Link>
      </Stack>
    </Page>
  );
}
