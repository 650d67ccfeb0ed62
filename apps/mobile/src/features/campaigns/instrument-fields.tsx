import { type UseFormReturn, useFieldArray, useWatch } from 'react-hook-form';
import { Button, Columns, FormTextField, Heading, Row, Rule, Stack, Text } from '../../ui/index.ts';
import { type CampaignValues, emptyInstrument, isEmptyInstrument } from './campaign-form-values.ts';
import { problemOfDay, readDay } from './day-text.ts';

/** The instruments with their calibration; one that has run out is said, not refused. */
export function InstrumentFields({ form }: { form: UseFormReturn<CampaignValues> }) {
  const { control } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'instruments' });
  return (
    <Stack gap={4}>
      <Heading level={3}>Instruments</Heading>
      {fields.map((field, index) => (
        <Stack key={field.id} gap={3}>
          {index > 0 ? <Rule /> : null}
          <Instrument form={form} index={index} onRemove={() => remove(index)} />
        </Stack>
      ))}
      <Row>
        <Button onPress={() => append(emptyInstrument)}>Add an instrument</Button>
      </Row>
    </Stack>
  );
}

function Instrument({ form, index, onRemove }: { form: UseFormReturn<CampaignValues>; index: number; onRemove: () => void }) {
  const { control } = form;
  const [instrument, startsOn] = useWatch({ control, name: [`instruments.${index}`, 'startsOn'] });
  const due = readDay(instrument?.calibrationDue ?? '');
  const first = readDay(startsOn);
  const checkName = (text: string) => (text.trim() === '' && instrument && !isEmptyInstrument(instrument) ? 'Name the instrument.' : null);
  return (
    <Stack gap={3}>
      <Columns>
        {[
          <FormTextField
            key="name"
            control={control}
            name={`instruments.${index}.name`}
            label="Instrument"
            optional
            maxLength={80}
            check={checkName}
          />,
          <FormTextField
            key="serial"
            control={control}
            name={`instruments.${index}.serial`}
            label="Serial number"
            optional
            maxLength={60}
          />,
        ]}
      </Columns>
      <Columns>
        {[
          <FormTextField
            key="on"
            control={control}
            name={`instruments.${index}.calibratedOn`}
            label="Calibrated on"
            optional
            autoComplete="off"
            check={(text) => problemOfDay(text, { name: 'The day of the calibration' })}
          />,
          <FormTextField
            key="due"
            control={control}
            name={`instruments.${index}.calibrationDue`}
            label="Calibration due"
            optional
            autoComplete="off"
            check={(text) => problemOfDay(text, { name: 'The day when calibration is due' })}
          />,
        ]}
      </Columns>
      {due !== null && first !== null && due < first ? (
        <Text size="note" tone="ochre">
          Its calibration runs out before the survey begins. The report will show that.
        </Text>
      ) : null}
      <Row>
        <Button kind="quiet" onPress={onRemove} label={`Remove the instrument ${instrument?.name || index + 1}`}>
          Remove this instrument
        </Button>
      </Row>
    </Stack>
  );
}
