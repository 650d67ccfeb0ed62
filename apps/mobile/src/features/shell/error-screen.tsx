import type { ErrorBoundaryProps } from 'expo-router';
import { ThemeProvider } from '../../theme/use-theme.tsx';
import { Page, Problem } from '../../ui/index.ts';

/** A page that failed while it was drawn. It brings its own theme: the one around it may be what failed. */
export function ErrorScreen({ error, retry }: ErrorBoundaryProps) {
  return (
    <ThemeProvider>
      <Page title="This page failed" narrow>
        <Problem error={error} onRetry={retry} />
      </Page>
    </ThemeProvider>
  );
}
