import { useEffect, useRef } from 'react';

interface CableMoves {
  onNext: (() => void) | null;
  onPrevious: (() => void) | null;
  onSave: (() => void) | null;
}

/** A thumb that moves this far (px), and hardly up or down, within this time (ms), means the next cable. */
const swipe = { along: 90, across: 45, within: 600 };

/** From cable to cable by keys that no field and no browser needs, or by a swipe. */
export function useCableKeys(moves: CableMoves): void {
  const latest = useRef(moves);
  latest.current = moves;
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      const move = moveOfKey(event, latest.current);
      if (!move) return;
      event.preventDefault();
      event.stopPropagation();
      move();
    };
    // Before the fields: they keep their keys to themselves.
    addEventListener('keydown', onKeyDown, { capture: true });
    const stopSwipes = followSwipes((direction) => {
      const move = direction === 'left' ? latest.current.onNext : latest.current.onPrevious;
      move?.();
    });
    return () => {
      removeEventListener('keydown', onKeyDown, { capture: true });
      stopSwipes();
    };
  }, []);
}

function moveOfKey(event: KeyboardEvent, { onNext, onPrevious, onSave }: CableMoves): (() => void) | null {
  if (document.querySelector('dialog[open]')) return null;
  if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) return onSave;
  if (!event.altKey || event.ctrlKey || event.metaKey) return null;
  if (event.key === 'PageDown') return onNext;
  return event.key === 'PageUp' ? onPrevious : null;
}

function followSwipes(onSwipe: (direction: 'left' | 'right') => void): () => void {
  let start: { x: number; y: number; at: number } | null = null;
  const onStart = (event: TouchEvent) => {
    const touch = event.touches[0];
    const target = event.target as Element | null;
    // Not two fingers, and not where a finger moves a caret, a list or a sheet.
    const free = event.touches.length === 1 && !target?.closest('input, select, textarea, dialog');
    start = touch && free ? { x: touch.clientX, y: touch.clientY, at: event.timeStamp } : null;
  };
  const onEnd = (event: TouchEvent) => {
    const touch = event.changedTouches[0];
    if (!start || !touch) return;
    const [along, across] = [touch.clientX - start.x, touch.clientY - start.y];
    const meant = Math.abs(along) > swipe.along && Math.abs(across) < swipe.across && event.timeStamp - start.at < swipe.within;
    start = null;
    if (meant) onSwipe(along < 0 ? 'left' : 'right');
  };
  addEventListener('touchstart', onStart, { passive: true });
  addEventListener('touchend', onEnd, { passive: true });
  return () => {
    removeEventListener('touchstart', onStart);
    removeEventListener('touchend', onEnd);
  };
}
