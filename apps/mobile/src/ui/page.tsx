import { type ReactNode, useEffect, useRef } from 'react';
import { View, type ViewStyle } from 'react-native';
import { hairline, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useBarHeight } from './bar-height.tsx';
import { ButtonWidth } from './button.tsx';
import { Link } from './link.tsx';
import { Heading, Text } from './text.tsx';
import { useWide } from './use-wide.ts';
import { webProps } from './web-props.ts';

export interface Crumb {
  label: string;
  href?: string;
}

export interface PageProps {
  title: string;
  /** Where this page hangs: "Marrow Firth Crossing / Campaign 4". */
  breadcrumb?: Crumb[];
  /** Buttons, the main one last: at the foot on a phone, top right on a wide screen. */
  actions?: ReactNode;
  /** A Tag or a Progress beside the title. */
  status?: ReactNode;
  /** No wider than is good for reading and typing. */
  narrow?: boolean;
  children: ReactNode;
}

/** One screen: its title, where it hangs, what can be done, and what it shows. */
export function Page({ title, breadcrumb, actions, status, narrow, children }: PageProps) {
  const wide = useWide();
  const main = useArrival(title);
  const style: ViewStyle = {
    flexGrow: 1,
    width: '100%',
    maxWidth: narrow ? 720 : 1440,
    paddingHorizontal: space(wide ? 8 : 4),
    paddingTop: space(wide ? 7 : 5),
    paddingBottom: space(8),
    gap: space(wide ? 6 : 5),
  };
  return (
    <View role="main" id="main" ref={main} {...webProps({ tabIndex: -1 })} style={{ flexGrow: 1, minWidth: 0 }}>
      <View style={style}>
        <View style={wide ? wideHead : { gap: space(2) }}>
          <View style={{ flexShrink: 1, minWidth: 0, gap: space(1) }}>
            {breadcrumb && breadcrumb.length > 0 ? <Breadcrumb crumbs={breadcrumb} /> : null}
            <Heading level={1}>{title}</Heading>
          </View>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-start', gap: space(3) }}>
            {status}
            {wide ? actions : null}
          </View>
        </View>
        {children}
      </View>
      {actions && !wide ? <FootActions>{actions}</FootActions> : null}
    </View>
  );
}

const wideHead: ViewStyle = { flexDirection: 'row', justifyContent: 'space-between', alignItems: 'flex-end', gap: space(6) };

/** Above the bar of places, within reach of the thumb. */
function FootActions({ children }: { children: ReactNode }) {
  const colours = useColours();
  const bottom = useBarHeight();
  const style = {
    position: 'sticky',
    bottom,
    gap: space(2),
    padding: space(3),
    backgroundColor: colours.paper,
    borderTopWidth: hairline,
    borderTopColor: colours.line,
  };
  return (
    <View role="group" aria-label="Actions" style={style as unknown as ViewStyle}>
      <ButtonWidth value="full">{children}</ButtonWidth>
    </View>
  );
}

function Breadcrumb({ crumbs }: { crumbs: Crumb[] }) {
  return (
    <View
      {...webProps({ role: 'navigation', 'aria-label': 'Where this page hangs' })}
      style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space(2) }}
    >
      {crumbs.map((crumb, index) => (
        <View key={`${crumb.href ?? ''} ${crumb.label}`} style={{ flexDirection: 'row', alignItems: 'center', gap: space(2) }}>
          {index > 0 ? (
            <Text size="note" tone="muted" silent>
              /
            </Text>
          ) : null}
          {crumb.href ? (
            <Link href={crumb.href} size="note">
              {crumb.label}
            </Link>
          ) : (
            <Text size="note" tone="muted">
              {crumb.label}
            </Text>
          )}
        </View>
      ))}
    </View>
  );
}

/** Names the page in the browser and brings whoever hears the page to its beginning, as a page load would. */
function useArrival(title: string) {
  const main = useRef<View>(null);
  useEffect(() => {
    document.title = `${title} · Strandnote`;
  }, [title]);
  useEffect(() => {
    const element = main.current as unknown as HTMLElement | null;
    // Not on the first page, and not when the person is already at work in it.
    if (document.activeElement && document.activeElement !== document.body && !element?.contains(document.activeElement)) {
      element?.focus({ preventScroll: true });
    }
  }, []);
  return main;
}
