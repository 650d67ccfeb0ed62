import { useState } from 'react';
import { radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';

/** The first thing the Tab key reaches: past the places, straight to what the page is about. */
export function SkipLink() {
  const colours = useColours();
  const [seen, setSeen] = useState(false);
  const away = { clipPath: 'inset(50%)' };
  return (
    // biome-ignore lint/a11y/useValidAnchor: it leads to a place of the page, as a link does
    <a
      href="#main"
      onFocus={() => setSeen(true)}
      onBlur={() => setSeen(false)}
      onClick={(event) => {
        // The router takes a new hash for a new place; only the focus is to move.
        event.preventDefault();
        document.getElementById('main')?.focus();
      }}
      style={{
        position: 'absolute',
        top: space(2),
        left: space(2),
        zIndex: 2,
        padding: `${space(2)}px ${space(4)}px`,
        background: colours.sheet,
        borderRadius: radius,
        ...(seen ? {} : away),
      }}
    >
      <Text tone="verdigris" strong>
        Skip to the page
      </Text>
    </a>
  );
}
