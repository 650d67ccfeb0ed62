import { useWindowDimensions } from 'react-native';
import { wideFrom } from '../theme/tokens.ts';

/** Whether the window is wide enough for the rail, for tables and for a list beside its detail. */
export function useWide(): boolean {
  return useWindowDimensions().width >= wideFrom;
}
