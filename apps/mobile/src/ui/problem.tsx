import { ApiProblem } from '../lib/api-problem.ts';
import { Button } from './button.tsx';
import { Stack } from './layout.tsx';
import { Notice } from './notice.tsx';
import { Text } from './text.tsx';

export interface ProblemProps {
  error: unknown;
  /** Tries again; a query's `refetch` fits. */
  onRetry?: () => unknown;
}

const titles: Record<ApiProblem['kind'], string> = {
  offline: 'No connection',
  'signed-out': 'Signed out',
  refused: 'Not accepted',
  'not-allowed': 'Not allowed',
  'not-found': 'Not found',
  failed: 'Something failed',
};

/** Why nothing came, and what can be done about it. */
export function Problem({ error, onRetry }: ProblemProps) {
  const known = error instanceof ApiProblem ? error : null;
  const final = known?.kind === 'not-found' || known?.kind === 'not-allowed';
  return (
    <Notice kind="problem" title={known ? titles[known.kind] : 'Something failed'}>
      <Stack gap={3}>
        <Text>{known ? known.message : 'This page could not be shown. Try again; what was saved is still there.'}</Text>
        {known?.kind === 'signed-out' ? <Button href="/sign-in">Sign in</Button> : null}
        {onRetry && !final ? <Button onPress={() => onRetry()}>Try again</Button> : null}
      </Stack>
    </Notice>
  );
}
