import { type Colours, darkColours, lightColours } from './tokens.ts';

export type Scheme = 'light' | 'dark';
export type ThemePreference = 'system' | Scheme;

const themes: Record<Scheme, Colours> = { light: lightColours, dark: darkColours };

export function schemeFor(preference: ThemePreference, system: Scheme): Scheme {
  return preference === 'system' ? system : preference;
}

export function coloursOf(scheme: Scheme): Colours {
  return themes[scheme];
}
