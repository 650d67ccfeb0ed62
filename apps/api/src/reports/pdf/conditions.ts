import { day, days } from './dates.ts';
import { setDefinitions } from './definitions.ts';
import type { Report } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';
import { counted } from './words.ts';

/** When, by whom, with what and under which circumstances the cables were measured. */
export function setConditions(report: Report): void {
  const { sheet, content, quantities } = report;
  const { campaign, texts } = content;
  const visited = report.rows.flatMap(({ span }) => (span.measurement ? [span.measurement] : []));
  setDefinitions(
    sheet,
    [
      { term: 'Dates', value: `${days(campaign.startsOn, campaign.endsOn)}, ${counted(visited.length, 'visit')} in this report` },
      { term: 'Crew', value: campaign.crew || 'not noted' },
      { term: 'Stage', value: campaign.stage || 'not noted' },
      { term: 'Weather', value: campaign.weather || 'not noted' },
      { term: 'Traffic', value: campaign.traffic || 'not noted' },
      { term: 'Temperatures', value: temperatures(report) },
    ],
    { termWidth: 100 },
  );
  if (campaign.instruments.length > 0) {
    sheet.space(6);
    setTable(sheet, {
      rows: campaign.instruments,
      columns: [
        { head: 'Instrument', width: 220, cell: ({ name }) => name },
        { head: 'Serial number', width: 92, style: styles.figure, cell: ({ serial }) => serial || '–' },
        { head: 'Calibrated', width: 86, cell: ({ calibratedOn }) => (calibratedOn ? day(calibratedOn) : 'not stated') },
        {
          head: 'Due',
          width: sheet.width - 398,
          cell: ({ calibrationDue }) => dueInWords(calibrationDue, campaign.endsOn ?? campaign.startsOn),
        },
      ],
    });
  } else sheet.paragraph('No instruments were entered for this campaign.', styles.note);
  sheet.space(6);
  if (texts.conditions) sheet.paragraph(texts.conditions);
  sheet.heading(3, 'Deviations from the agreed work');
  sheet.paragraph(texts.deviations || 'The engineer states none.');

  function dueInWords(due: string | null, end: string): string {
    if (due === null) return 'not stated';
    return due < end ? `${day(due)}, before the survey ended` : day(due);
  }

  function temperatures({ rows }: Report): string {
    const readings = rows.flatMap(({ span }) => (span.measurement?.steelTemperature != null ? [span.measurement.steelTemperature] : []));
    const steel = quantities.temperature(campaign.steelTemperature) ?? 'not noted';
    const air = quantities.temperature(campaign.airTemperature) ?? 'not noted';
    const range =
      readings.length > 0
        ? `; at the cables ${quantities.temperature(Math.min(...readings))} to ${quantities.temperature(Math.max(...readings))}`
        : '';
    return `Steel ${steel}, air ${air}${range}`;
  }
}
