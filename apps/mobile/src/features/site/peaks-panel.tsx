import { useCallback, useRef, useState } from 'react';
import { View } from 'react-native';
import { space } from '../../theme/tokens.ts';
import { Button, Heading, Panel, Row, Rule, Sheet, Stack, Text, TextField } from '../../ui/index.ts';
import { type EntryAction, type EntryDraft, modeOf } from './entry-draft.ts';
import type { EntryFindings } from './entry-findings.ts';
import type { NumberingFindings } from './numbering-audit.ts';
import { NumberingPanel } from './numbering-panel.tsx';
import { pastedColumn } from './paste-column.ts';
import { PeakRow } from './peak-row.tsx';

interface PeaksPanelProps {
  draft: EntryDraft;
  findings: EntryFindings;
  /** Hz, mode 1 first. */
  expected: readonly number[];
  numbering: NumberingFindings | null;
  sister: { name: string; frequencies: ReadonlyMap<string, number> } | null;
  sensor: number | null;
  /** Saving was tried: what is wrong is shown at once. */
  strict: boolean;
  dispatch: (action: EntryAction) => void;
}

interface Focusable {
  focus: () => void;
}

export function PeaksPanel({ draft, findings, expected, numbering, sister, sensor, strict, dispatch }: PeaksPanelProps) {
  const [pasting, setPasting] = useState(false);
  const { inputRefOf, keyPressOf, pasteOf } = useRowHandlers(draft, dispatch);
  const last = draft.peaks.at(-1);
  return (
    <Panel flush>
      <View style={{ paddingHorizontal: space(4), paddingTop: space(2) }}>
        <Row justify="space-between">
          <Heading level={2} size="lead">
            Modal peaks
          </Heading>
          <Button kind="quiet" onPress={() => setPasting(true)}>
            Paste a column
          </Button>
        </Row>
      </View>
      {draft.peaks.map((peak) => {
        const mode = modeOf(peak);
        return (
          <View key={peak.id}>
            <Rule />
            <View style={{ paddingHorizontal: space(2), paddingVertical: space(1) }}>
              <PeakRow
                peak={peak}
                problems={findings.problems.peaks[peak.id]}
                residual={findings.residuals.get(peak.id)}
                question={findings.questions.get(peak.id)}
                expected={mode === null ? undefined : expected[mode - 1]}
                sisterName={sister?.name ?? null}
                sisterFrequency={sister?.frequencies.get(`${peak.plane} ${mode}`)}
                sensor={sensor}
                strict={strict}
                dispatch={dispatch}
                inputRef={inputRefOf(peak.id)}
                onKeyPress={keyPressOf(peak.id)}
                onPaste={pasteOf(peak.id)}
              />
            </View>
          </View>
        );
      })}
      <Rule />
      <View style={{ paddingHorizontal: space(4), paddingVertical: space(2), gap: space(2) }}>
        <NumberingPanel numbering={numbering} dispatch={dispatch} />
        <Row justify="space-between">
          <Text size="note" tone="muted">
            Touch a wave for its number, plane or uncertainty, or to set it aside.
          </Text>
          <Button kind="quiet" onPress={() => dispatch({ type: 'peakAdded' })}>
            {last ? 'Add a mode' : 'Add the first mode'}
          </Button>
        </Row>
      </View>
      {pasting ? <PasteSheet draft={draft} dispatch={dispatch} onClose={() => setPasting(false)} /> : null}
    </Panel>
  );
}

/** Enter and the arrows go from row to row; what is pasted fills the rows below. Handlers of a row stay the same object. */
function useRowHandlers(draft: EntryDraft, dispatch: (action: EntryAction) => void) {
  const inputs = useRef(new Map<string, Focusable>());
  const order = useRef<string[]>([]);
  order.current = draft.peaks.map(({ id }) => id);
  const made = useRef(new Map<string, RowHandlers>());
  const handlersOf = useCallback(
    (id: string) => {
      const known = made.current.get(id) ?? rowHandlers(id, { inputs: inputs.current, order, dispatch });
      made.current.set(id, known);
      return known;
    },
    [dispatch],
  );
  return {
    inputRefOf: (id: string) => handlersOf(id).inputRef,
    keyPressOf: (id: string) => handlersOf(id).onKeyPress,
    pasteOf: (id: string) => handlersOf(id).onPaste,
  };
}

type RowHandlers = ReturnType<typeof rowHandlers>;

interface Rows {
  inputs: Map<string, Focusable>;
  order: { current: string[] };
  dispatch: (action: EntryAction) => void;
}

function rowHandlers(id: string, { inputs, order, dispatch }: Rows) {
  return {
    inputRef: (input: Focusable | null) => {
      if (input) inputs.set(id, input);
      else inputs.delete(id);
    },
    onKeyPress: (event: { nativeEvent: { key: string }; preventDefault: () => void }) => {
      const step = { Enter: 1, ArrowDown: 1, ArrowUp: -1 }[event.nativeEvent.key];
      if (step === undefined) return;
      event.preventDefault();
      const next = order.current[order.current.indexOf(id) + step];
      if (next) inputs.get(next)?.focus();
      else if (event.nativeEvent.key === 'Enter') dispatch({ type: 'peakAdded' });
    },
    onPaste: (text: string) => {
      const frequencies = pastedColumn(text);
      if (!frequencies) return false;
      dispatch({ type: 'columnPasted', id, frequencies });
      return true;
    },
  };
}

function PasteSheet({ draft, dispatch, onClose }: Pick<PeaksPanelProps, 'draft' | 'dispatch'> & { onClose: () => void }) {
  const [text, setText] = useState('');
  const frequencies = pastedColumn(`${text}\n`) ?? pastedColumn(`0\n${text}`)?.slice(1) ?? [];
  const first = draft.peaks[0];
  const take = () => {
    if (!first) dispatch({ type: 'peakAdded' });
    dispatch({ type: 'columnPasted', id: first?.id ?? '', frequencies });
    onClose();
  };
  const why = frequencies.length === 0 ? 'Nothing that can be read as a frequency yet.' : null;
  return (
    <Sheet
      title="Paste a column"
      onClose={onClose}
      holds={text !== ''}
      actions={
        <Button kind="primary" onPress={take} why={why}>
          {frequencies.length > 0 ? `Take ${frequencies.length} frequencies` : 'Take the frequencies'}
        </Button>
      }
    >
      <Stack gap={2}>
        <TextField
          label="Frequencies in Hz, one a line"
          hint="Copied from a spreadsheet, with point or comma. They fill the rows from the first mode on."
          value={text}
          onChange={setText}
          rows={8}
        />
      </Stack>
    </Sheet>
  );
}
