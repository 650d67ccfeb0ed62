import type { Cable, Section } from '@strandnote/api/contract';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { useFieldArray, useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { useUnits } from '../../lib/units.tsx';
import { useFormDraft } from '../../lib/use-form-draft.ts';
import {
  Button,
  Columns,
  Form,
  FormQuantityField,
  FormSelect,
  FormTextField,
  Heading,
  Loading,
  Notice,
  Page,
  Panel,
  Problem,
  Row,
} from '../../ui/index.ts';
import { cableKindWords, optionsOf } from '../structures/structure-words.ts';
import { useCablesQuery, useStructureQuery } from '../structures/structures.api.ts';
import { type CableValues, cableValues, newCable, newSpan } from './cable-values.ts';
import { useCableQuery, useSectionsQuery } from './cables.api.ts';
import { SectionFields } from './section-fields.tsx';
import { SpanFields } from './span-fields.tsx';
import { useSaveCable } from './use-save-cable.ts';

/** Adds a cable to the structure of the address, or edits the cable of the address. */
export function CableFormScreen() {
  const firm = useFirm();
  const address = useLocalSearchParams<{ structure?: string; cable?: string }>();
  const cable = useCableQuery(firm.firmId, address.cable ?? null);
  const structureId = address.structure ?? cable.data?.structureId ?? '';
  const title = address.cable ? 'Edit the cable' : 'Add a cable';
  if (address.cable && cable.isPending) return <Page title={title}>{<Loading />}</Page>;
  if (cable.isError && !cable.data) return <Page title={title}>{<Problem error={cable.error} onRetry={cable.refetch} />}</Page>;
  return <LoadedForm key={structureId} structureId={structureId} stored={cable.data ?? null} title={title} />;
}

function LoadedForm({ structureId, stored, title }: { structureId: string; stored: Cable | null; title: string }) {
  const firm = useFirm();
  const structure = useStructureQuery(firm.firmId, structureId);
  const sections = useSectionsQuery(firm.firmId, structureId);
  const cables = useCablesQuery(firm.firmId, structureId);
  // Once there, the form stays: a later refetch that fails must not take away what is being typed.
  if (!structure.data || !sections.data || !cables.data) {
    const error = structure.error ?? sections.error ?? cables.error;
    if (!error) return <Page title={title}>{<Loading />}</Page>;
    const retry = () => Promise.all([structure.refetch(), sections.refetch(), cables.refetch()]);
    return <Page title={title}>{<Problem error={error} onRetry={retry} />}</Page>;
  }
  const position = stored?.position ?? Math.max(0, ...cables.data.items.map((cable) => cable.position + 1));
  return (
    <Page
      title={title}
      breadcrumb={[
        { label: 'Structures', href: `/${firm.firmId}/structures` },
        { label: structure.data.name, href: `/${firm.firmId}/structures/${structureId}` },
      ]}
    >
      <CableForm structureId={structureId} stored={stored} sections={sections.data.items} position={position} />
    </Page>
  );
}

interface CableFormProps {
  structureId: string;
  stored: Cable | null;
  sections: readonly Section[];
  position: number;
}

function CableForm({ structureId, stored, sections, position }: CableFormProps) {
  const firm = useFirm();
  const router = useRouter();
  const { system } = useUnits();
  const form = useForm<CableValues>({ defaultValues: stored ? cableValues(stored, system) : newCable() });
  const spans = useFieldArray({ control: form.control, name: 'spans' });
  const forget = useFormDraft(form, stored ? `cable ${stored.id}` : `cable of ${structureId}`);
  const save = useSaveCable(structureId, stored, position);
  const submit = form.handleSubmit(async (values) => {
    try {
      const cableId = await save(values);
      forget();
      router.replace(`/${firm.firmId}/structures/cables/${cableId}` as '/');
    } catch (error) {
      showProblem(form, error);
    }
  });
  const { control, formState } = form;
  const wrong = formState.isSubmitted && Object.keys(formState.errors).some((name) => name !== 'root');
  return (
    <Form onSubmit={submit}>
      <Panel>
        <Heading level={2}>Names</Heading>
        <Columns>
          <FormTextField
            control={control}
            name="reference"
            label="Our reference"
            hint="Such as W-07u"
            figures
            maxLength={40}
            check={(text) => (text.trim() === '' ? 'Give the cable a reference.' : null)}
          />
          <FormTextField control={control} name="ownerReference" label="Owner’s reference" optional figures maxLength={40} />
          <FormTextField control={control} name="paintedMark" label="Mark painted on it" optional figures maxLength={40} />
        </Columns>
        <FormSelect
          control={control}
          name="kind"
          label="Kind"
          options={optionsOf(cableKindWords)}
          check={(kind) => (kind === null ? 'Choose what kind of cable it is.' : null)}
        />
      </Panel>
      <SectionFields form={form} sections={sections} />
      {spans.fields.map((field, index) => (
        <SpanFields key={field.id} form={form} index={index} several={spans.fields.length > 1} />
      ))}
      <Row>
        <Button onPress={() => spans.append(newSpan())}>Add a span between deviators</Button>
        {spans.fields.length > 1 ? <Button onPress={() => spans.remove(spans.fields.length - 1)}>Remove the last span</Button> : null}
      </Row>
      {stored ? null : <DesignTension control={control} />}
      {wrong ? <Notice kind="problem">Some fields are not right yet. What is wrong stands beside each.</Notice> : null}
      {formState.errors.root ? <Notice kind="problem">{formState.errors.root.message}</Notice> : null}
      <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
        {stored ? 'Save the cable' : 'Add the cable'}
      </Button>
    </Form>
  );
}

function DesignTension({ control }: Pick<ReturnType<typeof useForm<CableValues>>, 'control'>) {
  return (
    <Panel>
      <Heading level={2}>Design tension</Heading>
      <Columns>
        <FormQuantityField
          control={control}
          name="designTension"
          label="Design tension, mean chord"
          optional
          rules={{ name: 'The design tension', kind: 'force', above: 0, to: 1e9 }}
        />
        <FormTextField
          control={control}
          name="designStage"
          label="Construction stage"
          optional
          hint="The same words as in the campaign: In service, permanent load"
          maxLength={120}
        />
        <FormTextField control={control} name="designSource" label="Source" optional hint="Drawing or calculation sheet" maxLength={200} />
      </Columns>
    </Panel>
  );
}
