/** Pigments of the two themes; everything read as text holds 7 : 1 on paper and on sheet. */
export const lightColours = {
  paper: '#F6F4ED',
  sheet: '#FFFFFF',
  ink: '#15211F',
  muted: '#465350',
  line: '#CFD3CC',
  verdigris: '#14574D',
  onVerdigris: '#FFFFFF',
  wash: '#E4EEEA',
  minium: '#93300F',
  onMinium: '#FFFFFF',
  ochre: '#684A00',
};

export type Colours = typeof lightColours;

export const darkColours: Colours = {
  paper: '#0F1716',
  sheet: '#182321',
  ink: '#ECF1EE',
  muted: '#A9B8B3',
  line: '#33423E',
  verdigris: '#7CCFBF',
  onVerdigris: '#0F1716',
  wash: '#1E322E',
  minium: '#FF9A73',
  onMinium: '#0F1716',
  ochre: '#E3BE5A',
};

export type ColourName = keyof Colours;

/** Space comes in steps of four. */
export function space(steps: number): number {
  return steps * 4;
}

export const radius = 4;
export const hairline = 1;

/** From this width on: a rail, lists beside details, tables. */
export const wideFrom = 900;

export const fontSizes = { small: 13, note: 14, body: 16, lead: 18, heading: 22, title: 28, figure: 36 } as const;
export type FontSize = keyof typeof fontSizes;

/** Atkinson has no Greek letters: the browser takes them from STIX, the next in line. */
const symbols = 'STIXTwoText_400Regular_Italic';
export const fonts = {
  text: `AtkinsonHyperlegibleNext_400Regular, ${symbols}, sans-serif`,
  textStrong: `AtkinsonHyperlegibleNext_600SemiBold, ${symbols}, sans-serif`,
  figures: `AtkinsonHyperlegibleMono_400Regular, ${symbols}, monospace`,
  figuresStrong: `AtkinsonHyperlegibleMono_600SemiBold, ${symbols}, monospace`,
  symbol: `${symbols}, serif`,
} as const;
export type FontName = keyof typeof fonts;

/** Smallest side of anything that is touched: gloved hands in Site, fingers elsewhere on a phone, a pointer on a wide screen. */
export const targets = { site: 48, phone: 44, wide: 36 } as const;
