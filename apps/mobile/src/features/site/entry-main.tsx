import type { PutMeasurement } from '@strandnote/api/contract';
import { type ReactNode, useState } from 'react';
import { View, type ViewStyle } from 'react-native';
import { type Units, useUnits } from '../../lib/units.tsx';
import { space } from '../../theme/tokens.ts';
import { useColours } from '../../theme/use-theme.tsx';
import { Caution, Columns, Notice, Stack, useWide } from '../../ui/index.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { draftOf, type EntryDraft } from './entry-draft.ts';
import type { EntryFindings } from './entry-findings.ts';
import { EntryLinks } from './entry-links.tsx';
import type { EntryViewProps } from './entry-view.tsx';
import { NotMeasuredSheet } from './not-measured-sheet.tsx';
import { PeaksPanel } from './peaks-panel.tsx';
import { Refusal } from './refusal.tsx';
import { ResultNotes, ResultPanel } from './result-panel.tsx';
import type { Entry } from './use-entry.ts';
import type { SaveEntry } from './use-save-entry.ts';
import { latestOther } from './visit-before.ts';
import { VisitPanel } from './visit-panel.tsx';

interface EntryMainProps extends EntryViewProps {
  entry: Entry & { draft: EntryDraft; findings: EntryFindings };
  saving: SaveEntry;
  neighbours: { previous: ChecklistRow | null; following: ChecklistRow | null };
  hrefOf: (row: ChecklistRow) => string;
  /** A reason was saved why the cable is not measured. */
  onExcused: () => void;
}

/** Result, peaks and visit of one cable: one under the other on a phone, side by side on a wide screen. */
export function EntryMain(props: EntryMainProps) {
  const { survey, row, entry, saving, stored, onReload } = props;
  const { draft, findings, dispatch } = entry;
  const units = useUnits();
  const wide = useWide();
  const [excusing, setExcusing] = useState(false);
  const result = { row, campaign: survey, findings };
  const peaks = (
    <PeaksPanel
      draft={draft}
      findings={findings}
      expected={entry.expected}
      numbering={entry.numbering}
      sister={entry.sister}
      sensor={entry.sensor}
      strict={saving.tried}
      dispatch={dispatch}
    />
  );
  const visit = (
    <VisitPanel
      draft={draft}
      row={row}
      problems={saving.tried ? findings.problems.visit : onlyOfFit(findings)}
      before={latestOther(props.rows, row)}
      dispatch={dispatch}
    />
  );
  const tension = (
    <>
      <StaysInSight>
        <ResultPanel {...result} />
      </StaysInSight>
      <ResultNotes {...result} />
    </>
  );
  const foot = (
    <>
      <Caution unchecked site conditions={conditionsOf(row, draft, survey.steelTemperature, units)} />
      <EntryLinks {...props} onExcuse={() => setExcusing(true)} />
    </>
  );
  return (
    <Stack gap={4}>
      <Refusal
        measurementId={draft.measurementId}
        stored={stored}
        onReload={onReload}
        onKeepMine={(body: PutMeasurement) => void saving.send(body)}
        onTakeTheirs={(theirs) => {
          void entry.forget();
          entry.replace(draftOf(theirs, { system: units.system, timeZone: survey.structureTimeZone }));
        }}
      />
      {saving.failure ? <Notice kind="problem">{saving.failure}</Notice> : null}
      {wide ? (
        <Columns shares={[6, 5]}>
          {[
            <Stack key="peaks" gap={4}>
              {peaks}
              {foot}
            </Stack>,
            <Stack key="result" gap={4}>
              {tension}
              {visit}
            </Stack>,
          ]}
        </Columns>
      ) : (
        <>
          {tension}
          {peaks}
          {visit}
          {foot}
        </>
      )}
      {excusing ? <NotMeasuredSheet row={row} campaignId={survey.id} onClose={() => setExcusing(false)} onSaved={props.onExcused} /> : null}
    </Stack>
  );
}

/** The tension stays at the top while the peaks below or beside it are typed. */
function StaysInSight({ children }: { children: ReactNode }) {
  const { paper } = useColours();
  const style = { position: 'sticky', top: 0, zIndex: 1, backgroundColor: paper, paddingVertical: space(2), marginVertical: -space(2) };
  return <View style={style as unknown as ViewStyle}>{children}</View>;
}

/** Questions nobody has answered yet are not wrong before saving; a damper that the fit trips over is. */
function onlyOfFit({ problems, outcome }: EntryFindings): EntryFindings['problems']['visit'] {
  const { lowerDamper, upperDamper, sensor, steelTemperature } = problems.visit;
  const message = outcome?.problem?.message;
  return {
    ...(lowerDamper === message ? { lowerDamper } : {}),
    ...(upperDamper === message ? { upperDamper } : {}),
    ...(sensor ? { sensor } : {}),
    ...(steelTemperature ? { steelTemperature } : {}),
  };
}

function conditionsOf(row: ChecklistRow, { visit }: EntryDraft, ofCampaign: number | null, units: Units): string {
  const now = visit.steelTemperature.si ?? ofCampaign;
  const last = row.entry.lastSurvey.find(({ spanId }) => spanId === row.span.id);
  const before = last
    ? ` (last survey ${last.steelTemperature === null ? 'not stated' : units.show(last.steelTemperature, 'temperature')})`
    : '';
  return now === null
    ? `The steel temperature is not stated${before}.`
    : `An average at ${units.show(now, 'temperature')} steel temperature${before}.`;
}
