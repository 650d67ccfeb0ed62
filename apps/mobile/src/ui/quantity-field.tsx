import { useState } from 'react';
import { View } from 'react-native';
import { problemOfEntry, type QuantityEntry, type QuantityRules, readEntry } from '../lib/quantity-entry.ts';
import { useUnits } from '../lib/units.tsx';
import { space } from '../theme/tokens.ts';
import { Field, type FieldProps } from './field.tsx';
import { Text } from './text.tsx';
import { TextInput, type TextInputProps } from './text-input.tsx';

export interface QuantityFieldProps extends FieldProps, Pick<TextInputProps, 'onBlur' | 'large' | 'inputRef' | 'onKeyPress' | 'onPaste'> {
  value: QuantityEntry;
  onChange: (entry: QuantityEntry) => void;
  /** What quantity it is, and what is allowed; the error speaks the person's units. */
  rules: QuantityRules;
  /** For signed quantities: brings up a keyboard that has a minus sign. */
  signed?: boolean;
}

/** A number with its unit. The text stays as typed; its SI value travels beside it. */
export function QuantityField({
  label,
  hint,
  error,
  labelHidden,
  optional,
  value,
  onChange,
  onBlur,
  rules,
  signed,
  ...input
}: QuantityFieldProps) {
  const { system, symbol } = useUnits();
  const [left, setLeft] = useState(false);
  const unit = symbol(rules.kind);
  // While it is being typed a number is not yet wrong: "1." is on its way to "1.2".
  const found = error ?? (left && value.text.trim() !== '' ? problemOfEntry(value, rules, system) : null);
  return (
    <Field label={label} hint={hint} error={found} labelHidden={labelHidden} optional={optional}>
      {({ id, aria }) => (
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(2) }}>
          <View style={{ flex: 1, minWidth: 72, maxWidth: 240 }}>
            <TextInput
              {...input}
              wiring={{ id, aria: { ...aria, 'aria-label': labelHidden && unit ? `${label}, ${unit}` : aria['aria-label'] } }}
              value={value.text}
              onChange={(text) => {
                setLeft(false);
                onChange(readEntry(text, rules.kind, system));
              }}
              onBlur={() => {
                setLeft(true);
                onBlur?.();
              }}
              invalid={Boolean(found)}
              inputMode={signed ? 'text' : 'decimal'}
              autoComplete="off"
              figures
            />
          </View>
          {unit === '' ? null : <Text tone="muted">{unit}</Text>}
        </View>
      )}
    </Field>
  );
}
