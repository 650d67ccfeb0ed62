import type { Structure } from '@strandnote/api/contract';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Form, FormSelect, FormTextField, Loading, Notice, Page, Problem } from '../../ui/index.ts';
import { useClientsQuery } from '../clients/clients.api.ts';
import { linesAsText, readLines } from './elevation-text.ts';
import { optionsOf, structureKindWords } from './structure-words.ts';
import { useCreateStructureMutation, useEditStructureMutation, useStructureQuery } from './structures.api.ts';

interface Values {
  name: string;
  reference: string;
  kind: Structure['kind'] | null;
  ownerName: string;
  clientId: string | null;
  place: string;
  timeZone: string;
  deck: string;
  supports: string;
  notes: string;
}

/** Adds a structure, or edits the one of the address. */
export function StructureFormScreen() {
  const { structure: structureId } = useLocalSearchParams<{ structure?: string }>();
  return structureId ? <EditStructure structureId={structureId} /> : <AddStructure />;
}

function AddStructure() {
  const firm = useFirm();
  const create = useCreateStructureMutation(firm.firmId);
  return <StructureForm title="Add a structure" stored={null} save={(body) => create.mutateAsync({ ...body, id: crypto.randomUUID() })} />;
}

function EditStructure({ structureId }: { structureId: string }) {
  const firm = useFirm();
  const structure = useStructureQuery(firm.firmId, structureId);
  const edit = useEditStructureMutation(firm.firmId, structureId);
  if (structure.isPending) return <Page title="Edit the structure">{<Loading />}</Page>;
  if (structure.isError) return <Page title="Edit the structure">{<Problem error={structure.error} onRetry={structure.refetch} />}</Page>;
  return <StructureForm title={`Edit ${structure.data.name}`} stored={structure.data} save={(body) => edit.mutateAsync(body)} />;
}

interface StructureFormProps {
  title: string;
  stored: Structure | null;
  save: (body: Omit<Structure, 'id' | 'cableCount'>) => Promise<Structure>;
}

function StructureForm({ title, stored, save }: StructureFormProps) {
  const firm = useFirm();
  const router = useRouter();
  const clients = useClientsQuery(firm.firmId);
  const form = useForm<Values>({
    defaultValues: {
      name: stored?.name ?? '',
      reference: stored?.reference ?? '',
      kind: stored?.kind ?? null,
      ownerName: stored?.ownerName ?? '',
      clientId: stored?.clientId ?? null,
      place: stored?.place ?? '',
      timeZone: stored?.timeZone ?? firm.timeZone,
      deck: linesAsText(stored?.elevation ? [stored.elevation.deck] : []),
      supports: linesAsText(stored?.elevation?.supports ?? []),
      notes: stored?.notes ?? '',
    },
  });
  const submit = form.handleSubmit(async ({ deck, supports, kind, ...values }) => {
    const [deckLine = []] = readLines(deck) ?? [];
    const supportLines = readLines(supports) ?? [];
    const elevation = deckLine.length + supportLines.length === 0 ? null : { deck: deckLine, supports: supportLines };
    try {
      const saved = await save({ ...values, kind: kind!, elevation });
      router.replace(`/${firm.firmId}/structures/${saved.id}` as '/');
    } catch (error) {
      showProblem(form, error);
    }
  });
  const checkLines = (text: string) =>
    readLines(text) === null ? 'Each line holds x and z in m, such as “-110 60”; an empty line begins the next polyline.' : null;
  const { control, formState } = form;
  return (
    <Page title={title} breadcrumb={[{ label: 'Structures', href: `/${firm.firmId}/structures` }]} narrow>
      <Form onSubmit={submit}>
        <FormTextField
          control={control}
          name="name"
          label="Name"
          maxLength={120}
          check={(text) => (text.trim() === '' ? 'Give the structure a name.' : null)}
        />
        <FormSelect
          control={control}
          name="kind"
          label="Kind"
          options={optionsOf(structureKindWords)}
          check={(kind) => (kind === null ? 'Choose what kind of structure it is.' : null)}
        />
        <FormTextField control={control} name="reference" label="Owner’s reference" optional maxLength={60} />
        <FormTextField control={control} name="ownerName" label="Owner" optional maxLength={120} />
        <FormSelect
          control={control}
          name="clientId"
          label="Client who orders the work"
          optional
          options={(clients.data?.items ?? []).map((client) => ({ value: client.id, label: client.name }))}
          placeholder="Not chosen yet"
        />
        <FormTextField control={control} name="place" label="Place" optional maxLength={200} />
        <FormTextField
          control={control}
          name="timeZone"
          label="Time zone"
          hint="Dates of its surveys are shown in it: Europe/London"
          maxLength={60}
        />
        <FormTextField
          control={control}
          name="deck"
          label="Deck line for the elevation"
          optional
          rows={3}
          figures
          hint="x and z in m, one point a line"
          check={checkLines}
        />
        <FormTextField
          control={control}
          name="supports"
          label="Towers, arches or columns for the elevation"
          optional
          rows={4}
          figures
          hint="x and z in m, one point a line, an empty line between two of them"
          check={checkLines}
        />
        <FormTextField control={control} name="notes" label="Notes" optional rows={3} maxLength={2000} />
        {formState.errors.root ? <Notice kind="problem">{formState.errors.root.message}</Notice> : null}
        <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
          {stored ? 'Save the structure' : 'Add the structure'}
        </Button>
      </Form>
    </Page>
  );
}
