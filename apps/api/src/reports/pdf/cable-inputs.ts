import { formatNumber } from '@strandnote/core';
import type { FrozenEnd, FrozenMeasurement, FrozenSpan } from '@strandnote/core/report-content';
import { day, moment } from './dates.ts';
import { type Definition, setDefinitions } from './definitions.ts';
import { quantityOfInput } from './quantities.ts';
import type { Report, ResultRow } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';
import { excitationWords, inputWords, placeWords, referenceWords, sourceWords, wordsOfEnd } from './words.ts';

/** What went in: properties of the cable with their sources, its ends and dampers, the visit, and what it is compared with. */
export function setCableInputs(report: Report, row: ResultRow): void {
  const { sheet, quantities } = report;
  sheet.heading(3, 'Inputs');
  setTable(sheet, {
    rows: row.span.inputs,
    padding: 1.3,
    columns: [
      { head: 'Quantity', width: 176, cell: ({ quantity }) => inputWords[quantity] },
      {
        head: 'Value',
        width: 82,
        align: 'decimal',
        style: styles.figure,
        cell: ({ quantity, value, standardUncertainty }) => quantities.figure(value, quantityOfInput[quantity], standardUncertainty),
      },
      { head: 'Unit', width: 54, cell: ({ quantity }) => quantities.symbol(quantityOfInput[quantity]) },
      {
        head: 'Standard uncertainty',
        width: 92,
        align: 'decimal',
        style: styles.figure,
        cell: ({ quantity, standardUncertainty }) =>
          standardUncertainty ? quantities.spread(standardUncertainty, quantityOfInput[quantity]) : '–',
      },
      { head: 'Source', width: sheet.width - 404, cell: ({ source }) => (source ? sourceWords[source] : 'derived') },
    ],
  });
  sheet.space(6);
  setDefinitions(sheet, [...endsAndVisit(report, row), ...comparedWith(report, row)], { columns: 2, termWidth: 60 });
}

function endsAndVisit({ content, quantities }: Report, { span }: ResultRow): Definition[] {
  const { measurement } = span;
  const definitions: Definition[] = [
    { term: 'Lower end', value: end(span.lowerEnd, span, 0) },
    { term: 'Upper end', value: end(span.upperEnd, span, 1) },
    { term: 'Lower damper', value: damper(span.lowerDamper, measurement?.lowerDamperState) },
    { term: 'Upper damper', value: damper(span.upperDamper, measurement?.upperDamperState) },
  ];
  if (!measurement) return definitions;
  return [
    ...definitions,
    { term: 'Bushing', value: measurement.bushingState === 'none' ? 'none' : measurement.bushingState },
    { term: 'Visited', value: `${moment(measurement.visitedAt, content.structure.timeZone)}, entered by ${measurement.enteredBy}` },
    {
      term: 'Sensor',
      value:
        measurement.sensorPosition === null
          ? 'place not noted'
          : `${quantities.text(measurement.sensorPosition, 'length')} from the lower end; ${excitationWords[measurement.excitation]} excitation`,
    },
    { term: 'Steel', value: quantities.temperature(measurement.steelTemperature) ?? 'temperature not noted at the cable' },
    ...(measurement.note ? [{ term: 'Note', value: measurement.note }] : []),
  ];
}

function comparedWith({ quantities }: Report, { cable, span }: ResultRow): Definition[] {
  const reference = cable.referenceTension;
  const last = span.lastSurvey;
  return [
    {
      term: 'Compared with',
      value: reference
        ? `${referenceWords[reference.kind]} ${quantities.text(reference.value, 'force')} at the ${placeWords[reference.place]}${reference.place === 'mean-chord' ? '' : `, ${quantities.text(reference.meanChordValue, 'force')} at the mean of the chord`}; stage “${reference.stage}”; ${reference.source}${reference.dated ? `, ${day(reference.dated)}` : ''}`
        : 'nothing: no reference of the agreed kind',
    },
    ...(last
      ? [
          {
            term: 'Last survey',
            value: `${quantities.text(last.tension, 'force')}, ${last.campaignName}, ${quantities.temperature(last.steelTemperature) ?? 'temperature not noted'}`,
          },
        ]
      : []),
  ];
}

function end(frozen: FrozenEnd, span: FrozenSpan, index: 0 | 1): string {
  const { fixity, rotationalStiffness } = frozen;
  const given = fixity
    ? `, η ${fixity[0] === fixity[1] ? formatNumber(fixity[0], 2) : `${formatNumber(fixity[0], 2)} to ${formatNumber(fixity[1], 2)}`}`
    : rotationalStiffness !== null
      ? `, ${formatNumber(rotationalStiffness / 1000, 0)} kN·m/rad`
      : '';
  const found = span.estimate?.output.fixity[index];
  return `${wordsOfEnd(frozen)}${given}${found ? `; after the fit ${formatNumber(found.mean, 2)}, sd ${formatNumber(found.standardDeviation, 2)}` : ''}`;
}

function damper(fitted: FrozenSpan['lowerDamper'], state: FrozenMeasurement['lowerDamperState'] | undefined): string {
  if (state === undefined) return fitted === 'fitted' ? 'fitted' : 'none';
  if (fitted === 'none') return state === 'none' ? 'none' : `none in the drawings, found ${state}`;
  return state === 'none' ? 'fitted in the drawings, none found' : `fitted, ${state} at the visit`;
}
