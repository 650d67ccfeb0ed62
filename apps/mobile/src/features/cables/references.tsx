import type { CableDetail } from '@strandnote/api/contract';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { emptyEntry, type QuantityEntry } from '../../lib/quantity-entry.ts';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { showDay } from '../../lib/show-time.ts';
import { useUnits } from '../../lib/units.tsx';
import {
  Button,
  Empty,
  Form,
  FormQuantityField,
  FormSelect,
  FormTextField,
  Heading,
  Notice,
  Panel,
  Row,
  Sheet,
  Stack,
  Text,
} from '../../ui/index.ts';
import { optionsOf } from '../structures/structure-words.ts';
import { placeWords, referenceKindWords } from './cable-words.ts';
import { useAddReferenceMutation, useRetireReferenceMutation } from './cables.api.ts';

/** The tensions that estimates of the cable are compared with. */
export function References({ cable }: { cable: CableDetail }) {
  const firm = useFirm();
  const units = useUnits();
  const retire = useRetireReferenceMutation(firm.firmId);
  const [adding, setAdding] = useState(false);
  const mayEdit = hasRole(firm, 'admin', 'engineer');
  const current = cable.references.filter(({ retiredAt }) => retiredAt === null);
  return (
    <Stack gap={2}>
      <Heading level={2}>Reference tensions</Heading>
      {current.length === 0 ? (
        <Empty>Design tension, lift-off or load-cell readings stand here, each for a stage and a place on the cable.</Empty>
      ) : null}
      {current.map((reference) => (
        <Panel key={reference.id} gap={1}>
          <Row justify="space-between">
            <Text strong>{referenceKindWords[reference.kind]}</Text>
            <Text strong figures>
              {units.show(reference.value, 'force')}
            </Text>
          </Row>
          <Text size="note" tone="muted">
            {[reference.stage, placeWords[reference.place], reference.source, reference.dated ? showDay(reference.dated) : '']
              .filter((part) => part !== '')
              .join(' · ')}
          </Text>
          {mayEdit ? (
            <Row>
              <Button
                kind="quiet"
                busy={retire.isPending}
                onPress={() => retire.mutate(reference.id)}
                label={`Retire the ${referenceKindWords[reference.kind]} tension`}
              >
                Retire
              </Button>
            </Row>
          ) : null}
        </Panel>
      ))}
      {retire.isError ? <Notice kind="problem">{retire.error.message}</Notice> : null}
      {mayEdit ? (
        <Row>
          <Button onPress={() => setAdding(true)}>Add a reference tension</Button>
        </Row>
      ) : null}
      {adding ? <ReferenceSheet cableId={cable.id} onClose={() => setAdding(false)} /> : null}
    </Stack>
  );
}

interface Values {
  kind: keyof typeof referenceKindWords | null;
  place: keyof typeof placeWords | null;
  value: QuantityEntry;
  uncertainty: QuantityEntry;
  stage: string;
  source: string;
  dated: string;
}

function ReferenceSheet({ cableId, onClose }: { cableId: string; onClose: () => void }) {
  const firm = useFirm();
  const add = useAddReferenceMutation(firm.firmId, cableId);
  const [id] = useState(() => crypto.randomUUID());
  const form = useForm<Values>({
    defaultValues: { kind: null, place: 'mean-chord', value: emptyEntry, uncertainty: emptyEntry, stage: '', source: '', dated: '' },
  });
  const save = form.handleSubmit(async ({ kind, place, value, uncertainty, stage, source, dated }) => {
    try {
      await add.mutateAsync({
        id,
        kind: kind!,
        place: place!,
        value: value.si!,
        relativeUncertainty: uncertainty.si,
        stage,
        source,
        dated: dated.trim() === '' ? null : dated.trim(),
      });
      onClose();
    } catch (error) {
      showProblem(form, error, (path) => (path === 'relativeUncertainty' ? 'uncertainty' : path));
    }
  });
  const { control, formState } = form;
  const filled = (sentence: string) => (text: string) => (text.trim() === '' ? sentence : null);
  const actions = (
    <Button kind="primary" onPress={save} busy={add.isPending}>
      Add the reference tension
    </Button>
  );
  return (
    <Sheet title="Add a reference tension" onClose={onClose} holds={formState.isDirty} actions={actions}>
      <Form onSubmit={save}>
        <FormSelect
          control={control}
          name="kind"
          label="Kind"
          options={optionsOf(referenceKindWords)}
          check={(kind) => (kind === null ? 'Choose what kind of reference it is.' : null)}
        />
        <FormQuantityField
          control={control}
          name="value"
          label="Tension"
          rules={{ name: 'The reference tension', kind: 'force', required: true, above: 0, to: 1e9 }}
        />
        <FormSelect control={control} name="place" label="Place on the cable" options={optionsOf(placeWords)} />
        <FormQuantityField
          control={control}
          name="uncertainty"
          label="Standard uncertainty"
          optional
          rules={{ name: 'The uncertainty', kind: 'percent', from: 0, to: 0.5 }}
        />
        <FormTextField
          control={control}
          name="stage"
          label="Construction stage"
          hint="The same words as in the campaign"
          maxLength={120}
          check={filled('Name the stage it holds for.')}
        />
        <FormTextField control={control} name="source" label="Source" maxLength={200} check={filled('Say where it comes from.')} />
        <FormTextField
          control={control}
          name="dated"
          label="Date"
          optional
          hint="2009-03-02"
          check={(text) => (text.trim() === '' || /^\d{4}-\d{2}-\d{2}$/.test(text.trim()) ? null : 'A date looks like 2009-03-02.')}
        />
        {formState.errors.root ? <Notice kind="problem">{formState.errors.root.message}</Notice> : null}
      </Form>
    </Sheet>
  );
}
