import { type ReactNode, useId } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Text } from './text.tsx';

export interface FieldProps {
  label: string;
  /** What to type, or why it is asked. */
  hint?: string;
  /** What is wrong and what would be right. */
  error?: string | null;
  /** The label is for those who hear the page; the eye has it from the row or column. */
  labelHidden?: boolean;
  /** Says beside the label that nothing needs to be typed. */
  optional?: boolean;
}

export interface ControlWiring {
  id: string;
  /** For the control that carries the value. */
  aria: Record<string, unknown>;
}

interface FieldFrameProps extends FieldProps {
  children: (wiring: ControlWiring) => ReactNode;
}

/** Label above, control, then the error or the hint, tied together for those who hear the page. */
export function Field({ label, hint, error, labelHidden, optional, children }: FieldFrameProps) {
  const id = useId();
  const aria = {
    'aria-label': labelHidden ? label : undefined,
    'aria-invalid': error ? true : undefined,
    'aria-describedby': idsOfNotes({ id, error, hint }),
  };
  return (
    <View style={{ gap: space(1), minWidth: 0, flexShrink: 1, alignSelf: 'stretch' }}>
      {labelHidden ? null : (
        <label htmlFor={id}>
          <Text strong size="note">
            {label}
          </Text>
          {optional ? (
            <Text size="note" tone="muted">
              {' (optional)'}
            </Text>
          ) : null}
        </label>
      )}
      {children({ id, aria })}
      <FieldNotes id={id} error={error} hint={hint} />
    </View>
  );
}

interface Notes {
  /** Of the field that they belong to. */
  id: string;
  error: string | null | undefined;
  hint: string | undefined;
}

/** What `aria-describedby` of a control names. */
export function idsOfNotes({ id, error, hint }: Notes): string | undefined {
  const ids = [error ? `${id}-error` : null, hint ? `${id}-hint` : null].filter(Boolean).join(' ');
  return ids === '' ? undefined : ids;
}

/** What is wrong, and what to type, under a control. */
export function FieldNotes({ id, error, hint }: Notes) {
  return (
    <>
      {error ? (
        <Text id={`${id}-error`} size="note" tone="minium" strong live>
          {error}
        </Text>
      ) : null}
      {hint ? (
        <Text id={`${id}-hint`} size="note" tone="muted">
          {hint}
        </Text>
      ) : null}
    </>
  );
}
