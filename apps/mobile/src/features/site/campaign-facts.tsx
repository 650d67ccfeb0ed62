import type { CampaignDetail } from '@strandnote/api/contract';
import { showDay } from '../../lib/show-time.ts';
import { useUnits } from '../../lib/units.tsx';
import { Button, Definitions, Heading, Panel } from '../../ui/index.ts';
import { daysOf } from './campaign-days.ts';
import { referenceWords } from './site-words.ts';
import { agreedInWords } from './survey-decision.ts';

/** What a reader of the results must know of the campaign, and what was agreed before it. */
export function CampaignFacts({ survey, editHref }: { survey: CampaignDetail; editHref: string | null }) {
  const units = useUnits();
  const { basis } = survey;
  const said = (text: string) => (text.trim() === '' ? 'not stated' : text);
  return (
    <Panel>
      <Heading level={2} size="lead">
        {`Campaign ${survey.number}`}
      </Heading>
      <Definitions
        items={[
          { term: 'Days', value: daysOf(survey) },
          { term: 'Crew', value: said(survey.crew) },
          { term: 'Stage', value: said(survey.stage) },
          { term: 'Weather', value: said(survey.weather) },
          { term: 'Traffic', value: said(survey.traffic) },
          { term: 'Steel temperature', value: units.show(survey.steelTemperature, 'temperature') },
          { term: 'Air temperature', value: units.show(survey.airTemperature, 'temperature') },
          ...survey.instruments.map(({ name, serial, calibrationDue }) => ({
            term: serial ? `${name}, ${serial}` : name,
            value: calibrationDue ? `calibration due ${showDay(calibrationDue)}` : 'calibration not stated',
          })),
          { term: 'Agreed basis', value: agreedInWords(survey, referenceWords), note: basis.decisionRule || undefined },
          { term: 'To call at once about a critical finding', value: said(basis.criticalContact) },
        ]}
      />
      {editHref ? <Button href={editHref}>Edit the campaign</Button> : null}
    </Panel>
  );
}
