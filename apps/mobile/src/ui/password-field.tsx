import { useState } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Button } from './button.tsx';
import { Field, type FieldProps } from './field.tsx';
import { TextInput } from './text-input.tsx';

export interface PasswordFieldProps extends FieldProps {
  value: string;
  onChange: (text: string) => void;
  onBlur?: () => void;
  /** Tells the password manager which one is meant. */
  purpose: 'current-password' | 'new-password';
}

/** Hidden while typed, unless the person wants to see it: mistyping with gloves is likelier than a glance over the shoulder. */
export function PasswordField({ label, hint, error, value, onChange, onBlur, purpose }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <Field label={label} hint={hint} error={error}>
      {(wiring) => (
        <View style={{ flexDirection: 'row', gap: space(1), alignItems: 'center' }}>
          <View style={{ flex: 1, minWidth: 0 }}>
            <TextInput
              wiring={wiring}
              value={value}
              onChange={onChange}
              onBlur={onBlur}
              invalid={Boolean(error)}
              secret={!shown}
              autoComplete={purpose}
              maxLength={128}
            />
          </View>
          <Button kind="quiet" onPress={() => setShown(!shown)} label={shown ? `Hide: ${label}` : `Show: ${label}`}>
            {shown ? 'Hide' : 'Show'}
          </Button>
        </View>
      )}
    </Field>
  );
}
