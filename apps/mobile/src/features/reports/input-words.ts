import type { FrozenInput, FrozenSpan } from '@strandnote/core/report-content';
import type { Quantity } from '@strandnote/core/units';
import type { Units } from '../../lib/units.tsx';
import type { Definition } from '../../ui/definitions.tsx';

const words: Record<FrozenInput['quantity'], { term: string; kind: Quantity }> = {
  'chord-length': { term: 'Chord', kind: 'length' },
  'lower-deduction': { term: 'Lower deduction', kind: 'length' },
  'upper-deduction': { term: 'Upper deduction', kind: 'length' },
  'free-length': { term: 'Free length', kind: 'length' },
  inclination: { term: 'Inclination', kind: 'angle' },
  'steel-area': { term: 'Steel area', kind: 'area' },
  modulus: { term: 'Elastic modulus', kind: 'modulus' },
  'steel-mass': { term: 'Mass of the steel', kind: 'mass-per-length' },
  'sheath-mass': { term: 'Mass of the sheath', kind: 'mass-per-length' },
  'grout-mass': { term: 'Mass of the grout', kind: 'mass-per-length' },
  'mass-per-length': { term: 'Mass per length', kind: 'mass-per-length' },
  'bending-stiffness-low': { term: 'Bending stiffness, lower bound', kind: 'bending-stiffness' },
  'bending-stiffness-high': { term: 'Bending stiffness, upper bound', kind: 'bending-stiffness' },
  'breaking-load': { term: 'Breaking load', kind: 'force' },
};

const sources: Record<NonNullable<FrozenInput['source']>, string> = {
  weighed: 'weighed',
  supplier: 'supplier’s sheet',
  'as-built': 'as-built drawing',
  design: 'design drawing',
  taped: 'taped on site',
  assumed: 'assumed',
};

const ends: Record<string, string> = {
  unknown: 'unknown',
  hinged: 'hinged',
  clamped: 'clamped',
  socket: 'socket or bearing plate',
  'fork-in-plane': 'fork, in the plane of its pin',
  'fork-across': 'fork, across its pin',
  'guide-bushing': 'guide bushing',
  fixity: 'fixity given as a range',
  stiffness: 'rotational stiffness given',
};

/** The inputs of a span in words and in the reader's units, each with its source and uncertainty. */
export function inputDefinitions(span: FrozenSpan, units: Units): Definition[] {
  const end = (term: string, { kind, fixity }: FrozenSpan['lowerEnd']): Definition => ({
    term,
    value: ends[kind] ?? kind,
    ...(fixity ? { note: `fixity ${fixity[0].toFixed(1)} to ${fixity[1].toFixed(1)}` } : {}),
  });
  const measurement = span.measurement;
  return [
    ...span.inputs.map((input) => inputDefinition(input, units)),
    end('Lower end', span.lowerEnd),
    end('Upper end', span.upperEnd),
    ...(measurement
      ? [
          { term: 'Dampers at the visit', value: `lower ${measurement.lowerDamperState}, upper ${measurement.upperDamperState}` },
          { term: 'Bushing at the visit', value: measurement.bushingState },
          { term: 'Sensor, from the lower end', value: units.show(measurement.sensorPosition, 'length', 1) },
          { term: 'Excitation', value: measurement.excitation, note: `entered by ${measurement.enteredBy}` },
          { term: 'Steel temperature', value: units.show(measurement.steelTemperature, 'temperature') },
          ...(measurement.note ? [{ term: 'Note', value: measurement.note }] : []),
        ]
      : []),
  ];
}

function inputDefinition({ quantity, value, standardUncertainty, source }: FrozenInput, units: Units): Definition {
  const { term, kind } = words[quantity];
  const uncertainty = standardUncertainty === null || value === 0 ? null : `u ${((100 * standardUncertainty) / value).toPrecision(2)} %`;
  const note = [source ? sources[source] : null, uncertainty].filter((part) => part !== null).join(', ');
  return { term, value: units.show(value, kind), figures: true, ...(note ? { note } : {}) };
}
