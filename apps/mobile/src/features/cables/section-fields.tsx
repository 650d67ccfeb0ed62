import type { Section } from '@strandnote/api/contract';
import { massPerLength, strandCatalogue, strandSection } from '@strandnote/core';
import type { UseFormReturn } from 'react-hook-form';
import { enteredValue } from '../../lib/quantity-entry.ts';
import { useUnits } from '../../lib/units.tsx';
import {
  Columns,
  FormQuantityField,
  FormSelect,
  FormTextField,
  Heading,
  Notice,
  Panel,
  QuantityField,
  Select,
  Stack,
  Text,
} from '../../ui/index.ts';
import { optionsOf } from '../structures/structure-words.ts';
import { type CableValues, newSection, sectionValues } from './cable-values.ts';
import { sourceWords } from './cable-words.ts';

const described = '';

/** What a metre of the cable is made of: a section that the structure has already, or a new one from the catalogue. */
export function SectionFields({ form, sections }: { form: UseFormReturn<CableValues>; sections: readonly Section[] }) {
  const { system } = useUnits();
  const chosen = form.watch('section.sectionId');
  const choose = (sectionId: string) => {
    const section = sections.find(({ id }) => id === sectionId);
    form.setValue('section', section ? sectionValues(section, system) : newSection);
  };
  const options = [{ value: described, label: 'A new section' }, ...sections.map(({ id, name }) => ({ value: id, label: name }))];
  return (
    <Panel>
      <Heading level={2}>Section</Heading>
      {sections.length > 0 ? <Select label="Section of the cable" value={chosen ?? described} onChange={choose} options={options} /> : null}
      {chosen === null ? (
        <NewSection form={form} />
      ) : (
        <Text tone="muted">Its values are edited with the section, for every cable that has it.</Text>
      )}
      <MassSummary form={form} />
    </Panel>
  );
}

function NewSection({ form }: { form: UseFormReturn<CableValues> }) {
  const { control } = form;
  const source = (name: 'modulusSource' | 'steelMassSource' | 'addedMassSource' | 'breakingLoadSource', label: string) => (
    <FormSelect
      control={control}
      name={`section.${name}`}
      label={label}
      options={optionsOf(sourceWords)}
      check={(value) => (value === null ? 'Choose where the value comes from.' : null)}
    />
  );
  return (
    <Stack>
      <CatalogueChoice form={form} />
      <FormTextField
        control={control}
        name="section.name"
        label="Name of the section"
        maxLength={80}
        check={(text) => (text.trim() === '' ? 'Give the section a name.' : null)}
      />
      <Columns>
        <FormQuantityField
          control={control}
          name="section.steelMass"
          label="Mass of the steel"
          rules={{ name: 'The mass of the steel', kind: 'mass-per-length', required: true, above: 0, to: 10_000 }}
        />
        {source('steelMassSource', 'Where this mass comes from')}
      </Columns>
      <Columns>
        <FormQuantityField
          control={control}
          name="section.sheathMass"
          label="Mass of the sheath"
          hint="Type 0 if there is none"
          rules={{ name: 'The mass of the sheath', kind: 'mass-per-length', required: true, from: 0, to: 1000 }}
        />
        <FormQuantityField
          control={control}
          name="section.groutMass"
          label="Mass of the grout"
          hint="Type 0 if there is none"
          rules={{ name: 'The mass of the grout', kind: 'mass-per-length', required: true, from: 0, to: 5000 }}
        />
        {source('addedMassSource', 'Where these come from')}
      </Columns>
      <FormQuantityField
        control={control}
        name="section.massUncertainty"
        label="Standard uncertainty of the whole mass"
        optional
        hint="Left empty, it follows from the sources"
        rules={{ name: 'The uncertainty of the mass', kind: 'percent', above: 0, to: 0.5 }}
      />
      <Columns>
        <FormQuantityField
          control={control}
          name="section.steelArea"
          label="Steel area"
          rules={{ name: 'The steel area', kind: 'area', required: true, above: 0, to: 1 }}
        />
        <FormQuantityField
          control={control}
          name="section.modulus"
          label="Elastic modulus"
          rules={{ name: 'The elastic modulus', kind: 'modulus', required: true, from: 1e9, to: 1e12 }}
        />
        {source('modulusSource', 'Where the modulus comes from')}
      </Columns>
      <Columns>
        <FormQuantityField
          control={control}
          name="section.bendingStiffnessLow"
          label="Bending stiffness, strands sliding"
          rules={{ name: 'The lower bound of the bending stiffness', kind: 'bending-stiffness', required: true, above: 0, to: 1e12 }}
        />
        <FormQuantityField
          control={control}
          name="section.bendingStiffnessHigh"
          label="Bending stiffness, fully bonded"
          rules={{ name: 'The upper bound of the bending stiffness', kind: 'bending-stiffness', required: true, above: 0, to: 1e12 }}
          check={(high) =>
            (high.si ?? 0) < (form.getValues('section.bendingStiffnessLow').si ?? 0)
              ? 'The upper bound must not be below the lower bound.'
              : null
          }
        />
      </Columns>
      <Columns>
        <FormQuantityField
          control={control}
          name="section.breakingLoad"
          label="Breaking load"
          rules={{ name: 'The breaking load', kind: 'force', required: true, above: 0, to: 1e9 }}
        />
        {source('breakingLoadSource', 'Where the breaking load comes from')}
      </Columns>
    </Stack>
  );
}

/** Type and count fill in area, mass, breaking load, modulus and bounds; each can be changed afterwards. */
function CatalogueChoice({ form }: { form: UseFormReturn<CableValues> }) {
  const { system } = useUnits();
  const fill = () => {
    const { strandKey, strandCount, name } = form.getValues('section');
    const strand = strandCatalogue.find(({ key }) => key === strandKey);
    const count = strandCount.si;
    if (!strand || count === null || !Number.isInteger(count) || count < 1 || count > 1000) return;
    const { steelArea, steelMass, breakingLoad, modulus, bendingStiffnessBounds } = strandSection(strand, count);
    const section = form.getValues('section');
    form.setValue('section', {
      ...section,
      name: name === '' || / × /.test(name) ? `${count} × ${strand.name}` : name,
      steelArea: enteredValue(steelArea, 'area', system),
      steelMass: enteredValue(steelMass, 'mass-per-length', system),
      steelMassSource: section.steelMassSource ?? 'supplier',
      breakingLoad: enteredValue(breakingLoad, 'force', system),
      breakingLoadSource: section.breakingLoadSource ?? 'supplier',
      modulus: enteredValue(modulus, 'modulus', system),
      modulusSource: section.modulusSource ?? 'supplier',
      bendingStiffnessLow: enteredValue(bendingStiffnessBounds[0], 'bending-stiffness', system),
      bendingStiffnessHigh: enteredValue(bendingStiffnessBounds[1], 'bending-stiffness', system),
    });
  };
  const strand = strandCatalogue.find(({ key }) => key === form.watch('section.strandKey'));
  return (
    <Stack gap={2}>
      <Columns>
        <Select
          label="Strand from the catalogue"
          value={form.watch('section.strandKey')}
          onChange={(key) => {
            form.setValue('section.strandKey', key);
            fill();
          }}
          options={strandCatalogue.map(({ key, name }) => ({ value: key, label: name }))}
          placeholder="None: type the values below"
        />
        <QuantityField
          label="Number of strands"
          optional
          value={form.watch('section.strandCount')}
          onChange={(entry) => {
            form.setValue('section.strandCount', entry);
            fill();
          }}
          rules={{ name: 'The number of strands', kind: 'count', from: 1, to: 1000 }}
        />
      </Columns>
      {strand ? (
        <Text
          size="note"
          tone="muted"
        >{`Values of the catalogue: ${strand.source}. The bounds of bending stiffness are common practice. Check them against the supplier’s sheet.`}</Text>
      ) : null}
    </Stack>
  );
}

function MassSummary({ form }: { form: UseFormReturn<CableValues> }) {
  const units = useUnits();
  const section = form.watch('section');
  const { steelMass, sheathMass, groutMass, steelMassSource, addedMassSource } = section;
  if (steelMass.si === null || sheathMass.si === null || groutMass.si === null || !steelMassSource || !addedMassSource) return null;
  const mass = massPerLength({
    steelArea: 1,
    modulus: 1,
    steelMass: steelMass.si,
    steelMassSource,
    sheathMass: sheathMass.si,
    groutMass: groutMass.si,
    addedMassSource,
    massRelativeUncertainty: section.massUncertainty.si,
    bendingStiffnessLow: 1,
    bendingStiffnessHigh: 1,
  });
  return (
    <Notice>{`Mass per length ${units.show(mass.value, 'mass-per-length')}, standard uncertainty ${(100 * mass.relativeUncertainty).toPrecision(2)} %.`}</Notice>
  );
}
