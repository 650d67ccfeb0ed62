import type { Role } from '@strandnote/api/contract';
import { type Control, useController, useWatch } from 'react-hook-form';
import { View } from 'react-native';
import { useFirm } from '../../lib/session.tsx';
import { Button, Checkbox, FormSelect, Problem, Row, Stack, Text } from '../../ui/index.ts';
import { useClientsQuery } from '../clients/clients.api.ts';
import { roleWords, withRole } from './role-words.ts';

export interface RoleValues {
  roles: Role[];
  clientId: string | null;
}

const roles = Object.entries(roleWords) as [Role, { label: string; hint: string }][];

export interface RolesFieldsProps<Values extends RoleValues> {
  control: Control<Values>;
  /** Opens a sheet for a new client beside the sheet of these fields: within it, Escape would close both. */
  onAddClient: () => void;
}

/** Roles of a person and, for a client, the organisation; the refusal of the server stands with them. */
export function RolesFields<Values extends RoleValues>({ control: given, onAddClient }: RolesFieldsProps<Values>) {
  // What is read here is the same in every form that holds roles.
  const control = given as unknown as Control<RoleValues>;
  const { field, fieldState } = useController({
    control,
    name: 'roles',
    rules: { validate: (held) => held.length > 0 || 'Choose at least one role.' },
  });
  const isClient = useWatch({ control, name: 'roles' }).includes('client');
  return (
    <>
      <View role="group" aria-label="Roles">
        <Stack gap={2}>
          <Text strong>Roles</Text>
          {roles.map(([role, { label, hint }]) => (
            <Checkbox
              key={role}
              label={label}
              hint={hint}
              value={field.value.includes(role)}
              onChange={(ticked) => field.onChange(withRole(field.value, role, ticked))}
            />
          ))}
          {fieldState.error?.message ? (
            <Text size="note" tone="minium" strong live>
              {fieldState.error.message}
            </Text>
          ) : null}
        </Stack>
      </View>
      {isClient ? <ClientOrganisation control={control} onAddClient={onAddClient} /> : null}
    </>
  );
}

function ClientOrganisation({ control, onAddClient }: { control: Control<RoleValues>; onAddClient: () => void }) {
  const firm = useFirm();
  const clients = useClientsQuery(firm.firmId);
  return (
    <Stack gap={2}>
      <FormSelect
        control={control}
        name="clientId"
        label="Client organisation"
        options={(clients.data?.items ?? []).map((client) => ({ value: client.id, label: client.name }))}
        placeholder="Choose a client"
        check={(clientId) => (clientId === null ? 'Choose the organisation whose reports the person may see.' : null)}
      />
      {clients.isError ? <Problem error={clients.error} onRetry={clients.refetch} /> : null}
      <Row>
        <Button kind="quiet" onPress={onAddClient}>
          Add a client
        </Button>
      </Row>
    </Stack>
  );
}
