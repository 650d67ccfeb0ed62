import { useId } from 'react';
import { Pressable, View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { FieldNotes, type FieldProps, idsOfNotes } from './field.tsx';
import type { Option } from './select.tsx';
import { useTargetSize } from './target-size.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface ChoiceProps<Value extends string> extends Omit<FieldProps, 'labelHidden'> {
  /** null until the person has answered: nothing is answered for them. */
  value: Value | null;
  onChange: (value: Value) => void;
  options: readonly (Option<Value> & { hint?: string })[];
  /** Side by side instead of one under the other. */
  row?: boolean;
}

/** One of a few, all of them in sight. Arrow keys move between them. */
export function Choice<Value extends string>({ label, hint, error, optional, value, onChange, options, row }: ChoiceProps<Value>) {
  const id = useId();
  const group = webProps({
    role: 'radiogroup',
    'aria-labelledby': id,
    'aria-describedby': idsOfNotes({ id, error, hint }),
    'aria-invalid': error ? true : undefined,
    onKeyDown: (event: KeyboardEvent) =>
      moveWithArrows(
        event,
        options.map((option) => option.value),
        value,
        onChange,
      ),
  });
  return (
    <View style={{ gap: space(1) }}>
      <Text id={id} strong size="note">
        {optional ? `${label} (optional)` : label}
      </Text>
      <View {...group} style={{ flexDirection: row ? 'row' : 'column', flexWrap: 'wrap', columnGap: space(5) }}>
        {options.map((option, index) => (
          <Radio
            key={option.value}
            option={option}
            chosen={option.value === value}
            reachable={value === null ? index === 0 : option.value === value}
            onChoose={() => onChange(option.value)}
          />
        ))}
      </View>
      <FieldNotes id={id} error={error} hint={hint} />
    </View>
  );
}

interface RadioProps {
  option: Option & { hint?: string };
  chosen: boolean;
  reachable: boolean;
  onChoose: () => void;
}

function Radio({ option, chosen, reachable, onChoose }: RadioProps) {
  const colours = useColours();
  const minHeight = useTargetSize();
  const web = webProps({ role: 'radio', 'aria-checked': chosen, tabIndex: reachable ? 0 : -1 });
  return (
    <Pressable onPress={onChoose} {...web} style={{ flexDirection: 'row', alignItems: 'center', gap: space(2), minHeight, flexShrink: 1 }}>
      <View
        style={{
          width: 20,
          height: 20,
          borderRadius: 10,
          borderWidth: chosen ? 6 : 1.5,
          borderColor: chosen ? colours.verdigris : colours.ink,
          backgroundColor: colours.sheet,
        }}
      />
      <View style={{ flexShrink: 1 }}>
        <Text strong={chosen}>{option.label}</Text>
        {option.hint ? (
          <Text size="note" tone="muted">
            {option.hint}
          </Text>
        ) : null}
      </View>
    </Pressable>
  );
}

function moveWithArrows<Value>(event: KeyboardEvent, values: Value[], value: Value | null, onChange: (value: Value) => void): void {
  const step = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 }[event.key];
  if (step === undefined) return;
  event.preventDefault();
  const index = value === null ? 0 : values.indexOf(value);
  const next = (index + step + values.length) % values.length;
  onChange(values[next]!);
  const radios = (event.currentTarget as HTMLElement).querySelectorAll<HTMLElement>('[role="radio"]');
  radios[next]?.focus();
}
