import type { Structure } from '@strandnote/api/contract';
import { type UseFormReturn, useController, useWatch } from 'react-hook-form';
import { useFirm } from '../../lib/session.tsx';
import { Button, Checkbox, FormChoice, FormSelect, Heading, Loading, Panel, Problem, Row, Stack, Text } from '../../ui/index.ts';
import { useCablesQuery } from '../structures/structures.api.ts';
import type { CampaignValues } from './campaign-form-values.ts';

interface CableChoiceProps {
  form: UseFormReturn<CampaignValues>;
  structures: readonly Structure[];
}

const scopes = [
  { value: 'all', label: 'All its cables' },
  { value: 'chosen', label: 'Only some of them' },
] as const;

/** Which structure is surveyed, and which of its cables. */
export function CableChoice({ form, structures }: CableChoiceProps) {
  const { control } = form;
  const [structureId, cables] = useWatch({ control, name: ['structureId', 'cables'] });
  const structure = structures.find(({ id }) => id === structureId);
  return (
    <Panel>
      <Heading level={2}>What is surveyed</Heading>
      <FormSelect
        control={control}
        name="structureId"
        label="Structure"
        options={structures.map(({ id, name }) => ({ value: id, label: name }))}
        placeholder="Choose the structure"
        check={(value) => (value === null ? 'Choose the structure that is surveyed.' : null)}
      />
      {structure ? (
        <FormChoice
          control={control}
          name="cables"
          label={`Cables of ${structure.name}, ${structure.cableCount} in all`}
          options={scopes}
          row
        />
      ) : null}
      {structure && cables === 'chosen' ? <ChosenCables form={form} structureId={structure.id} /> : null}
    </Panel>
  );
}

function ChosenCables({ form, structureId }: { form: UseFormReturn<CampaignValues>; structureId: string }) {
  const firm = useFirm();
  const cables = useCablesQuery(firm.firmId, structureId);
  const { field, fieldState } = useController({
    control: form.control,
    name: 'cableIds',
    rules: { validate: (ids: string[]) => ids.length > 0 || 'Choose at least one cable.' },
  });
  if (cables.isPending) return <Loading what="the cables" />;
  if (cables.isError) return <Problem error={cables.error} onRetry={cables.refetch} />;
  const { items } = cables.data;
  const chosen = new Set(field.value.filter((id) => items.some((cable) => cable.id === id)));
  const toggle = (id: string) => field.onChange(items.map((cable) => cable.id).filter((other) => (other === id) !== chosen.has(other)));
  return (
    <Stack gap={2}>
      <Row justify="space-between">
        <Text>{`${chosen.size} of ${items.length} chosen`}</Text>
        <Row gap={1}>
          <Button kind="quiet" onPress={() => field.onChange(items.map(({ id }) => id))}>
            Choose all
          </Button>
          <Button kind="quiet" onPress={() => field.onChange([])}>
            Choose none
          </Button>
        </Row>
      </Row>
      <Row gap={5}>
        {items.map(({ id, reference }) => (
          <Checkbox key={id} label={reference} value={chosen.has(id)} onChange={() => toggle(id)} />
        ))}
      </Row>
      {fieldState.error ? (
        <Text size="note" tone="minium" strong live>
          {fieldState.error.message}
        </Text>
      ) : null}
    </Stack>
  );
}
