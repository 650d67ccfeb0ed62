import { createContext, type ReactNode, use, useEffect, useMemo, useState } from 'react';
import { useColorScheme } from 'react-native';
import { coloursOf, type Scheme, schemeFor, type ThemePreference } from './themes.ts';
import type { Colours } from './tokens.ts';

export interface Theme {
  colours: Colours;
  scheme: Scheme;
  preference: ThemePreference;
  setPreference: (preference: ThemePreference) => void;
}

const ThemeContext = createContext<Theme | null>(null);
const storageKey = 'strandnote.theme';

/** Light or dark as the device says, unless the person chose on this device. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const system: Scheme = useColorScheme() === 'dark' ? 'dark' : 'light';
  const [preference, setStored] = useState(storedPreference);
  const scheme = schemeFor(preference, system);
  const theme = useMemo<Theme>(
    () => ({
      colours: coloursOf(scheme),
      scheme,
      preference,
      setPreference: (next) => {
        localStorage.setItem(storageKey, next);
        setStored(next);
      },
    }),
    [scheme, preference],
  );
  useEffect(() => paintDocument(theme), [theme]);
  return <ThemeContext value={theme}>{children}</ThemeContext>;
}

export function useTheme(): Theme {
  const theme = use(ThemeContext);
  if (!theme) throw new Error('useTheme is used outside ThemeProvider.');
  return theme;
}

export function useColours(): Colours {
  return useTheme().colours;
}

function storedPreference(): ThemePreference {
  const stored = localStorage.getItem(storageKey);
  return stored === 'light' || stored === 'dark' ? stored : 'system';
}

/** What lies outside React's root: page background, browser controls, the colour of the focus ring. */
function paintDocument({ colours, scheme }: Theme): void {
  const { style } = document.documentElement;
  style.setProperty('color-scheme', scheme);
  style.setProperty('--focus', colours.verdigris);
  style.setProperty('--paper', colours.paper);
  document.querySelector('meta[name="theme-color"]')?.setAttribute('content', colours.paper);
}
