import { type UseFormReturn, useWatch } from 'react-hook-form';
import type { QuantityEntry } from '../../lib/quantity-entry.ts';
import { Columns, FormChoice, FormQuantityField, FormSelect, FormTextField, Heading, Panel, Text } from '../../ui/index.ts';
import { optionsOf, referenceWords } from '../site/site-words.ts';
import type { CampaignValues } from './campaign-form-values.ts';

const references = [...optionsOf(referenceWords), { value: 'none' as const, label: 'none agreed' }];
const limitChoices = [
  { value: 'none', label: 'None agreed', hint: 'Tensions are given with their intervals, without a zone.' },
  { value: 'agreed', label: 'Agreed with the client' },
] as const;

/** What was agreed with the client before the work. There is no default limit, so the question waits for its answer. */
export function BasisFields({ form }: { form: UseFormReturn<CampaignValues> }) {
  const { control } = form;
  const [referenceKind, limits] = useWatch({ control, name: ['referenceKind', 'limits'] });
  const compares = referenceKind !== null && referenceKind !== 'none';
  return (
    <Panel>
      <Heading level={2}>Basis of assessment</Heading>
      <Text tone="muted">Agreed with the client before the work begins.</Text>
      <FormSelect
        control={control}
        name="referenceKind"
        label="Reference that tensions are compared with"
        options={references}
        check={(value) => (value === null ? 'Choose the reference, or that none was agreed.' : null)}
      />
      {compares ? (
        <FormChoice
          control={control}
          name="limits"
          label="Limits around the reference"
          options={limitChoices}
          check={(value) => (value === null ? 'Say whether limits were agreed.' : null)}
        />
      ) : null}
      {compares && limits === 'agreed' ? <LimitFields form={form} /> : null}
      <FormTextField
        control={control}
        name="decisionRule"
        label="Decision rule"
        optional
        rows={2}
        maxLength={400}
        hint="How an interval that crosses a limit is treated, in the words agreed."
      />
      <FormTextField
        control={control}
        name="criticalContact"
        label="Whom to call at once about a critical finding"
        optional
        maxLength={200}
      />
    </Panel>
  );
}

function LimitFields({ form }: { form: UseFormReturn<CampaignValues> }) {
  const { control, getValues } = form;
  // One side alone may be agreed; neither is no limit at all.
  const oneNeeded = (other: 'below' | 'above') => (entry: QuantityEntry) =>
    entry.si === null && getValues(other).si === null ? 'Give at least one of the two limits.' : null;
  return (
    <Columns>
      {[
        <FormQuantityField
          key="below"
          control={control}
          name="below"
          label="Not more below the reference than"
          optional
          rules={{ name: 'The lower limit', kind: 'percent', above: 0, to: 0.99 }}
          check={oneNeeded('above')}
        />,
        <FormQuantityField
          key="above"
          control={control}
          name="above"
          label="Not more above the reference than"
          optional
          rules={{ name: 'The upper limit', kind: 'percent', above: 0, to: 4 }}
          check={oneNeeded('below')}
        />,
      ]}
    </Columns>
  );
}
