import { useUnits } from '../../lib/units.tsx';
import { Button, Notice, Stack, Text } from '../../ui/index.ts';
import type { EntryAction } from './entry-draft.ts';
import type { NumberingFindings, Renumbering } from './numbering-audit.ts';

interface NumberingPanelProps {
  numbering: NumberingFindings | null;
  dispatch: (action: EntryAction) => void;
}

/** Whether the mode numbers hold: a wrong order is the worst blunder, because its tension looks plausible. */
export function NumberingPanel({ numbering, dispatch }: NumberingPanelProps) {
  const units = useUnits();
  if (!numbering) return null;
  const { fits, notes, alternatives } = numbering;
  if (notes.length === 0) {
    return fits ? (
      <Text size="note" tone="muted">
        {`Numbering fits, ${fits}.`}
      </Text>
    ) : null;
  }
  const offer = ({ words, tension, odds }: Renumbering) =>
    `${words}${tension === null ? '' : `: about ${units.show(tension, 'force')}`}, ${odds}`;
  return (
    <Notice kind="caution" title="Look at the mode numbers" alert>
      {notes.map((note) => (
        <Text key={note}>{note}</Text>
      ))}
      <Stack gap={2}>
        {alternatives.map((alternative) => (
          <Button key={alternative.words} onPress={() => dispatch({ type: 'peaksRenumbered', modes: alternative.modes })}>
            {`Renumber ${offer(alternative)}`}
          </Button>
        ))}
      </Stack>
    </Notice>
  );
}
