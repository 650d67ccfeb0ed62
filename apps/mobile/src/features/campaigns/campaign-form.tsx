import type { ReactNode } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import type { QuantityRules } from '../../lib/quantity-entry.ts';
import { Columns, Form, FormQuantityField, FormTextField, Heading, Notice, Panel } from '../../ui/index.ts';
import { BasisFields } from './basis-fields.tsx';
import type { CampaignValues } from './campaign-form-values.ts';
import { problemOfDay, readDay } from './day-text.ts';
import { InstrumentFields } from './instrument-fields.tsx';

interface CampaignFormProps {
  form: UseFormReturn<CampaignValues>;
  onSubmit: () => void;
  /** What stands before the rest: the structure and its cables, or the state. */
  first?: ReactNode;
}

const temperature = (name: string): QuantityRules => ({ name, kind: 'temperature', from: -60, to: 90 });

/** Everything that is said of a campaign and agreed before it. */
export function CampaignForm({ form, onSubmit, first }: CampaignFormProps) {
  const { control, formState } = form;
  const startsOn = useWatch({ control, name: 'startsOn' });
  return (
    <Form onSubmit={onSubmit} label="Campaign">
      {first}
      <Panel>
        <Heading level={2}>The survey</Heading>
        <FormTextField
          control={control}
          name="name"
          label="Name"
          hint="As it will stand in the report: “Autumn survey 2026”."
          maxLength={120}
          check={needed('Give the campaign a name.')}
        />
        <Columns>
          {[
            <FormTextField
              key="from"
              control={control}
              name="startsOn"
              label="First day"
              autoComplete="off"
              check={(text) => problemOfDay(text, { name: 'The first day', required: true })}
            />,
            <FormTextField
              key="to"
              control={control}
              name="endsOn"
              label="Last day"
              optional
              autoComplete="off"
              check={(text) => problemOfDay(text, { name: 'The last day' }) ?? notBefore(text, startsOn)}
            />,
          ]}
        </Columns>
        <FormTextField control={control} name="crew" label="Crew" optional maxLength={300} />
        <FormTextField
          control={control}
          name="stage"
          label="Stage of the structure"
          hint="Tensions are compared with references of the same stage: “in service”, “before asphalt”."
          maxLength={120}
          check={needed('Name the stage: only references of the same stage are compared with.')}
        />
      </Panel>
      <Panel>
        <Heading level={2}>Conditions</Heading>
        <FormTextField control={control} name="weather" label="Weather" optional maxLength={300} />
        <Columns>
          {[
            <FormQuantityField
              key="steel"
              control={control}
              name="steelTemperature"
              label="Steel temperature"
              optional
              signed
              rules={temperature('The steel temperature')}
            />,
            <FormQuantityField
              key="air"
              control={control}
              name="airTemperature"
              label="Air temperature"
              optional
              signed
              rules={temperature('The air temperature')}
            />,
          ]}
        </Columns>
        <FormTextField control={control} name="traffic" label="Traffic" optional maxLength={300} hint="“open, light”, “closed at night”" />
        <InstrumentFields form={form} />
      </Panel>
      <BasisFields form={form} />
      {formState.errors.root ? <Notice kind="problem">{formState.errors.root.message}</Notice> : null}
    </Form>
  );
}

function needed(sentence: string) {
  return (text: string) => (text.trim() === '' ? sentence : null);
}

function notBefore(text: string, startsOn: string): string | null {
  const [first, last] = [readDay(startsOn), readDay(text)];
  return first !== null && last !== null && last < first ? 'The last day must not be before the first.' : null;
}
