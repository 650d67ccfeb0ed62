import { type DampingState, dampingState } from '@strandnote/api/contract';
import { Button, Choice, Heading, Panel, QuantityField, Row, Select, Stack, Text, TextField } from '../../ui/index.ts';
import { type EntryProblems, sensorRules, temperatureRules } from './check-entry.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { answersOf, type EntryAction, type EntryDraft, type VisitDraft } from './entry-draft.ts';
import { dampingWords, excitationWords, optionsOf } from './site-words.ts';

interface VisitPanelProps {
  draft: EntryDraft;
  row: ChecklistRow;
  /** The errors of answers that were not given yet are shown once saving was tried. */
  problems: EntryProblems['visit'];
  /** The visit before this one, whose answers can be taken over with one touch. */
  before: ChecklistRow | null;
  dispatch: (action: EntryAction) => void;
}

const dampingOptions = optionsOf(dampingWords);
const excitationOptions = optionsOf(excitationWords);
const yesOrNo = [
  { value: 'no', label: 'no' },
  { value: 'yes', label: 'yes' },
] as const;

/** What was found at the cable. Nothing is answered for the person. */
export function VisitPanel({ draft, row, problems, before, dispatch }: VisitPanelProps) {
  const { visit } = draft;
  const answer = (change: Partial<VisitDraft>) => dispatch({ type: 'visitAnswered', change });
  const damper = (label: string, field: 'lowerDamper' | 'upperDamper' | 'bushing', placeholder: string) => (
    <Select<DampingState>
      label={label}
      value={visit[field]}
      onChange={(value) => answer({ [field]: dampingState.parse(value) })}
      options={dampingOptions}
      placeholder={placeholder}
      error={problems[field]}
    />
  );
  return (
    <Panel>
      <Heading level={2} size="lead">
        At the cable
      </Heading>
      {before?.measurement ? <AsBefore before={before} draft={draft} onTake={answer} /> : null}
      {damper(`Damper at the lower end (${fitted(row.span.lowerDamper)})`, 'lowerDamper', 'What does it do?')}
      {damper(`Damper at the upper end (${fitted(row.span.upperDamper)})`, 'upperDamper', 'What does it do?')}
      {damper('Bushing', 'bushing', 'Is there one?')}
      <Choice
        label="Tied to another cable"
        row
        options={yesOrNo}
        value={visit.crossTied}
        onChange={(crossTied) => answer({ crossTied })}
        error={problems.crossTied}
      />
      <Select
        label="What made it vibrate"
        value={visit.excitation}
        onChange={(excitation) => answer({ excitation })}
        options={excitationOptions}
        error={problems.excitation}
      />
      <QuantityField
        label="Sensor, from the lower end of the free length"
        optional
        value={visit.sensor}
        onChange={(sensor) => answer({ sensor })}
        rules={sensorRules(row.span)}
        error={problems.sensor}
      />
      <QuantityField
        label="Steel temperature"
        optional
        signed
        value={visit.steelTemperature}
        onChange={(steelTemperature) => answer({ steelTemperature })}
        rules={temperatureRules}
        error={problems.steelTemperature}
      />
      <TextField
        label="Date and time of the visit"
        value={visit.visitedAt}
        onChange={(visitedAt) => answer({ visitedAt })}
        hint="At the structure, as 2026-12-01 10:40."
        error={problems.visitedAt}
        autoComplete="off"
      />
      <TextField
        label="Note"
        optional
        rows={2}
        maxLength={1000}
        value={visit.note}
        onChange={(note) => answer({ note })}
        error={problems.note}
      />
    </Panel>
  );
}

function fitted(damper: 'none' | 'fitted'): string {
  return damper === 'fitted' ? 'one is fitted' : 'none in the registry';
}

interface AsBeforeProps {
  before: ChecklistRow;
  draft: EntryDraft;
  onTake: (change: Partial<VisitDraft>) => void;
}

/** Cables of a day are much alike: one touch answers as at the cable before, and says what it answers. */
function AsBefore({ before, draft, onTake }: AsBeforeProps) {
  const measurement = before.measurement!;
  const words = [
    `lower damper ${dampingWords[measurement.lowerDamperState]}`,
    `upper ${dampingWords[measurement.upperDamperState]}`,
    `bushing ${dampingWords[measurement.bushingState]}`,
    measurement.crossTied ? 'cross-tied' : 'not cross-tied',
    excitationWords[measurement.excitation],
    measurement.sensorPosition === null ? null : 'the same sensor place',
  ].filter((word) => word !== null);
  return (
    <Stack gap={1}>
      <Row>
        <Button onPress={() => onTake(answersOf(measurement, draft.system))}>{`As found at ${before.name}`}</Button>
      </Row>
      <Text size="note" tone="muted">{`${words.join(', ')}.`}</Text>
    </Stack>
  );
}
