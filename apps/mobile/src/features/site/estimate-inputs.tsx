import type { Cable, PropertySource, Span } from '@strandnote/api/contract';
import { freeLength, massPerLength } from '@strandnote/core';
import type { StoredEstimate } from '@strandnote/core/report-content';
import { formatNumber } from '@strandnote/core/units';
import { type Units, useUnits } from '../../lib/units.tsx';
import { Columns, type Definitions as DefinitionList, Definitions, Heading, Panel, Text } from '../../ui/index.ts';

type Item = Parameters<typeof DefinitionList>[0]['items'][number];

const sourceWords: Record<PropertySource, string> = {
  weighed: 'weighed',
  supplier: 'supplier’s sheet',
  'as-built': 'as-built drawing',
  design: 'design drawing',
  taped: 'taped on site',
  assumed: 'assumed',
};

interface EstimateInputsProps {
  cable: Cable;
  span: Span;
  output: StoredEstimate;
}

/** What went in, each with where it comes from and how sure it is. */
export function EstimateInputs({ cable, span, output }: EstimateInputsProps) {
  const units = useUnits();
  return (
    <Columns>
      {[
        <Panel key="length">
          <Heading level={2}>Length and ends</Heading>
          <Definitions items={lengthItems(span, output, units)} />
        </Panel>,
        <Panel key="mass">
          <Heading level={2}>Mass and stiffness</Heading>
          <Text tone="muted">{cable.section.name}</Text>
          <Definitions items={sectionItems(cable, output, units)} />
        </Panel>,
      ]}
    </Columns>
  );
}

function lengthItems(span: Span, output: StoredEstimate, units: Units): Item[] {
  const free = freeLength(span);
  const tolerance = (value: number) => `\u00B1 ${units.show(value, 'small-length')}`;
  const item = (term: string, value: number, note: string): Item => ({ term, value: units.show(value, 'length'), note, figures: true });
  return [
    item('Chord', span.chordLength, `${tolerance(span.chordLengthTolerance)}, ${sourceWords[span.chordLengthSource]}`),
    item('Lower deduction', span.lowerDeduction, `${tolerance(span.lowerDeductionTolerance)}, ${sourceWords[span.deductionSource]}`),
    item('Upper deduction', span.upperDeduction, `${tolerance(span.upperDeductionTolerance)}, ${sourceWords[span.deductionSource]}`),
    item('Free length', free.length, `u ${units.show(free.standardUncertainty, 'small-length', 1)}`),
    { term: 'Inclination', value: units.show(span.inclination, 'angle'), figures: true },
    ...output.inputs.ends.map((end, index): Item => ({ term: index === 0 ? 'Lower end' : 'Upper end', value: endWords(end, units) })),
  ];
}

function endWords(end: StoredEstimate['inputs']['ends'][number], units: Units): string {
  if (typeof end === 'string') return end === 'unknown' ? 'not known, hinged to clamped' : end;
  if ('fixity' in end) return `fixity ${end.fixity[0].toFixed(2)} to ${end.fixity[1].toFixed(2)}`;
  return units.show(end.rotationalStiffness, 'rotational-stiffness');
}

function sectionItems({ section }: Cable, output: StoredEstimate, units: Units): Item[] {
  const mass = massPerLength(section);
  const item = (term: string, text: string, note?: string): Item => ({ term, value: text, figures: true, ...(note ? { note } : {}) });
  const added = sourceWords[section.addedMassSource];
  return [
    item('Steel', units.show(section.steelMass, 'mass-per-length'), sourceWords[section.steelMassSource]),
    item('Sheath', units.show(section.sheathMass, 'mass-per-length'), added),
    item('Grout', units.show(section.groutMass, 'mass-per-length'), added),
    item('Mass per length', units.show(mass.value, 'mass-per-length'), `u ${formatNumber(100 * mass.relativeUncertainty, 1)} %`),
    item(
      'Bending stiffness, from strands sliding to bonded',
      `${units.figure(section.bendingStiffnessLow, 'bending-stiffness')} to ${units.show(section.bendingStiffnessHigh, 'bending-stiffness')}`,
    ),
    item(
      'Axial stiffness',
      `${units.show(section.steelArea, 'area')} × ${units.show(section.modulus, 'modulus')}`,
      sourceWords[section.modulusSource],
    ),
    item('Frequencies', frequencySource[output.inputs.frequencyUncertaintySource], 'where their uncertainty comes from'),
  ];
}

const frequencySource: Record<StoredEstimate['inputs']['frequencyUncertaintySource'], string> = {
  stated: 'stated with each peak',
  residuals: 'from the residuals',
  assumed: 'assumed',
  mixed: 'stated for some, assumed for others',
};
