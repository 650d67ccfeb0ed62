import { setDefinitions } from './definitions.ts';
import { type Report, zoneCounts } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';
import { placeWords, referenceWords, zoneMeanings, zoneWords } from './words.ts';
import { limitsInWords } from './zone-summary.ts';

/** What was agreed before the survey: references, limits, rule, and whom to call. */
export function setBasis(report: Report): void {
  const { sheet, content, rows } = report;
  const { basis } = content.campaign;
  setDefinitions(
    sheet,
    [
      { term: 'Compared with', value: referencesInWords(report) },
      { term: 'Limits', value: limitsInWords(basis) },
      {
        term: 'Decision rule',
        value: basis.decisionRule || 'The zones below, by the whole 95 % interval (guard bands in the manner of ILAC-G8:09/2019).',
      },
      { term: 'Critical findings to', value: basis.criticalContact || 'not agreed' },
    ],
    { termWidth: 100 },
  );
  sheet.space(4);
  setTable(sheet, {
    rows: zoneCounts(rows),
    columns: [
      { head: 'Zone', width: 120, cell: ({ zone }) => ({ text: zoneWords[zone], style: { ...styles.cell, face: 'text-strong' } }) },
      { head: 'Meaning', width: sheet.width - 120, cell: ({ zone }) => zoneMeanings[zone] },
    ],
  });
  sheet.space(6);
  sheet.paragraph(
    'A zone compares a tension under the permanent loads of the day with a reference at the same stage and place on the cable. It grades nothing against a stress limit for load combinations.',
    styles.note,
  );
}

function referencesInWords({ content, rows }: Report): string {
  const references = rows.flatMap(({ cable }) => (cable.referenceTension ? [cable.referenceTension] : []));
  if (references.length === 0)
    return content.campaign.basis.referenceKind ? 'No cable has the reference that was agreed.' : 'No reference was agreed.';
  const distinct = (values: string[]) => [...new Set(values.filter(Boolean))];
  const kinds = distinct(references.map(({ kind }) => referenceWords[kind]));
  const places = distinct(references.map(({ place }) => placeWords[place]));
  const stages = distinct(references.map(({ stage }) => stage));
  const moved = places.some((place) => place !== placeWords['mean-chord']);
  return [
    `The ${kinds.join(', ')}, given for the ${places.join(', ')}${moved ? ' and brought to the mean of the chord by the weight of the cable' : ''}.`,
    stages.length > 0 ? `Stages: ${stages.join('; ')}.` : '',
    `Sources: ${distinct(references.map(({ source }) => source)).join('; ') || 'not named'}.`,
  ]
    .filter(Boolean)
    .join(' ');
}
