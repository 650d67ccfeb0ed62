import type { CampaignDetail } from '@strandnote/api/contract';
import { formatInterval, formatWithUncertainty } from '@strandnote/core';
import { sharedScale } from '@strandnote/core/drawing';
import type { StoredEstimate, Zone } from '@strandnote/core/report-content';
import { IntervalBar } from '../../drawings/index.ts';
import { showDay } from '../../lib/show-time.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { Notice, Panel, Row, Stack, Text } from '../../ui/index.ts';
import { zoneTone, zoneWords } from '../reports/zone-words.ts';
import { barOf, type ChecklistRow } from './checklist-rows.ts';
import type { EntryFindings } from './entry-findings.ts';
import { referenceWords } from './site-words.ts';
import { agreedInWords, decideSpan, type SurveyDecision } from './survey-decision.ts';

interface ResultProps {
  row: ChecklistRow;
  campaign: CampaignDetail;
  findings: EntryFindings;
}

/** The tension as it stands with what has been typed: large, with its interval, its zone and its bar. */
export function ResultPanel({ row, campaign, findings }: ResultProps) {
  const units = useUnits();
  const output = findings.outcome?.output ?? null;
  const decision = decideSpan(row.entry.cable, campaign, output);
  const last = lastSurveyOf(row);
  const bar = barOf(decision, output, last?.tension ?? null);
  const scale = sharedScale([bar]);
  return (
    <Panel gap={2}>
      <Row justify="space-between" gap={2}>
        <Text size="note" tone="muted">
          Tension, 95 % interval
        </Text>
        <Text size="note" tone="muted">
          {agreedInWords(campaign, referenceWords)}
        </Text>
      </Row>
      <Row justify="space-between" align="flex-end" gap={2}>
        <Figures output={output} findings={findings} units={units} />
        {output ? <ZoneWord zone={decision.zone} /> : null}
      </Row>
      {output || decision.reference !== null ? (
        <>
          <IntervalBar values={bar} scale={scale} label={output ? inWords(output, decision, units) : undefined} />
          <Row justify="space-between" gap={2}>
            <Text size="small" tone="muted" figures>
              {units.figure(scale.from, 'force')}
            </Text>
            <Text size="small" tone="muted" figures>
              {units.figure(scale.to, 'force')}
            </Text>
          </Row>
        </>
      ) : null}
    </Panel>
  );
}

function ZoneWord({ zone }: { zone: Zone }) {
  return (
    <Text size="lead" strong tone={zoneTone[zone]} align="right">
      {zoneWords[zone]}
    </Text>
  );
}

function Figures({ output, findings, units }: { output: StoredEstimate | null; findings: EntryFindings; units: Units }) {
  if (!output) {
    const waiting = 'Type the first frequency.';
    return (
      <Text tone={findings.outcome?.problem ? 'minium' : 'muted'} live>
        {findings.outcome?.problem?.message ?? waiting}
      </Text>
    );
  }
  if (output.boundsOnly !== null) {
    const { low, high, symbol } = formatInterval(output.interval95, 'force', units.system);
    return (
      <Text strong size="title">
        {`${low} to ${high}`}
        <Text size="lead">{` ${symbol}`}</Text>
      </Text>
    );
  }
  const { value, uncertainty, symbol } = formatWithUncertainty(output.tension, output.expanded.U, 'force', units.system);
  return (
    <Text strong size="figure">
      {value}
      <Text size="lead">{` \u00B1 ${uncertainty} ${symbol}`}</Text>
    </Text>
  );
}

type LastSurvey = ChecklistRow['entry']['lastSurvey'][number];

function lastSurveyOf({ entry, span }: ChecklistRow): LastSurvey | null {
  return entry.lastSurvey.find(({ spanId }) => spanId === span.id) ?? null;
}

/** What the bar shows besides the interval; the last survey never without its temperature. */
function legend(measured: boolean, last: LastSurvey | null, units: Units): string {
  const temperature = last?.steelTemperature == null ? '' : ` at ${units.show(last.steelTemperature, 'temperature')}`;
  const survey = last ? `Dot: last survey ${units.show(last.tension, 'force')}, ${showDay(last.startsOn)}${temperature}.` : null;
  return [survey, measured ? 'Whisker: both ends hinged to both clamped.' : null].filter(Boolean).join(' ');
}

function inWords(output: StoredEstimate, { zone, lowerLimit, upperLimit }: SurveyDecision, units: Units): string {
  const [low, high] = output.interval95.map((bound) => units.figure(bound, 'force'));
  const limits =
    lowerLimit === null && upperLimit === null
      ? ''
      : `; limits ${lowerLimit === null ? 'none' : units.figure(lowerLimit, 'force')} to ${upperLimit === null ? 'none' : units.show(upperLimit, 'force')}`;
  return `Interval ${low} to ${high} ${units.symbol('force')}, ${zoneWords[zone]}${limits}; hinged ${units.figure(output.bracket.hinged, 'force')}, clamped ${units.figure(output.bracket.clamped, 'force')}`;
}

/** What must be known of the tension above, in the order of its weight. */
export function ResultNotes({ row, campaign, findings }: ResultProps) {
  const units = useUnits();
  const output = findings.outcome?.output ?? null;
  const decision = decideSpan(row.entry.cable, campaign, output);
  const shown = legend(output !== null, lastSurveyOf(row), units);
  const plain = output !== null && (decision.zone === 'within' || decision.zone === 'outside');
  const serious = findings.notes.filter(({ severity }) => severity === 'serious');
  const others = findings.notes.filter(({ severity }) => severity !== 'serious');
  return (
    <Stack gap={2}>
      {shown ? (
        <Text size="note" tone="muted">
          {shown}
        </Text>
      ) : null}
      {output && !plain ? (
        <Text size="note" tone="muted">
          {decision.reason}
        </Text>
      ) : null}
      {decision.zone === 'outside' && campaign.basis.criticalContact ? (
        <Notice kind="problem" title="Outside the agreed limits">
          <Text>{`Check length, mass and mode numbers. If it stands, call at once, as agreed: ${campaign.basis.criticalContact}.`}</Text>
        </Notice>
      ) : null}
      {serious.length > 0 ? (
        <Notice kind="caution" title={serious.length === 1 ? 'Look at this before you leave' : 'Look at these before you leave'} alert>
          {serious.map(({ message }) => (
            <Text key={message}>{message}</Text>
          ))}
        </Notice>
      ) : null}
      {others.map(({ message }) => (
        <Text key={message} size="note" tone="muted">
          {message}
        </Text>
      ))}
    </Stack>
  );
}
