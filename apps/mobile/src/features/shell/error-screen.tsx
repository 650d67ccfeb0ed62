import type { ErrorBoundaryProps } from 'expo-router';
import { ThemeProvider } from '../../theme/use-theme.tsx';
import { Page, Problem } from '../../ui/index.ts';

/**
 * A page that failed while it was drawn, or whose screens could not be loaded: reloading is the one remedy for both.
 * It brings its own theme: the one around it may be what failed.
 */
export function ErrorScreen({ error }: ErrorBoundaryProps) {
  return (
    <ThemeProvider>
      <Page title="This page failed" narrow>
        <Problem error={error} onRetry={() => location.reload()} />
      </Page>
    </ThemeProvider>
  );
}
