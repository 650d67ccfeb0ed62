import type { Revision } from '@strandnote/api/contract';
import { showDay } from '../../lib/show-time.ts';
import { useUnits } from '../../lib/units.tsx';
import { Columns, Definitions, Heading, Stack } from '../../ui/index.ts';
import { RevisionTexts } from '../reports/revision-texts.tsx';

/** The rest of what the checker answers for: the conditions of the campaign, the basis agreed, and the texts. */
export function ReportReading({ revision }: { revision: Revision }) {
  const units = useUnits();
  const { campaign } = revision.content;
  const { basis } = campaign;
  const share = (limit: number | null) => (limit === null ? 'none agreed' : `${(100 * limit).toFixed(0)} % of the reference`);
  return (
    <Columns>
      <RevisionTexts revision={revision} />
      <Stack gap={3}>
        <Heading level={2}>Campaign and basis of assessment</Heading>
        <Definitions
          items={[
            {
              term: 'Dates',
              value: [campaign.startsOn, campaign.endsOn]
                .filter((day) => day !== null)
                .map(showDay)
                .join(' to '),
            },
            { term: 'Crew', value: campaign.crew || 'not stated' },
            {
              term: 'Instruments',
              value: campaign.instruments.map((item) => `${item.name} ${item.serial}`.trim()).join(', ') || 'not stated',
              note: campaign.instruments
                .map((item) => (item.calibrationDue ? `calibration due ${showDay(item.calibrationDue)}` : 'no calibration stated'))
                .join(', '),
            },
            { term: 'Weather', value: campaign.weather || 'not stated' },
            { term: 'Steel temperature', value: units.show(campaign.steelTemperature, 'temperature') },
            { term: 'Traffic', value: campaign.traffic || 'not stated' },
            { term: 'Stage', value: campaign.stage },
            { term: 'Reference', value: basis.referenceKind ?? 'none agreed' },
            { term: 'Lower limit', value: share(basis.lowerLimit) },
            { term: 'Upper limit', value: share(basis.upperLimit) },
            { term: 'Decision rule', value: basis.decisionRule || 'none written' },
          ]}
        />
      </Stack>
    </Columns>
  );
}
