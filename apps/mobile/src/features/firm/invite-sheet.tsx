import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Form, FormTextField, Notice, Sheet } from '../../ui/index.ts';
import { NewClientSheet } from '../clients/client-form.tsx';
import { useInviteMutation } from './firm.api.ts';
import { RolesFields, type RoleValues } from './roles-fields.tsx';

interface Values extends RoleValues {
  name: string;
  email: string;
}

/** Invites a person by mail. `again` is an invitation that ended unanswered. */
export function InviteSheet({ again, onClose }: { again: Values | null; onClose: () => void }) {
  const firm = useFirm();
  const invite = useInviteMutation(firm.firmId);
  // Once per sheet: sending it again after a lost reply sends no second mail.
  const [id] = useState(() => crypto.randomUUID());
  const { name = '', email = '', roles = [], clientId = null } = again ?? {};
  const form = useForm<Values>({ defaultValues: { name, email, roles, clientId } });
  const [addingClient, setAddingClient] = useState(false);
  const { control, formState } = form;
  const submit = form.handleSubmit((values) =>
    invite.mutateAsync({ ...values, id, clientId: values.roles.includes('client') ? values.clientId : null }).then(
      () => onClose(),
      (error: unknown) => showProblem(form, error),
    ),
  );
  return (
    <>
      <Sheet
        title="Invite a person"
        onClose={onClose}
        holds={formState.isDirty}
        actions={
          <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
            Send the invitation
          </Button>
        }
      >
        <Form onSubmit={submit} label="Invite a person">
          <FormTextField
            control={control}
            name="name"
            label="Name"
            hint="As it stands under what the person signs"
            maxLength={120}
            check={(text) => (text.trim() === '' ? 'Give the name of the person.' : null)}
          />
          <FormTextField
            control={control}
            name="email"
            label="E-mail address"
            inputMode="email"
            check={(text) => (text.trim() === '' ? 'Give the address that the invitation goes to.' : null)}
          />
          <RolesFields control={control} onAddClient={() => setAddingClient(true)} />
          {formState.errors.root?.message ? (
            <Notice kind="problem" alert>
              {formState.errors.root.message}
            </Notice>
          ) : null}
        </Form>
      </Sheet>
      {addingClient ? (
        <NewClientSheet
          onCreated={(client) => {
            form.setValue('clientId', client.id, { shouldDirty: true, shouldValidate: true });
            setAddingClient(false);
          }}
          onClose={() => setAddingClient(false)}
        />
      ) : null}
    </>
  );
}
