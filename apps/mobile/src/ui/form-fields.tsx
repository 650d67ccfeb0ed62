import { type Control, type FieldPath, type FieldValues, useController } from 'react-hook-form';
import { problemOfEntry, type QuantityEntry } from '../lib/quantity-entry.ts';
import { useUnits } from '../lib/units.tsx';
import { Checkbox, type CheckboxProps } from './checkbox.tsx';
import { Choice, type ChoiceProps } from './choice.tsx';
import { PasswordField, type PasswordFieldProps } from './password-field.tsx';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';
import { Select, type SelectProps } from './select.tsx';
import { TextField, type TextFieldProps } from './text-field.tsx';

/** Where a field hangs in a form of react-hook-form. */
interface Bound<Values extends FieldValues, Value> {
  control: Control<Values>;
  name: FieldPath<Values>;
  /** A sentence when the value is wrong, null when it is right. */
  check?: (value: Value) => string | null;
}

type Unbound<Props> = Omit<Props, 'value' | 'onChange' | 'onBlur' | 'error'>;

function useBound<Values extends FieldValues, Value>({ control, name, check }: Bound<Values, Value>) {
  // react-hook-form knows the value as one of all that the form may hold; the field knows which.
  const validate = check === undefined ? undefined : (value: unknown) => check(value as Value) ?? true;
  const { field, fieldState } = useController({ control, name, ...(validate ? { rules: { validate } } : {}) });
  // inputRef: what react-hook-form focuses after a refused submission.
  return {
    value: field.value,
    onChange: field.onChange,
    onBlur: field.onBlur,
    inputRef: field.ref,
    error: fieldState.error?.message ?? null,
  };
}

export function FormTextField<Values extends FieldValues>({
  control,
  name,
  check,
  ...props
}: Bound<Values, string> & Unbound<TextFieldProps>) {
  return <TextField {...props} {...useBound({ control, name, check })} />;
}

export function FormPasswordField<Values extends FieldValues>({
  control,
  name,
  check,
  ...props
}: Bound<Values, string> & Unbound<PasswordFieldProps>) {
  const { inputRef: _, ...bound } = useBound({ control, name, check });
  return <PasswordField {...props} {...bound} />;
}

/** The value in the form is a QuantityEntry; `rules` are checked in the person's units. */
export function FormQuantityField<Values extends FieldValues>({
  control,
  name,
  check,
  rules,
  ...props
}: Bound<Values, QuantityEntry> & Unbound<QuantityFieldProps>) {
  const { system } = useUnits();
  const checkEntry = (entry: QuantityEntry) => problemOfEntry(entry, rules, system) ?? check?.(entry) ?? null;
  return <QuantityField {...props} rules={rules} {...useBound({ control, name, check: checkEntry })} />;
}

export function FormSelect<Values extends FieldValues, Value extends string>({
  control,
  name,
  check,
  ...props
}: Bound<Values, Value | null> & Unbound<SelectProps<Value>>) {
  const { inputRef: _, ...bound } = useBound({ control, name, check });
  return <Select {...props} {...bound} />;
}

export function FormChoice<Values extends FieldValues, Value extends string>({
  control,
  name,
  check,
  ...props
}: Bound<Values, Value | null> & Unbound<ChoiceProps<Value>>) {
  const { inputRef: _, onBlur: __, ...bound } = useBound({ control, name, check });
  return <Choice {...props} {...bound} />;
}

export function FormCheckbox<Values extends FieldValues>({
  control,
  name,
  check,
  ...props
}: Bound<Values, boolean> & Unbound<CheckboxProps>) {
  const { inputRef: _, onBlur: __, ...bound } = useBound({ control, name, check });
  return <Checkbox {...props} {...bound} />;
}
