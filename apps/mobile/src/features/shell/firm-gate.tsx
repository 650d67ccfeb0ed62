import { Redirect, Slot, useLocalSearchParams, usePathname } from 'expo-router';
import { FirmProvider, useMeQuery } from '../../lib/session.tsx';
import { Loading, Page, Problem } from '../../ui/index.ts';
import { NotFoundScreen } from './not-found-screen.tsx';

/** Lets in who belongs to the firm of the address; asks the others to sign in, and brings them back here. */
export function FirmGate() {
  const { firm } = useLocalSearchParams<{ firm: string }>();
  const pathname = usePathname();
  const me = useMeQuery();
  if (me.isPending)
    return (
      <Page title="Strandnote">
        <Loading />
      </Page>
    );
  if (me.isError && me.data === undefined) {
    return (
      <Page title="Strandnote" narrow>
        <Problem error={me.error} onRetry={me.refetch} />
      </Page>
    );
  }
  if (!me.data) return <Redirect href={`/sign-in?next=${encodeURIComponent(pathname)}` as '/'} />;
  const membership = me.data.firms.find((candidate) => candidate.firmId === firm);
  if (!membership) return <NotFoundScreen />;
  return (
    <FirmProvider membership={membership}>
      <Slot />
    </FirmProvider>
  );
}
