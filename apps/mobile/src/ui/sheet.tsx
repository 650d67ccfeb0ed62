import { type ReactNode, useId, useLayoutEffect, useRef } from 'react';
import { View } from 'react-native';
import { hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Button } from './button.tsx';
import { Row } from './layout.tsx';
import { Heading } from './text.tsx';
import { useWide } from './use-wide.ts';

export interface SheetProps {
  title: string;
  children: ReactNode;
  /** Escape, the Close button, or a touch outside. */
  onClose: () => void;
  /** Buttons at the foot, the main one first. */
  actions?: ReactNode;
  /** Asks before closing could lose something: a touch outside does nothing then. */
  holds?: boolean;
}

/** A modal dialog; mount it to open it. The browser's own dialog keeps the focus inside and gives it back afterwards. */
export function Sheet({ title, children, onClose, actions, holds }: SheetProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  const style = useSheetStyle();
  // A layout effect: it is undone while the dialog is still in the page, so that the focus can go back to what opened it.
  useLayoutEffect(() => {
    const opener = document.activeElement;
    const element = dialog.current;
    element?.showModal();
    return () => {
      element?.close();
      if (opener instanceof HTMLElement) opener.focus();
    };
  }, []);
  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: the keyboard closes it with Escape, which arrives as `cancel`
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === dialog.current && !holds) onClose();
      }}
      style={style}
    >
      <View style={{ padding: space(5), gap: space(5) }}>
        <Row justify="space-between" align="flex-start" wrap={false}>
          <View style={{ flexShrink: 1 }}>
            <Heading level={2} id={titleId}>
              {title}
            </Heading>
          </View>
          <Button kind="quiet" onPress={onClose} label={`Close: ${title}`}>
            Close
          </Button>
        </Row>
        {children}
        {actions ? <Row>{actions}</Row> : null}
      </View>
    </dialog>
  );
}

function useSheetStyle() {
  const colours = useColours();
  const wide = useWide();
  // On a phone it rises from the foot, where the thumb is.
  const place = wide ? { margin: 'auto', width: 'min(640px, 90vw)' } : { margin: 'auto 0 0', width: '100%', maxWidth: '100%' };
  return {
    ...place,
    boxSizing: 'border-box' as const,
    maxHeight: '90dvh',
    overflow: 'auto',
    overscrollBehavior: 'contain' as const,
    padding: 0,
    background: colours.paper,
    color: colours.ink,
    border: `${hairline}px solid ${colours.muted}`,
    borderRadius: wide ? radius : `${radius}px ${radius}px 0 0`,
  };
}
