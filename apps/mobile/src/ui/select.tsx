import { fontSizes, fonts, hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Field, type FieldProps } from './field.tsx';
import { useTargetSize } from './target-size.tsx';

export interface Option<Value extends string = string> {
  value: Value;
  label: string;
}

export interface SelectProps<Value extends string> extends FieldProps {
  value: Value | null;
  onChange: (value: Value) => void;
  onBlur?: () => void;
  options: readonly Option<Value>[];
  /** Stands in the field until something is chosen; then it cannot be chosen again. */
  placeholder?: string;
}

/** One of many. The browser's own list: it is what a phone, a keyboard and a screen reader know best. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { label, hint, error, labelHidden, optional, value, onChange, onBlur, options, placeholder = 'Choose' } = props;
  const style = useSelectStyle(Boolean(error));
  return (
    <Field label={label} hint={hint} error={error} labelHidden={labelHidden} optional={optional}>
      {({ id, aria }) => (
        <select
          id={id}
          {...aria}
          value={value ?? ''}
          onChange={(event) => onChange(event.currentTarget.value as Value)}
          onBlur={onBlur}
          style={style}
        >
          {value === null ? (
            <option value="" disabled>
              {placeholder}
            </option>
          ) : null}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

function useSelectStyle(invalid: boolean) {
  const colours = useColours();
  const minHeight = useTargetSize();
  const edge = invalid ? colours.minium : colours.muted;
  return {
    minHeight,
    width: '100%',
    maxWidth: 480,
    padding: `${space(2)}px ${space(3)}px`,
    background: colours.sheet,
    color: colours.ink,
    fontFamily: fonts.text,
    fontSize: fontSizes.body,
    border: `${hairline}px solid ${edge}`,
    borderBottom: `2px solid ${invalid ? colours.minium : colours.ink}`,
    borderRadius: radius,
  };
}
