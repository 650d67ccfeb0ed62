import { formatNumber } from '@strandnote/core/units';
import { memo, useState } from 'react';
import { useWindowDimensions, View } from 'react-native';
import { StringFigure } from '../../drawings/index.ts';
import { space } from '../../theme/tokens.ts';
import { QuantityField, type QuantityFieldProps, Row, Stack, Text, Touchable, useWide } from '../../ui/index.ts';
import { frequencyRules, type PeakProblems } from './check-entry.ts';
import { type EntryAction, isBlank, modeOf, type PeakDraft } from './entry-draft.ts';
import { PeakDetails } from './peak-details.tsx';
import { deafnessOf } from './sensor-hearing.ts';

export interface PeakRowProps {
  peak: PeakDraft;
  problems: PeakProblems | undefined;
  /** Measured over fitted, minus one. */
  residual: number | undefined;
  question: string | undefined;
  /** Where this mode should lie, and where the sister's lies (Hz). */
  expected: number | undefined;
  sisterName: string | null;
  sisterFrequency: number | undefined;
  /** Place of the sensor as a share of the free length. */
  sensor: number | null;
  /** Saving was tried: what is wrong is shown at once. */
  strict: boolean;
  dispatch: (action: EntryAction) => void;
  inputRef: QuantityFieldProps['inputRef'];
  onKeyPress: QuantityFieldProps['onKeyPress'];
  onPaste: (text: string) => boolean;
}

/** One mode: its standing wave with the sensor, its frequency, and what is to be said of both. */
export const PeakRow = memo(function PeakRow(props: PeakRowProps) {
  const { peak, problems, question, sensor, dispatch } = props;
  const wide = useWide();
  // On the narrowest phones the figure gives way to the number.
  const { width } = useWindowDimensions();
  const figureWidth = wide ? 140 : Math.max(36, Math.min(96, width - 282));
  const [opened, setOpened] = useState(false);
  const [typing, setTyping] = useState(false);
  const mode = modeOf(peak);
  // While a number is being typed it is not yet wrong.
  const shown = typing && !props.strict ? undefined : problems;
  const open = opened || Boolean(shown?.mode || shown?.uncertainty || shown?.setAsideReason);
  const name = mode === null ? 'Row without a mode number' : `Mode ${mode}`;
  return (
    <Stack gap={1}>
      <Row wrap={false} gap={2}>
        <View style={{ flex: 1, minWidth: 0 }}>
          <Touchable label={`${name}: number, plane, uncertainty, set aside`} onPress={() => setOpened(!open)}>
            <Row wrap={false} gap={3}>
              <View style={{ width: 28 }}>
                <Text figures strong size="heading" tone={shown?.mode ? 'minium' : peak.used ? 'ink' : 'muted'}>
                  {peak.mode.trim() || '?'}
                </Text>
              </View>
              {mode !== null && mode >= 1 && mode <= 60 ? (
                <StringFigure mode={mode} sensor={sensor} width={figureWidth} height={30} />
              ) : null}
            </Row>
          </Touchable>
        </View>
        <View style={{ flexBasis: wide ? 190 : 172, flexShrink: 1, minWidth: 0 }}>
          <QuantityField
            label={`Frequency of ${mode === null ? 'the peak' : `mode ${mode}`}`}
            labelHidden
            large
            value={peak.frequency}
            onChange={(frequency) => {
              setTyping(true);
              dispatch({ type: 'peakChanged', id: peak.id, change: { frequency } });
            }}
            onBlur={() => setTyping(false)}
            rules={frequencyRules}
            error={shown?.frequency}
            inputRef={props.inputRef}
            onKeyPress={props.onKeyPress}
            onPaste={props.onPaste}
          />
        </View>
      </Row>
      <Beside {...props} />
      {mode !== null && sensor !== null ? <Deafness mode={mode} sensor={sensor} entered={!isBlank(peak)} /> : null}
      {question && !typing ? (
        <Text size="note" tone="ochre">
          {question}
        </Text>
      ) : null}
      {open ? <PeakDetails peak={peak} problems={shown} dispatch={dispatch} /> : null}
    </Stack>
  );
});

/** Under the row: where the mode should lie, the sister's, and how far from the fit it is. */
function Beside({ peak, residual, expected, sisterName, sisterFrequency }: PeakRowProps) {
  const decimals = (frequency: number) => (frequency < 10 ? 3 : 2);
  const words = [
    peak.plane === 'out-of-plane' ? 'out of plane' : null,
    isBlank(peak) && expected !== undefined ? `expected near ${formatNumber(expected, decimals(expected))}` : null,
    sisterFrequency === undefined ? null : `${sisterName} ${formatNumber(sisterFrequency, decimals(sisterFrequency))}`,
    peak.used ? null : `set aside${peak.setAsideReason.trim() ? `: ${peak.setAsideReason.trim()}` : ''}`,
  ].filter((word) => word !== null);
  if (words.length === 0 && residual === undefined) return null;
  return (
    <View style={{ paddingLeft: space(3) }}>
      <Row justify="space-between" gap={2}>
        <Text size="note" tone="muted">
          {words.join(' · ')}
        </Text>
        {residual === undefined ? null : (
          <Text size="note" tone={Math.abs(residual) > 0.01 ? 'ochre' : 'muted'}>
            {'residual '}
            <Text figures>{`${residual >= 0 ? '+' : ''}${formatNumber(100 * residual, 2)} %`}</Text>
          </Text>
        )}
      </Row>
    </View>
  );
}

function Deafness({ mode, sensor, entered }: { mode: number; sensor: number; entered: boolean }) {
  const words = deafnessOf(mode, sensor);
  if (words === null) return null;
  return (
    <View style={{ paddingLeft: space(3) }}>
      <Text size="note" tone={entered ? 'ochre' : 'muted'}>
        {words}
      </Text>
    </View>
  );
}
