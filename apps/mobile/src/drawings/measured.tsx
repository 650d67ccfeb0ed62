import { type ReactNode, useState } from 'react';
import { View } from 'react-native';

interface MeasuredProps {
  /** What the drawing shows, in words; none where the words stand beside it. */
  label?: string;
  /** Holds links of its own, which have their names. */
  interactive?: boolean;
  /** Keeps the place while the width is not known yet. */
  minHeight: number;
  children: (width: number) => ReactNode;
}

/** Gives a drawing the width of its place on the page. */
export function Measured({ label, interactive, minHeight, children }: MeasuredProps) {
  const [width, setWidth] = useState(0);
  const named = interactive
    ? {}
    : label === undefined
      ? ({ 'aria-hidden': true } as const)
      : ({ role: 'img', 'aria-label': label } as const);
  return (
    <View
      {...named}
      style={{ minHeight, alignSelf: 'stretch', minWidth: 0, overflow: 'hidden' }}
      onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
    >
      {width > 0 ? children(Math.floor(width)) : null}
    </View>
  );
}
