import { createContext, type ReactNode, use } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { webProps } from './web-props.ts';

const SubmitContext = createContext<(() => void) | undefined>(undefined);

export interface FormProps {
  children: ReactNode;
  /** Pressing Enter in a field does this too; give `handleSubmit(…)` of the form. */
  onSubmit: () => void;
  /** What the form is for, where no heading says so. */
  label?: string;
}

/** A form of the page: Enter submits, password managers find their fields. */
export function Form({ children, onSubmit, label }: FormProps) {
  const web = webProps({
    'aria-label': label,
    onSubmit: (event: Event) => {
      event.preventDefault();
      onSubmit();
    },
  });
  return (
    <View role="form" style={{ gap: space(5) }} {...web}>
      <SubmitContext value={onSubmit}>{children}</SubmitContext>
    </View>
  );
}

/** What Enter does in a field that stands in a form. */
export function useSubmit(): (() => void) | undefined {
  return use(SubmitContext);
}
