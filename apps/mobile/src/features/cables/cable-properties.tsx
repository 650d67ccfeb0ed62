import type { CableDetail } from '@strandnote/api/contract';
import { freeLength, massPerLength } from '@strandnote/core';
import { useUnits } from '../../lib/units.tsx';
import { Definitions, Heading, Stack } from '../../ui/index.ts';
import { endWords, sourceWords } from './cable-words.ts';

/** What is known of a cable, each value with its source and the uncertainty that follows. */
export function CableProperties({ cable }: { cable: CableDetail }) {
  return (
    <>
      <SectionProperties cable={cable} />
      {cable.spans.map((span, index) => (
        <SpanProperties key={span.id} span={span} name={cable.spans.length > 1 ? span.name || `Span ${index + 1}` : 'Length and ends'} />
      ))}
    </>
  );
}

function SectionProperties({ cable: { section } }: { cable: CableDetail }) {
  const units = useUnits();
  const mass = massPerLength(section);
  return (
    <Stack gap={2}>
      <Heading level={2}>Section</Heading>
      <Definitions
        items={[
          {
            term: 'Mass per length',
            value: units.show(mass.value, 'mass-per-length'),
            note: `u ${(100 * mass.relativeUncertainty).toPrecision(2)} %`,
            figures: true,
          },
          {
            term: 'of steel',
            value: units.show(section.steelMass, 'mass-per-length'),
            note: sourceWords[section.steelMassSource],
            figures: true,
          },
          {
            term: 'of the sheath',
            value: units.show(section.sheathMass, 'mass-per-length'),
            note: sourceWords[section.addedMassSource],
            figures: true,
          },
          {
            term: 'of grout',
            value: units.show(section.groutMass, 'mass-per-length'),
            note: sourceWords[section.addedMassSource],
            figures: true,
          },
          { term: 'Steel area', value: units.show(section.steelArea, 'area'), figures: true },
          {
            term: 'Elastic modulus',
            value: units.show(section.modulus, 'modulus'),
            note: sourceWords[section.modulusSource],
            figures: true,
          },
          {
            term: 'Bending stiffness',
            value: `${units.figure(section.bendingStiffnessLow, 'bending-stiffness')} to ${units.show(section.bendingStiffnessHigh, 'bending-stiffness')}`,
            note: 'strands sliding to fully bonded, common practice',
            figures: true,
          },
          {
            term: 'Breaking load',
            value: units.show(section.breakingLoad, 'force'),
            note: sourceWords[section.breakingLoadSource],
            figures: true,
          },
        ]}
      />
    </Stack>
  );
}

function SpanProperties({ span, name }: { span: CableDetail['spans'][number]; name: string }) {
  const units = useUnits();
  const free = freeLength(span);
  const tolerance = (value: number) => `± ${units.show(value, 'small-length')}`;
  const damper = (state: string) => (state === 'fitted' ? `fitted, ${units.show(span.damperPosition, 'length', 2)} from the end` : 'none');
  return (
    <Stack gap={2}>
      <Heading level={2}>{name}</Heading>
      <Definitions
        items={[
          {
            term: 'Free length',
            value: units.show(free.length, 'length'),
            note: `u ${units.show(free.standardUncertainty, 'small-length')}`,
            figures: true,
          },
          {
            term: 'Chord',
            value: units.show(span.chordLength, 'length'),
            note: `${tolerance(span.chordLengthTolerance)}, ${sourceWords[span.chordLengthSource]}`,
            figures: true,
          },
          {
            term: 'Lower deduction',
            value: units.show(span.lowerDeduction, 'length'),
            note: `${tolerance(span.lowerDeductionTolerance)}, ${sourceWords[span.deductionSource]}`,
            figures: true,
          },
          {
            term: 'Upper deduction',
            value: units.show(span.upperDeduction, 'length'),
            note: `${tolerance(span.upperDeductionTolerance)}, ${sourceWords[span.deductionSource]}`,
            figures: true,
          },
          { term: 'Inclination', value: units.show(span.inclination, 'angle'), figures: true },
          { term: 'Lower end', value: endWords[span.lowerEnd.kind] },
          { term: 'Upper end', value: endWords[span.upperEnd.kind] },
          { term: 'Lower damper', value: damper(span.lowerDamper) },
          { term: 'Upper damper', value: damper(span.upperDamper) },
        ]}
      />
    </Stack>
  );
}
