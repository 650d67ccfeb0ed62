import { createContext, type ReactNode, use } from 'react';
import { targets } from '../theme/tokens.ts';
import { useWide } from './use-wide.ts';

const GlovedContext = createContext(false);

/** Everything inside is touched with gloves: no target under 48 px. */
export function Gloved({ children }: { children: ReactNode }) {
  return <GlovedContext value={true}>{children}</GlovedContext>;
}

/** The smallest side (px) of what is touched here. */
export function useTargetSize(): number {
  const gloved = use(GlovedContext);
  const wide = useWide();
  if (gloved) return targets.site;
  return wide ? targets.wide : targets.phone;
}
