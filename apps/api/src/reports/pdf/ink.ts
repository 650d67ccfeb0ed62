import type { Pigment } from '@strandnote/core/drawing';

/** The pigments of the light theme, as they are printed. Read as text each holds 7 : 1 on white. */
export const ink: Record<Pigment, string> = {
  ink: '#15211F',
  muted: '#465350',
  line: '#B9BFB7',
  wash: '#E4EEEA',
  sheet: '#FFFFFF',
  verdigris: '#14574D',
  minium: '#93300F',
  ochre: '#684A00',
};
