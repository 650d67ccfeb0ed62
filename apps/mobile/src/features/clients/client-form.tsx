import type { Client } from '@strandnote/api/contract';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Form, FormTextField, Notice, Sheet } from '../../ui/index.ts';
import { useCreateClientMutation, useEditClientMutation } from './clients.api.ts';

type Values = Omit<Client, 'id'>;

const noValues: Values = { name: '', contactName: '', contactEmail: '', address: '' };

/** Adds a client; stands on the list of clients and beside any form that asks for one. */
export function NewClientSheet({ onCreated, onClose }: { onCreated: (client: Client) => void; onClose: () => void }) {
  const firm = useFirm();
  const create = useCreateClientMutation(firm.firmId);
  // Once per sheet: sending it again after a lost reply is the same create.
  const [id] = useState(() => crypto.randomUUID());
  return (
    <ClientSheet
      title="Add a client"
      action="Add the client"
      values={noValues}
      save={async (values) => onCreated(await create.mutateAsync({ id, ...values }))}
      onClose={onClose}
    />
  );
}

export function EditClientSheet({ client, onClose }: { client: Client; onClose: () => void }) {
  const firm = useFirm();
  const edit = useEditClientMutation(firm.firmId);
  const { id: clientId, ...values } = client;
  return (
    <ClientSheet
      title={`Edit ${client.name}`}
      action="Save the client"
      values={values}
      save={async (changed) => {
        await edit.mutateAsync({ clientId, ...changed });
        onClose();
      }}
      onClose={onClose}
    />
  );
}

interface ClientSheetProps {
  title: string;
  action: string;
  values: Values;
  save: (values: Values) => Promise<void>;
  onClose: () => void;
}

function ClientSheet({ title, action, values, save, onClose }: ClientSheetProps) {
  const form = useForm<Values>({ defaultValues: values });
  const { control, formState } = form;
  const submit = form.handleSubmit((typed) => save(typed).catch((error: unknown) => showProblem(form, error)));
  return (
    <Sheet
      title={title}
      onClose={onClose}
      holds={formState.isDirty}
      actions={
        <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
          {action}
        </Button>
      }
    >
      <Form onSubmit={submit} label={title}>
        <FormTextField
          control={control}
          name="name"
          label="Name of the organisation"
          hint="As it stands on reports"
          maxLength={120}
          check={(text) => (text.trim() === '' ? 'Give the client a name.' : null)}
        />
        <FormTextField control={control} name="contactName" label="Contact person" optional maxLength={120} />
        <FormTextField
          control={control}
          name="contactEmail"
          label="E-mail address of the contact"
          optional
          inputMode="email"
          maxLength={120}
        />
        <FormTextField control={control} name="address" label="Address" optional rows={4} maxLength={400} />
        {formState.errors.root?.message ? (
          <Notice kind="problem" alert>
            {formState.errors.root.message}
          </Notice>
        ) : null}
      </Form>
    </Sheet>
  );
}
