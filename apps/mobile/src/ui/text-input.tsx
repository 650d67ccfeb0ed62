import type { ComponentProps, ReactNode, Ref } from 'react';
import { TextInput as NativeInput, type TextStyle } from 'react-native';
import { fontSizes, fonts, hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import type { ControlWiring } from './field.tsx';
import { useSubmit } from './form.tsx';
import { useTargetSize } from './target-size.tsx';
import { webProps } from './web-props.ts';

export interface TextInputProps {
  wiring: ControlWiring;
  value: string;
  onChange: (text: string) => void;
  onBlur?: () => void;
  invalid: boolean;
  figures?: boolean;
  large?: boolean;
  rows?: number;
  maxLength?: number;
  inputMode?: ComponentProps<typeof NativeInput>['inputMode'];
  autoComplete?: string;
  secret?: boolean;
  readOnly?: boolean;
  inputRef?: Ref<NativeInput>;
  onKeyPress?: ComponentProps<typeof NativeInput>['onKeyPress'];
  onPaste?: (text: string) => boolean;
}

/** The bare control that the fields of ui/ are made of. */
export function TextInput(props: TextInputProps) {
  const { wiring, value, onChange, onBlur, rows, maxLength, inputMode, autoComplete, secret, readOnly, inputRef, onKeyPress, figures } =
    props;
  const submit = useSubmit();
  // A phone that makes a capital or another word of an address, a password or a figure spoils it.
  const literal = secret || figures || inputMode === 'email';
  const style = useInputStyle(props);
  const input = (
    <NativeInput
      ref={inputRef}
      value={value}
      onChangeText={onChange}
      onBlur={onBlur}
      multiline={rows !== undefined}
      secureTextEntry={secret}
      readOnly={readOnly}
      {...(literal ? { autoCapitalize: 'none', autoCorrect: false, spellCheck: false } : {})}
      onSubmitEditing={rows === undefined ? submit : undefined}
      onKeyPress={onKeyPress}
      {...(maxLength === undefined ? {} : { maxLength })}
      {...(inputMode === undefined ? {} : { inputMode })}
      {...webProps({
        id: wiring.id,
        rows,
        autoComplete,
        // Enter submits; who has to mend something is still in the field.
        blurOnSubmit: false,
        ...wiring.aria,
      })}
      style={style}
    />
  );
  return props.onPaste ? <PasteCatcher take={props.onPaste}>{input}</PasteCatcher> : input;
}

/** Hands pasted text over first; what is taken is not pasted into the field as well. React Native Web's input does not pass the event on. */
function PasteCatcher({ take, children }: { take: (text: string) => boolean; children: ReactNode }) {
  return (
    <div
      style={{ display: 'flex', minWidth: 0 }}
      onPaste={(event) => {
        if (take(event.clipboardData.getData('text'))) event.preventDefault();
      }}
    >
      {children}
    </div>
  );
}

function useInputStyle({ invalid, figures, large, rows, readOnly }: TextInputProps): TextStyle {
  const colours = useColours();
  const minHeight = useTargetSize() + (large ? 4 : 0);
  return {
    minHeight: rows === undefined ? minHeight : undefined,
    minWidth: 0,
    // An input left to itself is twenty letters wide, whatever its place.
    width: '100%',
    paddingHorizontal: space(3),
    paddingVertical: space(2),
    backgroundColor: readOnly ? colours.paper : colours.sheet,
    color: colours.ink,
    fontFamily: figures ? fonts.figures : fonts.text,
    // Under 16 px a phone zooms into the field when it is touched.
    fontSize: large ? fontSizes.heading : fontSizes.body,
    textAlign: figures ? 'right' : 'left',
    borderWidth: hairline,
    borderColor: invalid ? colours.minium : colours.muted,
    borderBottomWidth: 2,
    borderBottomColor: invalid ? colours.minium : colours.ink,
    borderRadius: radius,
  };
}
