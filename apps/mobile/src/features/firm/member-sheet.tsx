import type { Member } from '@strandnote/api/contract';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Form, FormCheckbox, Notice, Sheet, Text } from '../../ui/index.ts';
import { NewClientSheet } from '../clients/client-form.tsx';
import { useEditMemberMutation } from './firm.api.ts';
import { RolesFields, type RoleValues } from './roles-fields.tsx';

interface Values extends RoleValues {
  active: boolean;
}

/** What a person may do in the firm, and whether they still may. */
export function MemberSheet({ member, onClose }: { member: Member; onClose: () => void }) {
  const firm = useFirm();
  const edit = useEditMemberMutation(firm.firmId);
  const form = useForm<Values>({ defaultValues: { roles: member.roles, clientId: member.clientId, active: member.active } });
  const [addingClient, setAddingClient] = useState(false);
  const { control, formState } = form;
  const submit = form.handleSubmit(({ roles, clientId, active }) =>
    edit.mutateAsync({ memberId: member.id, roles, clientId: roles.includes('client') ? clientId : null, active }).then(
      () => onClose(),
      (error: unknown) => showProblem(form, error),
    ),
  );
  return (
    <>
      <Sheet
        title={member.name}
        onClose={onClose}
        holds={formState.isDirty}
        actions={
          <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
            Save the roles
          </Button>
        }
      >
        <Form onSubmit={submit} label={`Roles of ${member.name}`}>
          <Text tone="muted">{member.email}</Text>
          <RolesFields control={control} onAddClient={() => setAddingClient(true)} />
          <FormCheckbox
            control={control}
            name="active"
            label="Active"
            hint="Who is not active can no longer open the firm; what they signed stays signed."
          />
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
