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
interface Bound<Values extends FieldValues> {
  control: Control<Values>;
  name: FieldPath<Values>;
  /** A sentence when the value is wrong, null when it is right. */
  check?: (value: never) => string | null;
}

type Unbound<Props> = Omit<Props, 'value' | 'onChange' | 'onBlur' | 'error'>;

function useBound<Values extends FieldValues>({ control, name, check }: Bound<Values>) {
  const validate = check === undefined ? undefined : (value: unknown) => check(value as never) ?? true;
  const { field, fieldState } = useController({ control, name, ...(validate ? { rules: { validate } } : {}) });
  // The name of the element that react-hook-form focuses after a refused submission.
  return {
    value: field.value,
    onChange: field.onChange,
    onBlur: field.onBlur,
    inputRef: field.ref,
    error: fieldState.error?.message ?? null,
  };
}

export function FormTextField<Values extends FieldValues>({ control, name, check, ...props }: Bound<Values> & Unbound<TextFieldProps>) {
  return <TextField {...props} {...useBound({ control, name, check })} />;
}

export function FormPasswordField<Values extends FieldValues>({
  control,
  name,
  check,
  ...props
}: Bound<Values> & Unbound<PasswordFieldProps>) {
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
}: Bound<Values> & Unbound<QuantityFieldProps>) {
  const { system } = useUnits();
  const checkEntry = (entry: QuantityEntry) => problemOfEntry(entry, rules, system) ?? check?.(entry as never) ?? null;
  return <QuantityField {...props} rules={rules} {...useBound({ control, name, check: checkEntry as Bound<Values>['check'] })} />;
}

export function FormSelect<Values extends FieldValues, Value extends string>({
  control,
  name,
  check,
  ...props
}: Bound<Values> & Unbound<SelectProps<Value>>) {
  const { inputRef: _, ...bound } = useBound({ control, name, check });
  return <Select {...props} {...bound} />;
}

export function FormChoice<Values extends FieldValues, Value extends string>({
  control,
  name,
  check,
  ...props
}: Bound<Values> & Unbound<ChoiceProps<Value>>) {
  const { inputRef: _, onBlur: __, ...bound } = useBound({ control, name, check });
  return <Choice {...props} {...bound} />;
}

export function FormCheckbox<Values extends FieldValues>({ control, name, check, ...props }: Bound<Values> & Unbound<CheckboxProps>) {
  const { inputRef: _, onBlur: __, ...bound } = useBound({ control, name, check });
  return <Checkbox {...props} {...bound} />;
}
