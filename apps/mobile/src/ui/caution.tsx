import { useState } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Button } from './button.tsx';
import { Text } from './text.tsx';

export interface CautionProps {
  /** Nobody has checked the result that is shown. */
  unchecked?: boolean;
  /** At the cable: adds what is dangerous there. */
  site?: boolean;
  /** "Averages at 11 °C steel temperature (last survey 13 °C)." */
  conditions?: string;
}

const short = 'Estimated from vibration; the interval holds only if cable, mode numbers, length and mass are right.';
const whole = [
  'Each tension is an average over its record, at the temperature and traffic that are stated with it.',
  'A normal tension does not show that wires or anchorages are sound, and says nothing about capacity under live load.',
  'Where safety depends on the force, this does not replace a direct measurement.',
  'What follows from it is for a licensed engineer to decide, under local codes and the procedures of the owner.',
];
const siteShort = 'Nobody works alone on a loaded cable.';
const siteWhole = [
  'Work on or near a loaded cable is dangerous. Tether tools and instruments over traffic.',
  'Never enter a confined space alone. No damper is disconnected except by the procedure of the owner.',
];

/** What must be at hand wherever a tension is shown as a result. Short, with the whole of it one press away. */
export function Caution({ unchecked, site, conditions }: CautionProps) {
  const [open, setOpen] = useState(false);
  const first = [unchecked ? 'Not checked by anybody yet.' : null, conditions, short, site ? siteShort : null].filter(Boolean).join(' ');
  return (
    <View style={{ gap: space(1), maxWidth: 900 }}>
      <Text size="note" tone="muted">
        {first}
      </Text>
      {open ? (
        <View style={{ gap: space(1) }}>
          {[...whole, ...(site ? siteWhole : [])].map((sentence) => (
            <Text key={sentence} size="note" tone="muted">
              {sentence}
            </Text>
          ))}
        </View>
      ) : null}
      <View style={{ alignItems: 'flex-start', marginLeft: -space(2) }}>
        <Button kind="quiet" onPress={() => setOpen(!open)} expanded={open}>
          {open ? 'Show less' : 'Read the whole caution'}
        </Button>
      </View>
    </View>
  );
}
