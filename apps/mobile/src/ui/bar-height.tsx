import { createContext, use } from 'react';

const BarHeightContext = createContext(0);

/** Set by the layout that shows the bar of places; what sticks to the foot of a page stays above it. */
export const BarHeight = BarHeightContext;

/** Height (px) of the bar at the foot of the window; 0 where there is none. */
export function useBarHeight(): number {
  return use(BarHeightContext);
}
