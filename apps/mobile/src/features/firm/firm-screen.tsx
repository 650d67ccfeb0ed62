import type { Firm } from '@strandnote/api/contract';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, Definitions, Form, FormTextField, Loading, Notice, Page, Problem } from '../../ui/index.ts';
import { useEditFirmMutation, useFirmQuery } from './firm.api.ts';

const breadcrumb = [{ label: 'Account', href: '/account' }];
const mostLines = 6;
const longestLine = 120;

/** How the firm stands on its reports. */
export function FirmScreen() {
  const { firmId, ...membership } = useFirm();
  const firm = useFirmQuery(firmId);
  if (firm.isPending) return <Page title="Firm">{<Loading />}</Page>;
  if (firm.isError) return <Page title="Firm">{<Problem error={firm.error} onRetry={firm.refetch} />}</Page>;
  return (
    <Page title="Firm" breadcrumb={breadcrumb} narrow>
      {hasRole({ firmId, ...membership }, 'admin') ? <FirmForm firm={firm.data} /> : <FirmFacts firm={firm.data} />}
    </Page>
  );
}

function FirmFacts({ firm: { name, letterhead, timeZone, reportPrefix } }: { firm: Firm }) {
  return (
    <Definitions
      items={[
        { term: 'Name', value: name },
        { term: 'Address', value: letterhead.addressLines.join(', ') || 'not stated' },
        { term: 'Phone', value: letterhead.phone || 'not stated' },
        { term: 'E-mail address', value: letterhead.email || 'not stated' },
        { term: 'Registration', value: letterhead.registration || 'not stated' },
        { term: 'Time zone', value: timeZone },
        { term: 'Report numbers begin with', value: reportPrefix },
      ]}
    />
  );
}

interface Values {
  name: string;
  addressLines: string;
  phone: string;
  email: string;
  registration: string;
  timeZone: string;
  reportPrefix: string;
}

function valuesOf({ name, letterhead, timeZone, reportPrefix }: Firm): Values {
  const { addressLines, ...rest } = letterhead;
  return { name, ...rest, addressLines: addressLines.join('\n'), timeZone, reportPrefix };
}

function linesOf(text: string): string[] {
  return text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
}

function problemOfLines(text: string): string | null {
  const lines = linesOf(text);
  if (lines.length > mostLines) return `The letterhead has room for ${mostLines} lines; these are ${lines.length}.`;
  const long = lines.findIndex((line) => line.length > longestLine);
  return long < 0 ? null : `Line ${long + 1} is longer than ${longestLine} characters.`;
}

/** The field of the form for a path of the body: "letterhead.addressLines.2" is a line in the one field of lines. */
function fieldOf(path: string): string {
  const [first, second] = path.split('.');
  return (first === 'letterhead' ? second : first) ?? path;
}

function FirmForm({ firm }: { firm: Firm }) {
  const edit = useEditFirmMutation(firm.id);
  const form = useForm<Values>({ defaultValues: valuesOf(firm) });
  const [saved, setSaved] = useState(false);
  const { formState } = form;
  const submit = form.handleSubmit(async ({ name, timeZone, reportPrefix, addressLines, phone, email, registration }) => {
    setSaved(false);
    const letterhead = { addressLines: linesOf(addressLines), phone, email, registration };
    try {
      form.reset(valuesOf(await edit.mutateAsync({ name, timeZone, reportPrefix, letterhead })));
      setSaved(true);
    } catch (error) {
      showProblem(form, error, fieldOf);
    }
  });
  return (
    <Form onSubmit={submit} label="Firm">
      <FirmFields form={form} />
      {formState.errors.root?.message ? (
        <Notice kind="problem" alert>
          {formState.errors.root.message}
        </Notice>
      ) : null}
      {saved && !formState.isDirty ? (
        <Notice alert>Saved. Reports issued from now on carry it; issued ones stay as they are.</Notice>
      ) : null}
      <Button kind="primary" onPress={submit} busy={formState.isSubmitting}>
        Save the firm
      </Button>
    </Form>
  );
}

function FirmFields({ form: { control } }: { form: Pick<ReturnType<typeof useForm<Values>>, 'control'> }) {
  return (
    <>
      <FormTextField
        control={control}
        name="name"
        label="Name"
        maxLength={120}
        check={(text) => (text.trim() === '' ? 'Give the firm a name.' : null)}
      />
      <FormTextField
        control={control}
        name="addressLines"
        label="Letterhead"
        optional
        rows={4}
        hint={`The address as it stands at the head of a report, at most ${mostLines} lines`}
        check={problemOfLines}
      />
      <FormTextField control={control} name="phone" label="Phone" optional inputMode="tel" maxLength={60} />
      <FormTextField control={control} name="email" label="E-mail address" optional inputMode="email" maxLength={120} />
      <FormTextField
        control={control}
        name="registration"
        label="Registration"
        optional
        hint="Number in the register of companies or of firms of engineers"
        maxLength={200}
      />
      <FormTextField
        control={control}
        name="timeZone"
        label="Time zone"
        hint="Times of the audit trail and of issue are shown in it: Europe/London"
        maxLength={60}
        check={(text) => (text.trim() === '' ? 'Give the time zone.' : null)}
      />
      <FormTextField
        control={control}
        name="reportPrefix"
        label="Report numbers begin with"
        figures
        maxLength={12}
        check={(text) => (text.trim() === '' ? 'Give the letters that report numbers begin with.' : null)}
      />
    </>
  );
}
