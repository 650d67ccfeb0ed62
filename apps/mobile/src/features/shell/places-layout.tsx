import { Slot, usePathname } from 'expo-router';
import { Suspense, useEffect, useRef } from 'react';
import { View } from 'react-native';
import { Mark } from '../../drawings/index.ts';
import { type Membership, useFirm, useMeQuery } from '../../lib/session.tsx';
import {
  BarHeight,
  Link,
  Loading,
  PlaceBar,
  type PlaceLink,
  PlaceRail,
  placeBarHeight,
  Row,
  SkipLink,
  Text,
  useWide,
} from '../../ui/index.ts';
import { OutboxNote } from './outbox-note.tsx';
import { placesOf } from './places.ts';

/** The frame of everything in a firm: places at the foot of a phone, at the left of a wide screen. */
export function PlacesLayout() {
  const wide = useWide();
  const firm = useFirm();
  const pathname = usePathname();
  const places = placesOf(firm).map(({ label, path }): PlaceLink => {
    const href = `/${firm.firmId}/${path}`;
    return { label, href, current: pathname === href || pathname.startsWith(`${href}/`) };
  });
  useTopOfPage(pathname);
  return wide ? <WideFrame firm={firm} places={places} /> : <PhoneFrame firm={firm} places={places} />;
}

interface FrameProps {
  firm: Membership;
  places: PlaceLink[];
}

function WideFrame({ firm, places }: FrameProps) {
  return (
    <View style={{ flexDirection: 'row', flexGrow: 1 }}>
      <SkipLink />
      <PlaceRail places={places} head={<Name />} foot={<Whereabouts firm={firm} />} />
      <View style={{ flex: 1, minWidth: 0 }}>
        <PlaceSlot />
      </View>
    </View>
  );
}

function PhoneFrame({ firm, places }: FrameProps) {
  return (
    <BarHeight value={placeBarHeight}>
      <View style={{ flexGrow: 1 }}>
        <SkipLink />
        <View role="banner" style={{ paddingHorizontal: 16, paddingTop: 8 }}>
          <Row justify="space-between">
            <Name />
            <Row gap={4}>
              <OutboxNote />
              <Link href="/account" size="note">
                Account
              </Link>
            </Row>
          </Row>
          <Text size="small" tone="muted" lines={1}>
            {firm.firmName}
          </Text>
        </View>
        <View style={{ flexGrow: 1, minWidth: 0 }}>
          <PlaceSlot />
        </View>
        <PlaceBar places={places} />
      </View>
    </BarHeight>
  );
}

/** The screens come in a chunk of their own; the frame is there at once. */
function PlaceSlot() {
  return (
    <Suspense fallback={<Loading />}>
      <Slot />
    </Suspense>
  );
}

function Name() {
  return (
    <Row gap={2} wrap={false}>
      <Mark />
      <Text strong size="lead">
        strandnote
      </Text>
    </Row>
  );
}

function Whereabouts({ firm }: { firm: Membership }) {
  const me = useMeQuery();
  return (
    <>
      <OutboxNote />
      <Text size="note" tone="muted">
        {firm.firmName}
      </Text>
      <Link href="/account" size="note">
        {me.data?.name ?? 'Account'}
      </Link>
    </>
  );
}

/** A new page begins at its top, as a page load would; going back finds the old place, which the browser keeps. */
function useTopOfPage(pathname: string): void {
  const wentBack = useRef(false);
  useEffect(() => {
    const noteBack = () => {
      wentBack.current = true;
    };
    addEventListener('popstate', noteBack);
    return () => removeEventListener('popstate', noteBack);
  }, []);
  // biome-ignore lint/correctness/useExhaustiveDependencies: the path is what the effect answers to
  useEffect(() => {
    if (!wentBack.current) scrollTo(0, 0);
    wentBack.current = false;
  }, [pathname]);
}
