import { Button, Checkbox, Choice, QuantityField, Row, Stack, TextField } from '../../ui/index.ts';
import { type PeakProblems, uncertaintyRules } from './check-entry.ts';
import type { EntryAction, PeakDraft } from './entry-draft.ts';
import { optionsOf, planeWords } from './site-words.ts';

interface PeakDetailsProps {
  peak: PeakDraft;
  problems: PeakProblems | undefined;
  dispatch: (action: EntryAction) => void;
}

const planes = optionsOf(planeWords);
/** One touch with a glove on; anything else is typed. */
const usualReasons = ['foreign peak', 'too weak', 'number doubtful'];

/** What is seldom needed of a peak: its number, plane and uncertainty, setting it aside, taking it away. */
export function PeakDetails({ peak, problems, dispatch }: PeakDetailsProps) {
  const change = (changed: Partial<Omit<PeakDraft, 'id'>>) => dispatch({ type: 'peakChanged', id: peak.id, change: changed });
  return (
    <Stack gap={3}>
      <Row align="flex-start" gap={4}>
        <TextField
          label="Mode number"
          value={peak.mode}
          onChange={(mode) => change({ mode })}
          error={problems?.mode}
          inputMode="numeric"
          autoComplete="off"
          figures
        />
        <QuantityField
          label="Standard uncertainty"
          optional
          value={peak.uncertainty}
          onChange={(uncertainty) => change({ uncertainty })}
          rules={uncertaintyRules}
          error={problems?.uncertainty}
        />
      </Row>
      <Choice label="Plane of the motion" row options={planes} value={peak.plane} onChange={(plane) => change({ plane })} />
      <Checkbox
        label="Set this peak aside: it stays on record, but not in the fit"
        value={!peak.used}
        onChange={(aside) => change({ used: !aside })}
      />
      {peak.used ? null : (
        <Stack gap={1}>
          <TextField
            label="Why it is set aside"
            value={peak.setAsideReason}
            onChange={(setAsideReason) => change({ setAsideReason })}
            error={problems?.setAsideReason}
            maxLength={300}
          />
          <Row gap={1}>
            {usualReasons.map((reason) => (
              <Button key={reason} kind="quiet" onPress={() => change({ setAsideReason: reason })}>
                {reason}
              </Button>
            ))}
          </Row>
        </Stack>
      )}
      <Row>
        <Button kind="quiet" onPress={() => dispatch({ type: 'peakRemoved', id: peak.id })} label={`Remove the row of mode ${peak.mode}`}>
          Remove this row
        </Button>
      </Row>
    </Stack>
  );
}
