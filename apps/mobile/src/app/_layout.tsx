import { Slot } from 'expo-router';
import { useThemeFonts } from '../theme/theme-fonts.ts';
import { ThemeProvider } from '../theme/use-theme.tsx';

export default function RootLayout() {
  useThemeFonts();
  return (
    <ThemeProvider>
      <Slot />
    </ThemeProvider>
  );
}
