import { Field, type FieldProps } from './field.tsx';
import { TextInput, type TextInputProps } from './text-input.tsx';

export interface TextFieldProps extends FieldProps, Omit<TextInputProps, 'wiring' | 'invalid' | 'secret'> {}

/** A line of text, or several with `rows`. */
export function TextField({ label, hint, error, labelHidden, optional, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} labelHidden={labelHidden} optional={optional}>
      {(wiring) => <TextInput {...input} wiring={wiring} invalid={Boolean(error)} />}
    </Field>
  );
}
