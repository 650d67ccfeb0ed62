import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import type { Membership } from '../../lib/session.tsx';
import { Button, Form, FormTextField, Notice, Row } from '../../ui/index.ts';
import { useEditMeMutation } from './account.api.ts';

const longest = 80;

/** The licence that a signature of this person begins with; whoever signs can still change it there. */
export function LicenceForm({ firm: { firmId, firmName, licenceNumber, licenceJurisdiction } }: { firm: Membership }) {
  const edit = useEditMeMutation(firmId);
  const form = useForm({ defaultValues: { licenceNumber, licenceJurisdiction } });
  const [saved, setSaved] = useState(false);
  const { control, formState } = form;
  const submit = form.handleSubmit(async (typed) => {
    setSaved(false);
    const licence = { licenceNumber: typed.licenceNumber.trim(), licenceJurisdiction: typed.licenceJurisdiction.trim() };
    try {
      await edit.mutateAsync(licence);
      form.reset(licence);
      setSaved(true);
    } catch (error) {
      showProblem(form, error);
    }
  });
  return (
    <Form onSubmit={submit} label={`Licence at ${firmName}`}>
      <FormTextField
        control={control}
        name="licenceNumber"
        label="Licence number"
        optional
        figures
        maxLength={longest}
        hint="Stands ready when you sign a report"
      />
      <FormTextField
        control={control}
        name="licenceJurisdiction"
        label="Jurisdiction of the licence"
        optional
        maxLength={longest}
        hint="The state, country or body that gave it"
      />
      {formState.errors.root?.message ? (
        <Notice kind="problem" alert>
          {formState.errors.root.message}
        </Notice>
      ) : null}
      {saved && !formState.isDirty ? <Notice alert>The licence is saved.</Notice> : null}
      <Row>
        <Button onPress={submit} busy={formState.isSubmitting}>
          Save the licence
        </Button>
      </Row>
    </Form>
  );
}
