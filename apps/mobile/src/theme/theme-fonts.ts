import { AtkinsonHyperlegibleMono_400Regular } from '@expo-google-fonts/atkinson-hyperlegible-mono/400Regular';
import { AtkinsonHyperlegibleMono_600SemiBold } from '@expo-google-fonts/atkinson-hyperlegible-mono/600SemiBold';
import { AtkinsonHyperlegibleNext_400Regular } from '@expo-google-fonts/atkinson-hyperlegible-next/400Regular';
import { AtkinsonHyperlegibleNext_600SemiBold } from '@expo-google-fonts/atkinson-hyperlegible-next/600SemiBold';
import { STIXTwoText_400Regular_Italic } from '@expo-google-fonts/stix-two-text/400Regular_Italic';
import { FontDisplay, useFonts } from 'expo-font';

const files = {
  AtkinsonHyperlegibleNext_400Regular,
  AtkinsonHyperlegibleNext_600SemiBold,
  AtkinsonHyperlegibleMono_400Regular,
  AtkinsonHyperlegibleMono_600SemiBold,
  STIXTwoText_400Regular_Italic,
};

// Swap: a page without its fonts can be read, a page waiting for them cannot.
const sources = Object.fromEntries(Object.entries(files).map(([name, uri]) => [name, { uri, display: FontDisplay.SWAP }]));

export function useThemeFonts(): void {
  useFonts(sources);
}
