import { freeLength, questionPlausibility } from '@strandnote/core';
import type { UseFormReturn } from 'react-hook-form';
import { useUnits } from '../../lib/units.tsx';
import { Columns, FormChoice, FormQuantityField, FormSelect, FormTextField, Heading, Notice, Panel, Stack } from '../../ui/index.ts';
import { optionsOf } from '../structures/structure-words.ts';
import type { CableValues } from './cable-values.ts';
import { endWords, sourceWords } from './cable-words.ts';

const damperOptions = [
  { value: 'none', label: 'None' },
  { value: 'fitted', label: 'Fitted' },
] as const;

/** One length that vibrates on its own: chord, deductions, ends and dampers. With one span nobody sees the word. */
export function SpanFields({ form, index, several }: { form: UseFormReturn<CableValues>; index: number; several: boolean }) {
  const { control } = form;
  const at = `spans.${index}` as const;
  const source = (name: 'chordLengthSource' | 'deductionSource', label: string) => (
    <FormSelect
      control={control}
      name={`${at}.${name}`}
      label={label}
      options={optionsOf(sourceWords)}
      check={(value) => (value === null ? 'Choose where the value comes from.' : null)}
    />
  );
  const tolerance = (name: 'chordLengthTolerance' | 'lowerDeductionTolerance' | 'upperDeductionTolerance', label: string) => (
    <FormQuantityField
      control={control}
      name={`${at}.${name}`}
      label={label}
      rules={{ name: 'The tolerance', kind: 'small-length', required: true, above: 0, to: 5 }}
    />
  );
  return (
    <Panel>
      <Heading level={2}>{several ? `Span ${index + 1}` : 'Length and ends'}</Heading>
      {several ? <FormTextField control={control} name={`${at}.name`} label="Name of the span" optional maxLength={40} /> : null}
      <Columns>
        <FormQuantityField
          control={control}
          name={`${at}.chordLength`}
          label="Chord between working points"
          rules={{ name: 'The chord', kind: 'length', required: true, above: 0, to: 3000 }}
          check={() =>
            freeLengthOf(form, index) === null ? 'The deductions leave no free length: the chord must be longer than both together.' : null
          }
        />
        {tolerance('chordLengthTolerance', 'Tolerance of the chord, ±')}
        {source('chordLengthSource', 'Where the chord comes from')}
      </Columns>
      <Columns>
        <FormQuantityField
          control={control}
          name={`${at}.lowerDeduction`}
          label="Lower deduction"
          hint="Socket, guide pipe to bushing"
          rules={{ name: 'The lower deduction', kind: 'length', required: true, from: 0, to: 100 }}
        />
        {tolerance('lowerDeductionTolerance', 'Its tolerance, ±')}
      </Columns>
      <Columns>
        <FormQuantityField
          control={control}
          name={`${at}.upperDeduction`}
          label="Upper deduction"
          rules={{ name: 'The upper deduction', kind: 'length', required: true, from: 0, to: 100 }}
        />
        {tolerance('upperDeductionTolerance', 'Its tolerance, ±')}
        {source('deductionSource', 'Where the deductions come from')}
      </Columns>
      <FreeLength form={form} index={index} />
      <FormQuantityField
        control={control}
        name={`${at}.inclination`}
        label="Inclination from the horizontal"
        rules={{ name: 'The inclination', kind: 'angle', required: true, from: 0, to: Math.PI / 2 }}
      />
      <Columns>
        <EndFields form={form} index={index} end="lowerEnd" label="Lower end, as the drawings say" />
        <EndFields form={form} index={index} end="upperEnd" label="Upper end, as the drawings say" />
      </Columns>
      <Dampers form={form} index={index} />
    </Panel>
  );
}

function EndFields({
  form,
  index,
  end,
  label,
}: {
  form: UseFormReturn<CableValues>;
  index: number;
  end: 'lowerEnd' | 'upperEnd';
  label: string;
}) {
  const { control } = form;
  const at = `spans.${index}.${end}` as const;
  const kind = form.watch(`${at}.kind`);
  return (
    <Stack>
      <FormSelect
        control={control}
        name={`${at}.kind`}
        label={label}
        options={optionsOf(endWords)}
        check={(value) => (value === null ? 'Choose how this end is held; “unknown” is an answer.' : null)}
      />
      {kind === 'fixity' ? (
        <>
          <FormQuantityField
            control={control}
            name={`${at}.low`}
            label="Lowest fixity, 0 to 1"
            rules={{ name: 'The lowest fixity', kind: 'ratio', required: true, from: 0, to: 1 }}
          />
          <FormQuantityField
            control={control}
            name={`${at}.high`}
            label="Highest fixity, 0 to 1"
            rules={{ name: 'The highest fixity', kind: 'ratio', required: true, from: 0, to: 1 }}
          />
        </>
      ) : null}
      {kind === 'stiffness' ? (
        <FormQuantityField
          control={control}
          name={`${at}.rotationalStiffness`}
          label="Rotational stiffness"
          rules={{ name: 'The rotational stiffness', kind: 'rotational-stiffness', required: true, from: 0, to: 1e15 }}
        />
      ) : null}
    </Stack>
  );
}

function Dampers({ form, index }: { form: UseFormReturn<CableValues>; index: number }) {
  const { control } = form;
  const at = `spans.${index}` as const;
  const fitted = form.watch(`${at}.lowerDamper`) === 'fitted' || form.watch(`${at}.upperDamper`) === 'fitted';
  const asked = (value: string | null) => (value === null ? 'Say whether a damper is fitted.' : null);
  return (
    <>
      <Columns>
        <FormChoice
          control={control}
          name={`${at}.lowerDamper`}
          label="Damper at the lower end"
          options={damperOptions}
          row
          check={asked}
        />
        <FormChoice
          control={control}
          name={`${at}.upperDamper`}
          label="Damper at the upper end"
          options={damperOptions}
          row
          check={asked}
        />
      </Columns>
      {fitted ? (
        <FormQuantityField
          control={control}
          name={`${at}.damperPosition`}
          label="Distance of the damper from its end of the free length"
          rules={{ name: 'The position of the damper', kind: 'length', required: true, above: 0, to: 100 }}
        />
      ) : null}
    </>
  );
}

function FreeLength({ form, index }: { form: UseFormReturn<CableValues>; index: number }) {
  const units = useUnits();
  form.watch(`spans.${index}`);
  const free = freeLengthOf(form, index);
  if (free === null) return null;
  const questions = questionPlausibility({ length: free.length }, []);
  return (
    <Stack gap={2}>
      <Notice>{`Free length ${units.show(free.length, 'length')}, standard uncertainty ${units.show(free.standardUncertainty, 'small-length')}.`}</Notice>
      {questions.map((question) => (
        <Notice key={question.code} kind="caution">
          {question.message}
        </Notice>
      ))}
    </Stack>
  );
}

/** Free length of a span as far as it is typed (m); null where something is missing or nothing would be left. */
function freeLengthOf(form: UseFormReturn<CableValues>, index: number): { length: number; standardUncertainty: number } | null {
  const span = form.getValues(`spans.${index}`);
  const parts = [
    span.chordLength,
    span.lowerDeduction,
    span.upperDeduction,
    span.chordLengthTolerance,
    span.lowerDeductionTolerance,
    span.upperDeductionTolerance,
  ].map(({ si }) => si);
  const [chordLength, lowerDeduction, upperDeduction, chordLengthTolerance, lowerDeductionTolerance, upperDeductionTolerance] = parts;
  if (chordLength == null || lowerDeduction == null || upperDeduction == null) return null;
  if (chordLength - lowerDeduction - upperDeduction <= 0) return null;
  return freeLength({
    chordLength,
    lowerDeduction,
    upperDeduction,
    chordLengthTolerance: chordLengthTolerance ?? 0,
    lowerDeductionTolerance: lowerDeductionTolerance ?? 0,
    upperDeductionTolerance: upperDeductionTolerance ?? 0,
    inclination: 0,
    lowerEnd: { kind: 'unknown' },
    upperEnd: { kind: 'unknown' },
    damperPosition: null,
  });
}
